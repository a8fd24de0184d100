/**
 * A remark is open until somebody marks it settled; it can be taken up again. Neither loses a word: an
 * answer to a settled remark leaves it settled.
 */
import { and, eq, isNull } from 'drizzle-orm';
import type { Note, Programme } from '../auth/guard';
import type { SignedIn } from '../auth/sessions';
import { db } from '../db';
import { remark, remarkReply } from '../db/schema';
import { announce } from '../events';
import { tellThread } from './notify';

type Thread = {
	remark: typeof remark.$inferSelect;
	note: Note;
	programme: Programme;
};

export async function answerRemark(thread: Thread, person: SignedIn, body: string): Promise<void> {
	await db.transaction(async (tx) => {
		await tx.insert(remarkReply).values({ remarkId: thread.remark.id, authorId: person.id, body });
		await tellThread(tx, { ...thread, writer: person, words: body });
		await announce(tx, { kind: 'remarks', noteId: thread.note.id });
	});
}

/** Settling what is settled keeps who settled it first. */
export async function settleRemark(
	{ remark: { id }, note }: Thread,
	person: SignedIn,
	settled: boolean
): Promise<void> {
	await db.transaction(async (tx) => {
		await tx
			.update(remark)
			.set(
				settled
					? { settledBy: person.id, settledAt: new Date() }
					: { settledBy: null, settledAt: null }
			)
			.where(settled ? and(eq(remark.id, id), isNull(remark.settledAt)) : eq(remark.id, id));
		await announce(tx, { kind: 'remarks', noteId: note.id });
	});
}
