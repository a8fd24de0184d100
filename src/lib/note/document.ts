/**
 * The note's document and the edits people make to it.
 *
 * `items: Y.Map<id, Y.Map>`: each item has `kind`, `order` (a fractional index, so that a move is one
 * field and concurrent moves converge) and the fields of its kind. `settings: Y.Map` holds the thin
 * limit. Every edit is one transaction whose origin is the caller's, so that undo takes back one's own.
 */
import { generateKeyBetween } from 'fractional-indexing';
import * as Y from 'yjs';
import { BLANK, FIELDS, type FieldForm, type Item, type ItemKind } from './items';
import { proseToFragment } from './fragment';

export type ItemMap = Y.Map<unknown>;

export const itemsMap = (doc: Y.Doc) => doc.getMap<ItemMap>('items');
export const settingsMap = (doc: Y.Doc) => doc.getMap<unknown>('settings');

export const DEFAULT_THIN_LIMIT = '0.10';

/** Ids in the order of the sheet. Equal order keys (two inserts at once) fall back to the id. */
export function orderedIds(doc: Y.Doc): string[] {
	const keyed: [string, string][] = [];
	itemsMap(doc).forEach((item, id) => {
		if (isItem(item)) keyed.push([String(item.get('order') ?? ''), id]);
	});
	keyed.sort(([a, i], [b, j]) => (a < b ? -1 : a > b ? 1 : i < j ? -1 : 1));
	return keyed.map(([, id]) => id);
}

/** Whether a map is an item of a kind known here; anything else in the document is passed over. */
export function isItem(item: unknown): item is ItemMap {
	return item instanceof Y.Map && Object.hasOwn(FIELDS, String(item.get('kind')));
}

/** The order key for a place below `after` (null: above all). */
function keyAfter(doc: Y.Doc, after: string | null, skip?: string): string {
	const ids = orderedIds(doc).filter((id) => id !== skip);
	const index = after === null ? -1 : ids.indexOf(after);
	const key = (id: string | undefined) =>
		id === undefined ? null : String(itemsMap(doc).get(id)!.get('order'));
	const below = key(index >= 0 ? ids[index] : undefined);
	// Equal keys leave no room between them: go past all that are equal.
	const next = ids.slice(index + 1).find((id) => below === null || key(id)! > below);
	return generateKeyBetween(below, key(next));
}

export function newItemId(): string {
	return crypto.randomUUID();
}

type NewItem = {
	[K in ItemKind]: { kind: K } & Partial<Omit<Extract<Item, { kind: K }>, 'kind'>>;
}[ItemKind];

/** Adds an item below `after` (null: at the top) and returns its id. */
export function addItem(
	doc: Y.Doc,
	item: NewItem,
	{ after, origin = null }: { after: string | null; origin?: unknown }
): string {
	const id = item.id ?? newItemId();
	const content = { ...BLANK[item.kind], ...item } as Record<string, unknown>;
	doc.transact(() => {
		const map: ItemMap = new Y.Map();
		map.set('kind', item.kind);
		map.set('order', keyAfter(doc, after));
		for (const [field, form] of Object.entries(FIELDS[item.kind]) as [string, FieldForm][]) {
			map.set(field, held(form, content[field]));
		}
		itemsMap(doc).set(id, map);
	}, origin);
	return id;
}

function held(form: FieldForm, value: unknown): unknown {
	switch (form) {
		case 'typed':
			return new Y.Text(value as string);
		case 'choice':
			return value;
		case 'prose':
			return proseToFragment(value as Extract<Item, { kind: 'text' }>['body']);
		case 'files': {
			const files = new Y.Map<unknown>();
			(value as Extract<Item, { kind: 'evidence' }>['files']).forEach((file, index) =>
				files.set(file.fileId, { ...file, position: index })
			);
			return files;
		}
	}
}

/** Moves an item below `after` (null: to the top). */
export function moveItem(
	doc: Y.Doc,
	id: string,
	{ after, origin = null }: { after: string | null; origin?: unknown }
): void {
	if (after === id) return;
	const item = itemsMap(doc).get(id);
	if (!item) return;
	doc.transact(() => item.set('order', keyAfter(doc, after, id)), origin);
}

export function removeItem(doc: Y.Doc, id: string, origin: unknown = null): void {
	doc.transact(() => itemsMap(doc).delete(id), origin);
}

export function setChoice(
	doc: Y.Doc,
	id: string,
	field: string,
	value: string,
	origin: unknown = null
) {
	const item = itemsMap(doc).get(id);
	if (item) doc.transact(() => item.set(field, value), origin);
}

export function textField(doc: Y.Doc, id: string, field: string): Y.Text | null {
	const text = itemsMap(doc).get(id)?.get(field);
	return text instanceof Y.Text ? text : null;
}

export function proseField(doc: Y.Doc, id: string): Y.XmlFragment | null {
	const body = itemsMap(doc).get(id)?.get('body');
	return body instanceof Y.XmlFragment ? body : null;
}
