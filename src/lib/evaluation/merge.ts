import type { SheetChange } from '$lib/engine/calc/items';

/** Two edits one after the other, as one. */
export function merge(first: SheetChange, second: SheetChange): SheetChange {
	const items = new Map((first.upsert ?? []).map((item) => [item.id, item]));
	const removed = new Set(first.remove);
	for (const id of second.remove ?? []) {
		items.delete(id);
		removed.add(id);
	}
	for (const item of second.upsert ?? []) {
		items.set(item.id, item);
		removed.delete(item.id);
	}
	const order = second.order ?? first.order;
	const thinLimit = second.thinLimit ?? first.thinLimit;
	return {
		upsert: [...items.values()],
		remove: [...removed],
		...(order && { order }),
		...(thinLimit !== undefined && { thinLimit })
	};
}
