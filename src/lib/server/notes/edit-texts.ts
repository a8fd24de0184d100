import type { Item } from '$lib/note/items';

const SIGNS = { le: '≤', ge: '≥', within: '=' };

/** What an edit changed of an item, as it read before and after; empty where there was no item. */
export function editTexts(
	before: Item | null,
	after: Item | null
): { before: string; after: string } {
	if (before?.kind === 'lineModel' && after?.kind === 'lineModel') {
		const changed = (Object.keys(after) as (keyof typeof after)[]).filter(
			(field) => before[field] !== after[field] && field !== 'description'
		);
		const text = (item: typeof after) =>
			changed.map((field) => `${WORDS[field] ?? field} ${item[field]}`).join(', ');
		return { before: text(before), after: text(after) };
	}
	const texts = { before: before ? textOf(before) : '', after: after ? textOf(after) : '' };
	if (texts.before !== texts.after) return texts;
	return { before: symbolOf(before), after: symbolOf(after) };
}

const WORDS: Partial<Record<string, string>> = {
	factorOfSafety: 'factor of safety',
	baseMode: 'base from'
};

function textOf(item: Item): string {
	switch (item.kind) {
		case 'given':
			return `${item.value} ${item.unit}`.trim();
		case 'calculation':
			return item.expression;
		case 'check': {
			const tolerance = item.relation === 'within' ? ` ± ${item.tolerance}` : '';
			return `${item.left} ${SIGNS[item.relation]} ${item.right}${tolerance}`;
		}
		default:
			return '';
	}
}

const symbolOf = (item: Item | null) => (item && 'symbol' in item ? item.symbol : '');
