/**
 * Taking back one's own edits, and only those. Typing without a pause in one field of one item is one
 * step; another item or field begins a new one.
 */
import * as Y from 'yjs';
import { itemsMap, settingsMap } from './document';

/** Pause after which typing on in the same field is a new step, in milliseconds. */
const PAUSE = 600;

/**
 * Tracks edits made with `origin`. An editor that writes with an origin of its own (the prose
 * editor's plugin key) is added with `addTrackedOrigin`.
 */
export function createUndo(doc: Y.Doc, origin: unknown): Y.UndoManager {
	const items = itemsMap(doc);
	const settings = settingsMap(doc);
	const undo = new Y.UndoManager([items, settings], {
		trackedOrigins: new Set([origin]),
		captureTimeout: PAUSE
	});
	let place = '';
	const editing = (edited: string, transaction: Y.Transaction) => {
		if (!undo.trackedOrigins.has(transaction.origin)) return;
		if (edited !== place) undo.stopCapturing();
		place = edited;
	};
	// Observers run before the undo manager captures the transaction.
	items.observeDeep((events, transaction) => editing(placeOf(events[0]!), transaction));
	settings.observe((_event, transaction) => editing('settings', transaction));
	undo.on('stack-item-popped', () => (place = ''));
	return undo;
}

/** The item and field of an edit; an item added, moved or removed is a place of its own. */
function placeOf(event: Y.YEvent<Y.AbstractType<unknown>>): string {
	const [id, field] = event.path;
	const [key] = event.changes.keys.keys();
	return id === undefined ? `${key} whole` : `${id} ${field ?? key}`;
}
