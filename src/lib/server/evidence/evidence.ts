/** Evidence files: the bytes in the store, what is known of them in the database. */
import { eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import type { ItemOf } from '$lib/note/items';
import { isUuid } from '../auth/guard';
import { db } from '../db';
import { baseline, baselineEvidence, evidenceFile } from '../db/schema';
import { log } from '../log';
import { Problem } from '../problems';
import { settings } from '../settings';
import { inspect } from './inspection';
import { deleteObject, putObject } from './store';

export type StoredFile = typeof evidenceFile.$inferSelect;
/** As the note's document holds it. */
type FileEntry = ItemOf<'evidence'>['files'][number];

/** The name of a file as somebody's machine gave it: no folders, nothing that cannot be shown. */
export const fileName = z
	.string()
	.transform((name) =>
		name
			.replace(/^.*[/\\]/, '')
			.replace(/\p{C}+/gu, ' ')
			.trim()
	)
	.pipe(
		z
			.string()
			.min(1, 'The file has no name.')
			.max(200, 'The name of a file has at most 200 characters.')
	);

export async function storeEvidence(upload: {
	noteId: string;
	userId: string;
	name: string;
	body: AsyncIterable<Uint8Array>;
}): Promise<FileEntry> {
	const { noteId, userId, name, body } = upload;
	const id = randomUUID();
	const objectKey = `notes/${noteId}/${id}`;
	const inspection = inspect(body, name, settings().EVIDENCE_MAX_MB);
	try {
		await putObject(objectKey, inspection.bytes);
	} catch (error) {
		const refusal = inspection.refusal();
		if (refusal) throw refusal;
		log.warn({ error, noteId, name }, 'An upload of evidence failed');
		throw new Problem(503, `${name} did not reach the store whole; nothing of it was kept.`);
	}
	const file = { name, ...inspection.findings() };
	try {
		await db.insert(evidenceFile).values({ id, noteId, objectKey, uploadedBy: userId, ...file });
	} catch (error) {
		await deleteObject(objectKey);
		throw error;
	}
	return { fileId: id, ...file };
}

export async function findEvidence(fileId: string): Promise<StoredFile> {
	const [file] = isUuid(fileId)
		? await db.select().from(evidenceFile).where(eq(evidenceFile.id, fileId))
		: [];
	if (!file) throw new Problem(404, 'There is no such file in a programme that you are in.');
	return file;
}

/** The row goes first: a crash in between leaves an object nobody sees, never a row without one. */
export async function removeEvidence(file: StoredFile): Promise<void> {
	await db.transaction(async (tx) => {
		// Freezing refers to the row and so waits for this lock, or has it.
		await tx.select().from(evidenceFile).where(eq(evidenceFile.id, file.id)).for('update');
		const frozen = await tx
			.select({ revision: baseline.revision })
			.from(baselineEvidence)
			.innerJoin(baseline, eq(baseline.id, baselineEvidence.baselineId))
			.where(eq(baselineEvidence.fileId, file.id));
		if (frozen.length > 0) {
			const revisions = frozen.map(({ revision }) => revision).join(', ');
			throw new Problem(409, `${file.name} is evidence of baseline ${revisions} and stays.`);
		}
		await tx.delete(evidenceFile).where(eq(evidenceFile.id, file.id));
	});
	await deleteObject(file.objectKey);
}
