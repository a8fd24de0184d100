/** What the home page asks. */
import { sql } from 'drizzle-orm';
import { db } from '../db';

export type WaitingRemark = {
	remarkId: string;
	programmeCode: string;
	noteNumber: string;
	noteTitle: string;
	itemId: string;
	number: string;
	symbolTex: string;
	symbol: string;
	/** The last word in the thread, by somebody else. */
	words: string;
	writer: string;
	at: Date;
};

/**
 * Remarks that wait for a person: not settled, on an item that they wrote or in a thread that they are
 * in, where the last word is somebody else's. An item of which nothing is known yet is the note
 * creator's. Nothing waits in a programme that the person has left.
 */
export async function remarksWaitingFor(userId: string): Promise<WaitingRemark[]> {
	const { rows } = await db.execute<Omit<WaitingRemark, 'at'> & { at: string }>(sql`
		with word as (
			select id as remark_id, author_id, body, created_at from remark
			union all
			select remark_id, author_id, body, created_at from remark_reply
		), last_word as (
			select distinct on (remark_id) * from word order by remark_id, created_at desc
		)
		select
			remark.id as "remarkId", programme.code as "programmeCode", note.number as "noteNumber",
			note.title as "noteTitle", remark.item_id as "itemId",
			coalesce(note_item.number, remark.pinned->>'number') as number,
			remark.pinned->>'symbol' as symbol, remark.pinned->>'symbolTex' as "symbolTex",
			last_word.body as words, "user".name as writer, last_word.created_at as at
		from remark
		join note on note.id = remark.note_id
		join programme on programme.id = note.programme_id
		join membership on membership.programme_id = programme.id and membership.user_id = ${userId}
		join last_word on last_word.remark_id = remark.id
		join "user" on "user".id = last_word.author_id
		left join note_item on note_item.note_id = note.id and note_item.item_id = remark.item_id
		where remark.settled_at is null
			and last_word.author_id <> ${userId}
			and membership.role <> 'observer'
			and (
				coalesce(note_item.created_by, note.creator_id) = ${userId}
				or exists (
					select 1 from word where word.remark_id = remark.id and word.author_id = ${userId}
				)
			)
		order by last_word.created_at
	`);
	return rows.map((row) => ({ ...row, at: new Date(row.at) }));
}
