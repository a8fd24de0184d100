/** What the title block of a note says beside its number: read from a form, checked, changed. */
import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import { db, type Db } from '../db';
import { gate, membership, note } from '../db/schema';
import { announce } from '../events';
import { Problem } from '../problems';

const line = z.string().trim().max(200, 'At most 200 characters.');
/** A form sends an empty text where nobody and nothing is chosen. */
const choice = z
	.guid()
	.nullable()
	.or(z.literal('').transform(() => null))
	.default(null);

export const titleBlockSchema = z.object({
	title: line.min(1, 'A note needs a title.'),
	department: line.default(''),
	technicalReference: line.default(''),
	approverId: choice,
	gateId: choice
});
export type TitleBlock = z.output<typeof titleBlockSchema>;

/** @throws Problem 422 when the approver or the gate is not of the programme. */
export async function checkTitleBlock(
	tx: Db,
	programmeId: string,
	{ approverId, gateId }: Pick<TitleBlock, 'approverId' | 'gateId'>
): Promise<void> {
	if (approverId) {
		const [found] = await tx
			.select({ id: membership.userId })
			.from(membership)
			.where(and(eq(membership.programmeId, programmeId), eq(membership.userId, approverId)));
		if (!found) throw new Problem(422, 'The approver is not in this programme.');
	}
	if (gateId) {
		const [found] = await tx
			.select({ id: gate.id })
			.from(gate)
			.where(and(eq(gate.programmeId, programmeId), eq(gate.id, gateId)));
		if (!found) throw new Problem(422, 'The gate is not one of this programme.');
	}
}

export async function changeTitleBlock(
	{ id: noteId, programmeId }: { id: string; programmeId: string },
	values: TitleBlock
): Promise<void> {
	await db.transaction(async (tx) => {
		await checkTitleBlock(tx, programmeId, values);
		await tx.update(note).set(values).where(eq(note.id, noteId));
		await announce(tx, { kind: 'note', noteId });
	});
}
