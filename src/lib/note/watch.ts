/** Changes of a document as plain items: only what a transaction touched is projected. */
import * as Y from 'yjs';
import { itemsMap, settingsMap } from './document';
import type { Item } from './items';
import { orderedIds } from './order';
import { projectItem, projectThinLimit } from './projection';

export type NoteChange = {
	upsert: Item[];
	remove: string[];
	/** All ids in sheet order, where the order or the set of items changed. */
	order: string[] | null;
	/** As typed, where it changed. */
	thinLimit: string | null;
};

/** Called with a change and the origin of the transaction that made it. */
export type NoteListener = (change: NoteChange, origin: unknown) => void;

/** Calls the listener for every transaction that changed the note; returns what ends it. */
export function watchNote(doc: Y.Doc, listener: NoteListener): () => void {
	const items = itemsMap(doc);
	const settings = settingsMap(doc);

	const itemsChanged = (events: Y.YEvent<Y.AbstractType<unknown>>[], { origin }: Y.Transaction) => {
		const touched = new Set<string>();
		let reordered = false;
		for (const event of events) {
			const id = event.path[0];
			if (id === undefined) {
				for (const key of event.changes.keys.keys()) touched.add(key);
				reordered = true;
			} else {
				touched.add(String(id));
				if (event.path.length === 1 && ['order', 'kind'].some((key) => event.changes.keys.has(key)))
					reordered = true;
			}
		}
		const upsert: Item[] = [];
		const remove: string[] = [];
		for (const id of touched) {
			const item = projectItem(doc, id);
			if (item) upsert.push(item);
			else remove.push(id);
		}
		listener(
			{ upsert, remove, order: reordered ? orderedIds(doc) : null, thinLimit: null },
			origin
		);
	};
	const settingsChanged = (_event: unknown, { origin }: Y.Transaction) =>
		listener({ upsert: [], remove: [], order: null, thinLimit: projectThinLimit(doc) }, origin);

	items.observeDeep(itemsChanged);
	settings.observe(settingsChanged);
	return () => {
		items.unobserveDeep(itemsChanged);
		settings.unobserve(settingsChanged);
	};
}
