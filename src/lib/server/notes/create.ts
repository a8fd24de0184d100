/** A new note in a programme, under a number of its own. */
import { and, eq, like } from 'drizzle-orm';
import { z } from 'zod';
import type { Programme } from '../auth/guard';
import { db, type Db } from '../db';
import { note, noteSummary, programme } from '../db/schema';
import { Problem } from '../problems';
import { titleBlockSchema, checkTitleBlock } from './title-block';

export const newNoteSchema = titleBlockSchema.extend({
	/** Identification number; empty takes the next one. */
	number: z
		.string()
		.trim()
		.toUpperCase()
		.regex(
			/^$|^[A-Z0-9]+(-[A-Z0-9]+)+$/,
			'A number is letters and digits in groups, joined by hyphens.'
		)
		.max(40, 'A number has at most 40 characters.')
		.default('')
});
export type NewNote = z.input<typeof newNoteSchema>;

/** @throws Problem 409 when the number is taken, 422 when it does not begin with the programme's code. */
export async function createNote(
	{ id: programmeId, code }: Pick<Programme, 'id' | 'code'>,
	creatorId: string,
	values: NewNote
) {
	const { number, ...titleBlock } = newNoteSchema.parse(values);
	if (number !== '' && !number.startsWith(`${code}-`))
		throw new Problem(422, `${number} does not begin with ${code}-, the code of the programme.`);
	return db.transaction(async (tx) => {
		// One note at a time in a programme, so that two do not take the same number.
		await tx
			.select({ id: programme.id })
			.from(programme)
			.where(eq(programme.id, programmeId))
			.for('update');
		await checkTitleBlock(tx, programmeId, titleBlock);
		if (number !== '') await refuseTaken(tx, programmeId, number);
		const [row] = await tx
			.insert(note)
			.values({
				...titleBlock,
				programmeId,
				creatorId,
				changedBy: creatorId,
				number: number || (await nextNumber(tx, programmeId, code))
			})
			.returning();
		await tx.insert(noteSummary).values({
			noteId: row!.id,
			seq: 0,
			checks: { holds: 0, thin: 0, fails: 0, waits: 0 },
			marks: [],
			itemCount: 0
		});
		return row!;
	});
}

async function refuseTaken(tx: Db, programmeId: string, number: string): Promise<void> {
	const [taken] = await tx
		.select({ title: note.title })
		.from(note)
		.where(and(eq(note.programmeId, programmeId), eq(note.number, number)));
	if (taken) throw new Problem(409, `${number} is taken: "${taken.title}".`);
}

/** The number after the highest of the usual form, e.g. CL-DN-005 after CL-DN-004. */
export async function nextNumber(tx: Db, programmeId: string, code: string): Promise<string> {
	const prefix = `${code}-DN-`;
	const rows = await tx
		.select({ number: note.number })
		.from(note)
		.where(and(eq(note.programmeId, programmeId), like(note.number, `${prefix}%`)));
	const highest = rows
		.map(({ number }) => number.slice(prefix.length))
		.filter((rest) => /^\d{1,9}$/.test(rest))
		.reduce((most, rest) => Math.max(most, Number(rest)), 0);
	return prefix + String(highest + 1).padStart(3, '0');
}
