/** The two sides of a comparison: baselines by their revision letter, or the note as it is now. */
import { and, desc, eq, isNotNull } from 'drizzle-orm';
import { compare } from '$lib/note/comparison';
import { readingsOf, type Side } from '$lib/note/readings';
import type { Note } from '../auth/guard';
import { db } from '../db';
import { noteItem, user } from '../db/schema';
import { Problem } from '../problems';
import { candidateOf } from './candidate';
import { baselineOfRevision, opened } from './read';

export const NOW = 'now';

/** What the head of a side says. */
export type SideHead =
	| {
			kind: 'frozen';
			id: string;
			revision: string;
			gate: string;
			frozenAt: string;
			frozenBy: string;
			digest: string;
	  }
	| {
			kind: 'now';
			revision: string;
			seq: number;
			asOf: string;
			lastEdit: { by: string; number: string } | null;
	  };

export async function compareSides(note: Note, from: string, to: string) {
	const [before, after] = await Promise.all([sideOf(note, from), sideOf(note, to)]);
	return {
		from: before.head,
		to: after.head,
		comparison: compare(before.side, after.side),
		symbols: { ...symbolsOf(before.side), ...symbolsOf(after.side) },
		authors: to === NOW ? await authorsOf(note.id) : {}
	};
}
export type ComparedSides = Awaited<ReturnType<typeof compareSides>>;

/** TeX of each quantity's symbol, for live values within a text. */
function symbolsOf({ content, results }: Side): Record<string, string> {
	const byId = new Map(results.map((result) => [result.id, result]));
	const readings = content.items.flatMap((item) => readingsOf(item, byId.get(item.id)));
	return Object.fromEntries(
		readings
			.filter(({ symbolTex }) => symbolTex !== '')
			.map(({ itemId, output, symbolTex }) => [output ? `${itemId}.${output}` : itemId, symbolTex])
	);
}

async function sideOf(note: Note, which: string): Promise<{ head: SideHead; side: Side }> {
	if (which === NOW) {
		const { seq, content, results } = await candidateOf(note);
		const asOf = new Date().toISOString();
		const lastEdit = await lastEditOf(note.id);
		return {
			head: { kind: 'now', revision: note.revision, seq, asOf, lastEdit },
			side: { content, results }
		};
	}
	const row = await baselineOfRevision(note.id, which);
	if (!row) throw new Problem(404, `${note.number} has no baseline ${which.slice(0, 8)}.`);
	const { id, revision, frozenAt, head, content, results, digest } = opened(row);
	return {
		head: {
			kind: 'frozen',
			id,
			revision,
			gate: head.gate.kind,
			frozenAt,
			frozenBy: head.frozenBy.name,
			digest
		},
		side: { content, results }
	};
}

async function lastEditOf(noteId: string) {
	const [edit] = await db
		.select({ by: user.name, number: noteItem.number })
		.from(noteItem)
		.innerJoin(user, eq(user.id, noteItem.changedBy))
		.where(eq(noteItem.noteId, noteId))
		.orderBy(desc(noteItem.changedAt))
		.limit(1);
	return edit ?? null;
}

type Authorship = { by: string; at: string };

/** Who added each item and who removed it, by item. */
async function authorsOf(noteId: string) {
	const added = await db
		.select({ itemId: noteItem.itemId, by: user.name, at: noteItem.createdAt })
		.from(noteItem)
		.innerJoin(user, eq(user.id, noteItem.createdBy))
		.where(eq(noteItem.noteId, noteId));
	const removed = await db
		.select({ itemId: noteItem.itemId, by: user.name, at: noteItem.removedAt })
		.from(noteItem)
		.innerJoin(user, eq(user.id, noteItem.removedBy))
		.where(and(eq(noteItem.noteId, noteId), isNotNull(noteItem.removedAt)));
	const authors: Record<string, { added?: Authorship; removed?: Authorship }> = {};
	for (const { itemId, by, at } of added) authors[itemId] = { added: { by, at: at.toISOString() } };
	for (const { itemId, by, at } of removed)
		authors[itemId] = { ...authors[itemId], removed: { by, at: at!.toISOString() } };
	return authors;
}
