/** The plain JSON of a document: what the engine, the API and a baseline read. */
import * as Y from 'yjs';
import { DEFAULT_THIN_LIMIT, heldItem, kindOf, settingsMap } from './document';
import { fragmentToProse } from './fragment';
import {
	BLANK,
	FIELDS,
	ITEM_SCHEMAS,
	evidenceFileSchema,
	type EvidenceFile,
	type FieldForm,
	type Item,
	type NoteContent
} from './items';
import { orderedIds } from './order';
import { plainText, typedText } from './plain-text';

/**
 * One item as plain JSON; null where the document holds no item. A document can hold anything, so
 * each field is read on its own: one of a wrong form is blank and leaves the others as they are.
 */
export function projectItem(doc: Y.Doc, id: string): Item | null {
	const map = heldItem(doc, id);
	const kind = kindOf(map);
	if (!map || !kind) return null;
	const blank = BLANK[kind] as Record<string, unknown>;
	const schemas = ITEM_SCHEMAS[kind].shape as Record<
		string,
		{ safeParse(value: unknown): { success: boolean; data?: unknown } }
	>;
	const item: Record<string, unknown> = { id, kind };
	for (const [field, form] of Object.entries(FIELDS[kind]) as [string, FieldForm][]) {
		const parsed = schemas[field]!.safeParse(plain(form, map.get(field)));
		item[field] = parsed.success ? parsed.data : blank[field];
	}
	return item as Item;
}

function plain(form: FieldForm, value: unknown): unknown {
	switch (form) {
		case 'typed':
			return value instanceof Y.Text ? typedText(value.toString()) : undefined;
		case 'choice':
			return value;
		case 'prose':
			return value instanceof Y.XmlFragment ? fragmentToProse(value) : undefined;
		case 'files':
			return value instanceof Y.Map ? plainFiles(value) : undefined;
	}
}

function plainFiles(files: Y.Map<unknown>): EvidenceFile[] {
	return [...files.values()]
		.sort((a, b) => position(a) - position(b))
		.flatMap((file) => {
			const parsed = evidenceFileSchema.safeParse(file);
			return parsed.success ? [{ ...parsed.data, name: plainText(parsed.data.name) }] : [];
		});
}

function position(file: unknown): number {
	const at = (file as { position?: unknown } | null)?.position;
	return typeof at === 'number' && Number.isFinite(at) ? at : 0;
}

export function projectThinLimit(doc: Y.Doc): string {
	const typed = settingsMap(doc).get('thinLimit');
	return typeof typed === 'string' ? typedText(typed) : DEFAULT_THIN_LIMIT;
}

export function projectNote(doc: Y.Doc): NoteContent {
	return {
		format: 'holdfast-note',
		version: 1,
		thinLimit: projectThinLimit(doc),
		items: orderedIds(doc).flatMap((id) => projectItem(doc, id) ?? [])
	};
}
