import { and, asc, eq, inArray } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { db } from '../db';
import { noteItem, remark, remarkReply, user } from '../db/schema';

const author = alias(user, 'author');
const settler = alias(user, 'settler');
const remover = alias(user, 'remover');

/** The remarks of a note with their threads, oldest first; those of removed items say who removed them. */
export async function remarksOf(noteId: string) {
	const rows = await db
		.select({
			id: remark.id,
			itemId: remark.itemId,
			pinned: remark.pinned,
			seq: remark.seq,
			body: remark.body,
			createdAt: remark.createdAt,
			author: { id: author.id, name: author.name },
			settledAt: remark.settledAt,
			settledBy: settler.name,
			removedAt: noteItem.removedAt,
			removedBy: remover.name
		})
		.from(remark)
		.innerJoin(author, eq(author.id, remark.authorId))
		.leftJoin(settler, eq(settler.id, remark.settledBy))
		.leftJoin(noteItem, and(eq(noteItem.noteId, remark.noteId), eq(noteItem.itemId, remark.itemId)))
		.leftJoin(remover, eq(remover.id, noteItem.removedBy))
		.where(eq(remark.noteId, noteId))
		.orderBy(asc(remark.createdAt), asc(remark.id));
	const replies = await repliesTo(rows.map(({ id }) => id));
	return rows.map(({ settledAt, settledBy, removedAt, removedBy, createdAt, ...row }) => ({
		...row,
		createdAt: createdAt.toISOString(),
		settled: settledAt && { by: settledBy ?? '', at: settledAt.toISOString() },
		itemRemoved: removedAt && { by: removedBy ?? '', at: removedAt.toISOString() },
		replies: replies.get(row.id) ?? []
	}));
}

export type RemarkView = Awaited<ReturnType<typeof remarksOf>>[number];
export type ReplyView = {
	id: string;
	body: string;
	createdAt: string;
	author: { id: string; name: string };
};

async function repliesTo(remarkIds: string[]): Promise<Map<string, ReplyView[]>> {
	const threads = new Map<string, ReplyView[]>();
	if (remarkIds.length === 0) return threads;
	const rows = await db
		.select({ reply: remarkReply, author: { id: author.id, name: author.name } })
		.from(remarkReply)
		.innerJoin(author, eq(author.id, remarkReply.authorId))
		.where(inArray(remarkReply.remarkId, remarkIds))
		.orderBy(asc(remarkReply.createdAt), asc(remarkReply.id));
	for (const { reply, author } of rows) {
		const thread = threads.get(reply.remarkId) ?? [];
		const { id, body, createdAt } = reply;
		threads.set(reply.remarkId, [
			...thread,
			{ id, body, createdAt: createdAt.toISOString(), author }
		]);
	}
	return threads;
}
