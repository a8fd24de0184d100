/** What would be frozen: the document at its newest committed update, computed by the server. */
import * as Y from 'yjs';
import type { ItemResult } from '$lib/engine/calc/results';
import type { EvidenceDigest } from '$lib/note/frozen';
import type { NoteContent } from '$lib/note/items';
import { projectNote } from '$lib/note/projection';
import type { Note } from '../auth/guard';
import { db } from '../db';
import { evaluateContent } from '../engine/evaluate';
import { loadDocument } from '../notes/document';
import { evidenceOf } from './evidence';
import { inTheWay, type InTheWay } from './in-the-way';

export type Candidate = {
	seq: number;
	state: Uint8Array;
	content: NoteContent;
	results: ItemResult[];
	evidence: EvidenceDigest[];
	inTheWay: InTheWay[];
};

export async function candidateOf(note: Note): Promise<Candidate> {
	const { doc, seq } = await loadDocument(note.id, db);
	const content = projectNote(doc);
	const state = Y.encodeStateAsUpdate(doc);
	doc.destroy();
	const results = await evaluateContent(content);
	const { digests, missing } = await evidenceOf(db, note.programmeId, content);
	return {
		seq,
		state,
		content,
		results,
		evidence: digests,
		inTheWay: [...inTheWay(content, results), ...missing]
	};
}
