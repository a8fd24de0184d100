/** Baselines as pages and the API show them. Moments are ISO texts, the same here and over the wire. */
import { and, desc, eq } from 'drizzle-orm';
import type { ItemResult } from '$lib/engine/calc/results';
import { noteContentSchema } from '$lib/note/items';
import { db } from '../db';
import { baseline, note } from '../db/schema';
import { headSchema } from './head';

type Row = typeof baseline.$inferSelect;

/** What a list shows: no content, no results. */
const LISTED = {
	id: baseline.id,
	revision: baseline.revision,
	head: baseline.head,
	waivers: baseline.waivers,
	digest: baseline.digest
};

const listed = ({ id, revision, head, waivers, digest }: Pick<Row, keyof typeof LISTED>) => ({
	id,
	revision,
	head: headSchema.parse(JSON.parse(head)),
	waivers: waivers.length,
	digest
});
export type ListedBaseline = ReturnType<typeof listed>;

/** All baselines of a programme, newest first. */
export async function baselinesOfProgramme(programmeId: string): Promise<ListedBaseline[]> {
	const rows = await db
		.select(LISTED)
		.from(baseline)
		.innerJoin(note, eq(note.id, baseline.noteId))
		.where(eq(note.programmeId, programmeId))
		.orderBy(desc(baseline.frozenAt));
	return rows.map(listed);
}

/** All baselines of a note, newest first. */
export async function baselinesOfNote(noteId: string): Promise<ListedBaseline[]> {
	const rows = await db
		.select(LISTED)
		.from(baseline)
		.where(eq(baseline.noteId, noteId))
		.orderBy(desc(baseline.frozenAt));
	return rows.map(listed);
}

/** The whole of a baseline, read back from its sealed texts. */
export function opened(row: Row) {
	const { id, revision, evidence, waivers, digest, engineVersion } = row;
	return {
		id,
		revision,
		frozenAt: row.frozenAt.toISOString(),
		head: headSchema.parse(JSON.parse(row.head)),
		content: noteContentSchema.parse(JSON.parse(row.content)),
		results: JSON.parse(row.results) as ItemResult[],
		evidence,
		waivers,
		digest,
		engineVersion
	};
}
export type Baseline = ReturnType<typeof opened>;

export async function findBaseline(id: string): Promise<Row | undefined> {
	const [row] = await db.select().from(baseline).where(eq(baseline.id, id));
	return row;
}

export async function baselineOfRevision(
	noteId: string,
	revision: string
): Promise<Row | undefined> {
	const [row] = await db
		.select()
		.from(baseline)
		.where(and(eq(baseline.noteId, noteId), eq(baseline.revision, revision)));
	return row;
}

/** The newest baseline of a note; null when it has none. */
export async function latestBaseline(noteId: string): Promise<Baseline | null> {
	const [row] = await db
		.select()
		.from(baseline)
		.where(eq(baseline.noteId, noteId))
		.orderBy(desc(baseline.frozenAt))
		.limit(1);
	return row ? opened(row) : null;
}
