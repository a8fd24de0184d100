/** A baseline's content projected again from the document's state, and its columns held against its head. */
import * as Y from 'yjs';
import type { NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { projectNote } from '$lib/note/projection';
import { changedFields } from '$lib/note/readings';
import type { baseline } from '../db/schema';
import type { BaselineHead } from './head';
import { tally, UNREADABLE, type Tally } from './tally';

/** Each item counts as one; their order and the thin limit are two more. */
export function verifyContent(state: Uint8Array, content: NoteContent): Tally {
	const today = projected(state);
	if (!today) return UNREADABLE;
	const numbers = numberItems(content.items);
	const now = new Map(today.items.map((item) => [item.id, item]));
	const differ = content.items
		.filter((item) => {
			const found = now.get(item.id);
			return !found || changedFields(item, found).length > 0;
		})
		.map(({ id }) => numbers.get(id) ?? id);
	const order = (items: NoteContent['items']) => JSON.stringify(items.map(({ id }) => id));
	if (order(today.items) !== order(content.items)) differ.push('order of items');
	if (today.thinLimit !== content.thinLimit) differ.push('thin limit');
	return tally(content.items.length + 2, differ);
}

function projected(state: Uint8Array): NoteContent | null {
	const doc = new Y.Doc();
	try {
		Y.applyUpdate(doc, state);
		return projectNote(doc);
	} catch {
		return null;
	} finally {
		doc.destroy();
	}
}

export function verifyHead(row: typeof baseline.$inferSelect, head: BaselineHead): Tally {
	const pairs: [string, unknown, unknown][] = [
		['note', row.noteId, head.note.id],
		['revision', row.revision, head.revision],
		['gate', row.gateId, head.gate.id],
		['edit', row.seq, head.seq],
		['frozen by', row.frozenBy, head.frozenBy.id],
		['frozen at', row.frozenAt.toISOString(), head.frozenAt],
		['engine version', row.engineVersion, head.engineVersion]
	];
	const differ = pairs.filter(([, stored, sealed]) => stored !== sealed).map(([name]) => name);
	return tally(pairs.length, differ);
}
