/** An item as a remark is pinned to it. */
import { faultWords, outcomeWords } from '../components/note/figures';
import type { ItemResult } from '../engine/calc/results';
import type { PinnedValue } from './frozen';
import { KIND_NAMES, type Item } from './items';
import { proseTokens } from './tokens';

const LONGEST = 80;

export function pinnedValue(
	item: Item,
	result: ItemResult | undefined,
	number: string
): PinnedValue {
	const blank = { value: null, unit: '', digits: 4, state: '' };
	const common = {
		number,
		symbol: 'symbol' in item ? item.symbol : '',
		symbolTex: '',
		description: descriptionOf(item)
	};
	switch (result?.kind) {
		case 'given':
		case 'calculation': {
			const { symbolTex, outcome } = result;
			if (outcome.state !== 'value')
				return { ...blank, ...common, symbolTex, state: outcomeWords(outcome) };
			const { value, unit, digits } = outcome.quantity;
			return { ...common, symbolTex, value, unit, digits, state: '' };
		}
		case 'check': {
			const { margin, state } = result;
			return { ...blank, ...common, value: margin?.value ?? null, unit: margin?.unit ?? '', state };
		}
		case 'lineModel': {
			const faults = result.faults.map(({ fault }) => fault);
			if (faults.length > 0) return { ...blank, ...common, state: faultWords(faults) };
			const waits = result.waitsFor.length > 0 ? `waits for ${result.waitsFor.join(', ')}` : '';
			return { ...blank, ...common, state: waits };
		}
		default:
			return { ...blank, ...common };
	}
}

/** What an item is, in a line. */
export function descriptionOf(item: Item): string {
	if (item.kind === 'section') return item.title || KIND_NAMES.section;
	if (item.kind !== 'text') return item.description || KIND_NAMES[item.kind];
	const words = proseTokens(item.body)
		.filter(({ kind }) => kind === 'word' || kind === 'sign')
		.map(({ text, spaced }) => (spaced ? `${text} ` : text))
		.join('')
		.trim();
	if (words === '') return KIND_NAMES.text;
	return words.length > LONGEST ? `${words.slice(0, LONGEST).trimEnd()} …` : words;
}
