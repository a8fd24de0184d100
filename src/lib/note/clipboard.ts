/** Items copied within a note and between notes of a programme, as JSON text on the clipboard. */
import type * as Y from 'yjs';
import * as z from 'zod/mini';
import { addItems } from './document';
import { itemSchema, type Item } from './items';
import { orderedIds } from './order';
import { projectItem } from './projection';
import type { ProseBlock, ProseInline } from './prose';

const copiedSchema = z.object({
	format: z.literal('holdfast-items'),
	version: z.literal(1),
	items: z.array(itemSchema).check(z.minLength(1), z.maxLength(1000))
});

type Place = { after: string | null; origin?: unknown };

/** The items in sheet order, whatever the order of `ids`. */
export function copyItems(doc: Y.Doc, ids: readonly string[]): string {
	const items = orderedIds(doc)
		.filter((id) => ids.includes(id))
		.flatMap((id) => projectItem(doc, id) ?? []);
	return JSON.stringify({ format: 'holdfast-items', version: 1, items }, null, '\t');
}

/** The items in a clipboard's text; null when it holds none. */
export function readCopiedItems(text: string): Item[] | null {
	try {
		return copiedSchema.parse(JSON.parse(text)).items;
	} catch {
		return null;
	}
}

/** Adds copied items under new ids below `after`; null when the text holds none. */
export function pasteItems(doc: Y.Doc, text: string, place: Place): string[] | null {
	const items = readCopiedItems(text);
	return items && addItems(doc, withNewIds(items), place);
}

/** Adds a copy of an item right below it; null when there is no such item. */
export function duplicateItem(doc: Y.Doc, id: string, origin: unknown = null): string | null {
	const item = projectItem(doc, id);
	if (!item) return null;
	return addItems(doc, withNewIds([item]), { after: id, origin })[0] ?? null;
}

/** Live values inside prose follow the items that were copied with it. */
function withNewIds(items: Item[]): Item[] {
	const newIds = new Map(items.map((item) => [item.id, crypto.randomUUID() as string]));
	return items.map((item) => {
		const id = newIds.get(item.id)!;
		if (item.kind !== 'text') return { ...item, id };
		return { ...item, id, body: { type: 'doc', content: item.body.content.map(repoint) } };
	});

	function repoint(block: ProseBlock): ProseBlock {
		switch (block.type) {
			case 'paragraph':
			case 'heading':
				return { ...block, content: block.content?.map(repointInline) };
			default:
				return {
					...block,
					content: block.content.map((entry) => ({ ...entry, content: entry.content.map(repoint) }))
				};
		}
	}

	function repointInline(node: ProseInline): ProseInline {
		if (node.type !== 'quantity') return node;
		return {
			...node,
			attrs: { ...node.attrs, item: newIds.get(node.attrs.item) ?? node.attrs.item }
		};
	}
}
