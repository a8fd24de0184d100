/** The files that a note's content stands on. */
import { and, eq, inArray } from 'drizzle-orm';
import type { EvidenceDigest } from '$lib/note/frozen';
import type { NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { isUuid } from '../auth/guard';
import type { Db } from '../db';
import { evidenceFile, note } from '../db/schema';
import { named, type InTheWay } from './in-the-way';

/**
 * Digests as the server recorded them at the upload, in the order of the files' ids; the document, which
 * people write, is not believed. A file that is not in the programme's record is in the way.
 */
export async function evidenceOf(
	db: Db,
	programmeId: string,
	content: NoteContent
): Promise<{ digests: EvidenceDigest[]; missing: InTheWay[] }> {
	const wanted = content.items.flatMap((item) =>
		item.kind === 'evidence' ? item.files.map((file) => ({ item, file })) : []
	);
	const ids = [...new Set(wanted.map(({ file }) => file.fileId))].filter(isUuid);
	const rows =
		ids.length === 0
			? []
			: await db
					.select({
						fileId: evidenceFile.id,
						name: evidenceFile.name,
						size: evidenceFile.size,
						sha256: evidenceFile.sha256
					})
					.from(evidenceFile)
					.innerJoin(note, eq(note.id, evidenceFile.noteId))
					.where(and(inArray(evidenceFile.id, ids), eq(note.programmeId, programmeId)))
					.orderBy(evidenceFile.id);
	const found = new Set(rows.map(({ fileId }) => fileId));
	const numbers = numberItems(content.items);
	const missing = wanted
		.filter(({ file }) => !found.has(file.fileId.toLowerCase()))
		.map(({ item, file }): InTheWay => ({
			kind: 'file missing',
			...named(item, numbers),
			reason: `The file ${file.name} is not in the programme’s record.`
		}));
	return { digests: rows, missing };
}
