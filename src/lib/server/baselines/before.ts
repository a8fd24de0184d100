import { and, desc, eq, lt } from 'drizzle-orm';
import { changesSince, type ChangesSince } from '$lib/note/compare';
import type { Side } from '$lib/note/readings';
import { db } from '../db';
import { baseline } from '../db/schema';
import { opened } from './read';

/** The baseline of the note before this one and what changed since; null for the first. */
export async function changesBefore(
	noteId: string,
	frozenAt: Date,
	now: Side
): Promise<{ revision: string; changes: ChangesSince } | null> {
	const [row] = await db
		.select()
		.from(baseline)
		.where(and(eq(baseline.noteId, noteId), lt(baseline.frozenAt, frozenAt)))
		.orderBy(desc(baseline.frozenAt))
		.limit(1);
	return row
		? { revision: row.revision, changes: changesSince(row.revision, opened(row), now) }
		: null;
}
