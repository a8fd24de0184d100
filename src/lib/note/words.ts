/** Word-level difference of two texts. */
import { diffArrays } from 'diff';
import type { Token } from './tokens';

export type Part = { change: 'same' | 'in' | 'out'; tokens: Token[] };

export type TextDifference = { parts: Part[]; wordsIn: number; wordsOut: number };

/** Texts that differ in more places than this are shown as replaced whole: the search grows with its square. */
const MOST_DIFFERENCES = 2000;

export function differenceOf(before: Token[], after: Token[]): TextDifference {
	const found = diffArrays(before, after, {
		comparator: (a, b) => a.kind === b.kind && a.text === b.text,
		maxEditLength: MOST_DIFFERENCES
	}) as { added: boolean; removed: boolean; value: Token[] }[] | undefined;
	const parts: Part[] = found
		? found.map(({ added, removed, value }) => ({
				change: added ? 'in' : removed ? 'out' : 'same',
				tokens: value
			}))
		: [
				{ change: 'out', tokens: before },
				{ change: 'in', tokens: after }
			];
	return { parts, wordsIn: wordCount(parts, 'in'), wordsOut: wordCount(parts, 'out') };
}

function wordCount(parts: Part[], change: Part['change']): number {
	return parts
		.filter((part) => part.change === change)
		.flatMap((part) => part.tokens)
		.filter(({ kind }) => kind !== 'sign' && kind !== 'end').length;
}
