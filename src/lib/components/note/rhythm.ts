/** Heights and rules of rows. */
import type { Item } from '$lib/note/items';
import type { Strand } from './figures';

/** Middle of the first line of text, where the tick and the line's feature stand, px from the top. */
export function featureAt(item: Item, strand: Strand): number {
	if (item.kind === 'check') return 28;
	if (item.kind === 'section') return 24;
	const tall = strand.state === 'waits' && (item.kind === 'given' || item.kind === 'calculation');
	return tall ? 28 : 20;
}

/** Sections are parted by 2 px, rows by 1 px. Padding only: a margin would break the line. */
export function ruleAbove(item: Item, first: boolean): string {
	if (first) return '';
	return item.kind === 'section'
		? 'rule-above border-t-2 border-ink'
		: 'rule-above border-t border-rule';
}
