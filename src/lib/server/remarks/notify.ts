/** Who is told of a new word in a thread: the author of the item and all who wrote in it, but the writer. */
import { and, eq, inArray, ne } from 'drizzle-orm';
import { formatFigure, unitText } from '$lib/engine/quantities/format';
import type { PinnedValue } from '$lib/note/frozen';
import type { Note, Programme } from '../auth/guard';
import type { SignedIn } from '../auth/sessions';
import type { Db } from '../db';
import { membership, noteItem, remark, remarkReply, user } from '../db/schema';
import { queueMail } from '../mail/queue';
import { settings } from '../settings';

type Word = {
	remark: typeof remark.$inferSelect;
	note: Note;
	programme: Programme;
	writer: SignedIn;
	words: string;
};

export async function tellThread(tx: Db, word: Word): Promise<void> {
	for (const to of await readersOf(tx, word)) {
		await queueMail(tx, { to, subject: subject(word), text: text(word) });
	}
}

/** Only those who are still in the programme: a thread outlives a membership, its mails do not. */
async function readersOf(tx: Db, { remark: { id, itemId, authorId }, note, writer }: Word) {
	const [item] = await tx
		.select({ createdBy: noteItem.createdBy })
		.from(noteItem)
		.where(and(eq(noteItem.noteId, note.id), eq(noteItem.itemId, itemId)));
	const replies = await tx
		.select({ authorId: remarkReply.authorId })
		.from(remarkReply)
		.where(eq(remarkReply.remarkId, id));
	const ids = [
		item?.createdBy ?? note.creatorId,
		authorId,
		...replies.map((reply) => reply.authorId)
	];
	const rows = await tx
		.selectDistinct({ email: user.email })
		.from(user)
		.innerJoin(membership, eq(membership.userId, user.id))
		.where(
			and(
				inArray(user.id, ids),
				ne(user.id, writer.id),
				eq(membership.programmeId, note.programmeId)
			)
		);
	return rows.map(({ email }) => email);
}

function subject({ remark, note, writer }: Word): string {
	const { number, symbol } = remark.pinned;
	return `${note.number}, ${number}${symbol && ` ${symbol.slice(0, 40)}`}: remark by ${writer.name}`;
}

function text({ remark, note, programme, writer, words }: Word): string {
	const { number, symbol, description } = remark.pinned;
	const page = `${settings().ORIGIN}/programmes/${programme.code}/notes/${note.number}`;
	const then = pinnedWords(remark.pinned);
	return [
		`${programme.title}, ${note.number} ${note.title}`,
		`Item ${number}${symbol && `, ${symbol}`}: ${description}`,
		...(then ? [`When pinned: ${then}`] : []),
		'',
		`${writer.name} writes:`,
		words,
		'',
		`Read and answer: ${page}#${encodeURIComponent(remark.itemId)}`
	].join('\n');
}

/** The value then, in plain words; empty where the item has none. */
export function pinnedWords({ value, unit, digits, state }: PinnedValue): string {
	if (value === null) return state;
	const figure = `${formatFigure(value, digits)}${unit && ` ${unitText(unit)}`}`;
	return state ? `margin ${figure}, ${state}` : figure;
}
