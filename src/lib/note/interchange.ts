/** A note's content as JSON, out of a document and into a new one. */
import * as Y from 'yjs';
import { addItems, setThinLimit } from './document';
import { noteContentSchema, type NoteContent } from './items';

/** @throws ZodError naming the place where it is not a note's content. */
export function parseContent(json: unknown): NoteContent {
	return noteContentSchema.parse(json);
}

/** A new document holding the content. Items keep their ids. */
export function documentFrom(content: NoteContent): Y.Doc {
	const doc = new Y.Doc();
	doc.transact(() => {
		setThinLimit(doc, content.thinLimit);
		addItems(doc, content.items, { after: null });
	});
	return doc;
}
