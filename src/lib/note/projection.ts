/** The plain JSON of a document: what the engine, the API and a baseline read. */
import * as Y from 'yjs';
import {
	DEFAULT_THIN_LIMIT,
	isItem,
	itemsMap,
	orderedIds,
	settingsMap,
	type ItemMap
} from './document';
import { fragmentToProse } from './fragment';
import {
	BLANK,
	FIELDS,
	evidenceFileSchema,
	itemSchema,
	type FieldForm,
	type Item,
	type ItemKind,
	type NoteContent
} from './items';

/** One item as plain JSON; null when the map is no item. A field that is missing or of a wrong form is blank. */
export function projectItem(id: string, map: ItemMap | undefined): Item | null {
	if (!isItem(map)) return null;
	const kind = map.get('kind') as ItemKind;
	const blank = BLANK[kind] as Record<string, unknown>;
	const item: Record<string, unknown> = { id, kind };
	for (const [field, form] of Object.entries(FIELDS[kind]) as [string, FieldForm][]) {
		item[field] = plain(form, map.get(field)) ?? blank[field];
	}
	const parsed = itemSchema.safeParse(item);
	return parsed.success ? parsed.data : ({ ...blank, id } as Item);
}

function plain(form: FieldForm, value: unknown): unknown {
	switch (form) {
		case 'typed':
			return value instanceof Y.Text ? value.toString() : undefined;
		case 'choice':
			return value;
		case 'prose':
			return value instanceof Y.XmlFragment ? fragmentToProse(value) : undefined;
		case 'files':
			return value instanceof Y.Map ? plainFiles(value) : undefined;
	}
}

function plainFiles(files: Y.Map<unknown>) {
	return [...files.values()]
		.sort((a, b) => position(a) - position(b))
		.flatMap((file) => {
			const parsed = evidenceFileSchema.safeParse(file);
			return parsed.success ? [parsed.data] : [];
		});
}

const position = (file: unknown) => Number((file as { position?: unknown })?.position ?? 0);

export function projectNote(doc: Y.Doc): NoteContent {
	const items = itemsMap(doc);
	const thin = settingsMap(doc).get('thinLimit');
	return {
		format: 'holdfast-note',
		version: 1,
		thinLimit: typeof thin === 'string' ? thin : DEFAULT_THIN_LIMIT,
		items: orderedIds(doc).flatMap((id) => projectItem(id, items.get(id)) ?? [])
	};
}
