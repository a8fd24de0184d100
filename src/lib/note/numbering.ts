import type { Item } from './items';

/**
 * The number of every item, by id. Sections count 1, 2, 3; items count within their section (4.1,
 * 4.2); items above the first section count 0.1, 0.2.
 */
export function numberItems(items: readonly Pick<Item, 'id' | 'kind'>[]): Map<string, string> {
	const numbers = new Map<string, string>();
	let section = 0;
	let within = 0;
	for (const item of items) {
		if (item.kind === 'section') {
			section += 1;
			within = 0;
			numbers.set(item.id, `${section}`);
		} else {
			within += 1;
			numbers.set(item.id, `${section}.${within}`);
		}
	}
	return numbers;
}
