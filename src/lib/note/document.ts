/**
 * The note's document and the edits people make to it.
 *
 * `items: Y.Map<id, Y.Map>`: each item has `kind`, `order` (see `order.ts`) and the fields of its
 * kind. `settings: Y.Map` holds the thin limit. Every edit is one transaction whose origin is the
 * caller's, so that undo takes back one's own.
 */
import * as Y from 'yjs';
import {
	BLANK,
	FIELDS,
	itemIdSchema,
	type EvidenceFile,
	type FieldForm,
	type ItemKind,
	type ItemOf
} from './items';
import { proseToFragment } from './fragment';
import { gapAfter, keyIn } from './order';

export type ItemMap = Y.Map<unknown>;

export const itemsMap = (doc: Y.Doc) => doc.getMap<ItemMap>('items');
export const settingsMap = (doc: Y.Doc) => doc.getMap<unknown>('settings');

export const DEFAULT_THIN_LIMIT = '0.10';

/** The kind of a map that is an item of a kind known here; null for anything else. */
export function kindOf(map: unknown): ItemKind | null {
	const kind = map instanceof Y.Map ? map.get('kind') : undefined;
	return typeof kind === 'string' && Object.hasOwn(FIELDS, kind) ? (kind as ItemKind) : null;
}

/** The item under an id; null where the document holds none, or something that is no item. */
export function heldItem(doc: Y.Doc, id: string): ItemMap | null {
	const map: unknown = itemsMap(doc).get(id);
	return kindOf(map) && itemIdSchema.safeParse(id).success ? (map as ItemMap) : null;
}

export type NewItem = {
	[K in ItemKind]: { kind: K } & Partial<Omit<ItemOf<K>, 'kind'>>;
}[ItemKind];

type Place = { after: string | null; origin?: unknown };

/** Adds an item below `after` (null: at the top) and returns its id. */
export function addItem(doc: Y.Doc, item: NewItem, place: Place): string {
	return addItems(doc, [item], place)[0]!;
}

/** Adds items one below the other and returns their ids. */
export function addItems(doc: Y.Doc, items: NewItem[], { after, origin = null }: Place): string[] {
	const gap = gapAfter(doc, after);
	return doc.transact(
		() =>
			items.map((item) => {
				gap.below = keyIn(gap);
				return putItem(doc, item, gap.below);
			}),
		origin
	);
}

function putItem(doc: Y.Doc, item: NewItem, order: string): string {
	const id = item.id ?? crypto.randomUUID();
	const content = { ...BLANK[item.kind], ...item } as Record<string, unknown>;
	const map: ItemMap = new Y.Map();
	map.set('kind', item.kind);
	map.set('order', order);
	for (const [field, form] of Object.entries(FIELDS[item.kind]) as [string, FieldForm][]) {
		map.set(field, held(form, content[field]));
	}
	itemsMap(doc).set(id, map);
	return id;
}

function held(form: FieldForm, value: unknown): unknown {
	switch (form) {
		case 'typed':
			return new Y.Text(value as string);
		case 'choice':
			return value;
		case 'prose':
			return proseToFragment(value as ItemOf<'text'>['body']);
		case 'files': {
			const files = new Y.Map<unknown>();
			(value as EvidenceFile[]).forEach((file, position) =>
				files.set(file.fileId, { ...file, position })
			);
			return files;
		}
	}
}

/** Moves an item below `after` (null: to the top). */
export function moveItem(doc: Y.Doc, id: string, { after, origin = null }: Place): void {
	const item = heldItem(doc, id);
	if (item && after !== id)
		doc.transact(() => item.set('order', keyIn(gapAfter(doc, after, id))), origin);
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
): void {
	const item = heldItem(doc, id);
	if (item) doc.transact(() => item.set(field, value), origin);
}

/** Writes texts of an item whole, and choices with them, as one edit. */
export function writeFields(
	doc: Y.Doc,
	id: string,
	texts: Readonly<Record<string, string>>,
	choices: Readonly<Record<string, string>>,
	origin: unknown = null
): void {
	const item = heldItem(doc, id);
	if (!item) return;
	doc.transact(() => {
		for (const [field, text] of Object.entries(texts)) {
			const held = item.get(field);
			if (!(held instanceof Y.Text) || held.toString() === text) continue;
			held.delete(0, held.length);
			held.insert(0, text);
		}
		for (const [field, choice] of Object.entries(choices)) item.set(field, choice);
	}, origin);
}

export function setThinLimit(doc: Y.Doc, typed: string, origin: unknown = null): void {
	doc.transact(() => settingsMap(doc).set('thinLimit', typed), origin);
}

export function putFile(doc: Y.Doc, id: string, file: EvidenceFile, origin: unknown = null): void {
	const files = heldItem(doc, id)?.get('files');
	if (files instanceof Y.Map)
		doc.transact(() => files.set(file.fileId, { ...file, position: files.size }), origin);
}

export function dropFile(doc: Y.Doc, id: string, fileId: string, origin: unknown = null): void {
	const files = heldItem(doc, id)?.get('files');
	if (files instanceof Y.Map) doc.transact(() => files.delete(fileId), origin);
}

/** Gives an item written by an earlier version the fields that it lacks, blank, so that they can be typed in. */
export function completeFields(doc: Y.Doc, id: string): void {
	const item = heldItem(doc, id);
	const kind = kindOf(item);
	if (!item || !kind) return;
	const blank = BLANK[kind] as Record<string, unknown>;
	const missing = (Object.entries(FIELDS[kind]) as [string, FieldForm][]).filter(
		([field]) => !item.has(field)
	);
	if (missing.length === 0) return;
	doc.transact(() => {
		for (const [field, form] of missing) item.set(field, held(form, blank[field]));
	});
}

export function textField(doc: Y.Doc, id: string, field: string): Y.Text | null {
	const text = heldItem(doc, id)?.get(field);
	return text instanceof Y.Text ? text : null;
}

export function proseField(doc: Y.Doc, id: string): Y.XmlFragment | null {
	const body = heldItem(doc, id)?.get('body');
	return body instanceof Y.XmlFragment ? body : null;
}
