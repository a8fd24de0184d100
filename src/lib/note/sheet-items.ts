/** What the engine's sheet is given of a note. */
import type { SheetItem } from '$lib/engine/calc/items';
import { DEFAULT_THIN_LIMIT } from './document';
import type { Item } from './items';

/** The item as the engine reads it; null where it computes nothing. */
export function toSheetItem(item: Item): SheetItem | null {
	switch (item.kind) {
		case 'given':
		case 'calculation':
		case 'check':
		case 'lineModel':
			return item;
		default:
			return null;
	}
}

/** The thin limit as a number; one that cannot be read counts as the usual one. */
export function thinLimitOf(typed: string): number {
	const limit = typed.trim() === '' ? NaN : Number(typed.trim().replace('\u2212', '-'));
	return Number.isFinite(limit) && limit >= 0 ? limit : Number(DEFAULT_THIN_LIMIT);
}
