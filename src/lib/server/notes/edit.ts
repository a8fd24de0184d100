/** Edits of a note made by the server on somebody's behalf, as if they had typed them. */
import * as Y from 'yjs';
import { addItems, setThinLimit } from '$lib/note/document';
import type { NoteContent } from '$lib/note/items';
import { projectNote } from '$lib/note/projection';
import { evaluateContent } from '../engine/evaluate';
import { appendUpdates, loadDocument } from './document';
import { observe } from './observe';
import { Touches } from './touches';

/** Commits the edit, and writes down what the register and the note's rows show of it. */
export async function editNote(
	noteId: string,
	userId: string,
	edit: (doc: Y.Doc) => void
): Promise<void> {
	const { doc } = await loadDocument(noteId);
	const touches = new Touches(doc);
	const earlier = await evaluateContent(projectNote(doc));
	const vector = Y.encodeStateVector(doc);
	doc.transact(() => edit(doc), { userId });
	const update = Y.encodeStateAsUpdate(doc, vector);
	const numbers = await appendUpdates(noteId, [{ update, userId }], 'the server itself');
	if (!numbers) return;
	const content = projectNote(doc);
	const results = await evaluateContent(content);
	const touched = touches.take();
	touches.end();
	await observe(noteId, { seq: numbers.last, content, results, touched, earlier });
}

/** Adds content, with the ids it comes with, to a note that holds nothing yet. */
export function fillNote(noteId: string, userId: string, content: NoteContent): Promise<void> {
	return editNote(noteId, userId, (doc) => {
		setThinLimit(doc, content.thinLimit);
		addItems(doc, content.items, { after: null });
	});
}
