/**
 * What the server writes down about a note after edits: who wrote which item, what the register shows,
 * what moved a check. One transaction, under the lock of the note's summary; a process that looks at an
 * older state than the one last written leaves everything as it is.
 */
import { eq, sql } from 'drizzle-orm';
import type { ItemResult } from '$lib/engine/calc/results';
import type { NoteContent } from '$lib/note/items';
import { db } from '../db';
import { noteSummary } from '../db/schema';
import { writeAuthorship } from './authorship';
import { writeMovements } from './movements';
import { summarise } from './summary';
import type { Touch } from './touches';

export type Observation = {
	/** The update up to which everything is seen. */
	seq: number;
	content: NoteContent;
	/** Null when the engine could not compute the note within its limits. */
	results: ItemResult[] | null;
	touched: ReadonlyMap<string, Touch>;
	/** Results when last observed, for what an item was used in before it was removed. */
	earlier: ItemResult[];
};

export async function evaluatedSeq(noteId: string): Promise<number> {
	const [row] = await db
		.select({ seq: noteSummary.seq })
		.from(noteSummary)
		.where(eq(noteSummary.noteId, noteId));
	return row?.seq ?? 0;
}

export async function observe(noteId: string, seen: Observation): Promise<void> {
	await db.transaction(async (tx) => {
		const [before] = await tx
			.select()
			.from(noteSummary)
			.where(eq(noteSummary.noteId, noteId))
			.for('update');
		if (before && before.seq > seen.seq) return;
		await writeAuthorship(tx, noteId, seen);
		const { results } = seen;
		if (!results) return;
		await writeMovements(tx, noteId, { ...seen, results }, before?.marks ?? []);
		const summary = { seq: seen.seq, ...summarise(seen.content, results) };
		await tx
			.insert(noteSummary)
			.values({ noteId, ...summary })
			.onConflictDoUpdate({
				target: noteSummary.noteId,
				set: { ...summary, evaluatedAt: sql`now()` }
			});
	});
}
