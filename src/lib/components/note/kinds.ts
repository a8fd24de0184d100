/** What people call the bodies and the choices of items. */
import type { Item, ItemOf } from '$lib/note/items';

export const BODY_NAMES: Record<ItemOf<'lineModel'>['body'], string> = {
	earth: 'Earth',
	mars: 'Mars',
	moon: 'Moon',
	ceres: 'Ceres',
	moonNear: 'a moon, towards its primary (L1)',
	moonFar: 'a moon, away from its primary (L2)',
	own: 'a body of one’s own'
};

/** An item in a few words, for names that are read aloud and lists. */
export function itemTitle(item: Item): string {
	switch (item.kind) {
		case 'section':
			return item.title;
		case 'text':
			return 'text';
		default:
			return item.description || ('symbol' in item ? item.symbol : '') || 'not named yet';
	}
}
