/** Figures computed again from a baseline's content, held against those it was frozen with. */
import type { ItemResult, Outcome } from '$lib/engine/calc/results';
import { sameFigure } from '$lib/note/canonical';
import type { ItemKind, NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { readingMoved, readingsOf, type Reading } from '$lib/note/readings';
import { evaluateContent } from '../engine/evaluate';
import { tally, type Tally } from './tally';

export type QuantityTally = Tally & {
	kinds: Record<'givens' | 'calculations' | 'outputs' | 'checks', number>;
};

export async function verifyQuantities(
	content: NoteContent,
	stored: readonly ItemResult[]
): Promise<QuantityTally> {
	const now = new Map((await evaluateContent(content)).map((result) => [result.id, result]));
	const then = new Map(stored.map((result) => [result.id, result]));
	const numbers = numberItems(content.items);
	const kinds = { givens: 0, calculations: 0, outputs: 0, checks: 0 };
	const differ: string[] = [];
	let of = 0;
	for (const item of content.items) {
		const sealed = readingsOf(item, then.get(item.id));
		const today = readingsOf(item, now.get(item.id));
		for (const name of new Set([...sealed, ...today].map(({ output }) => output))) {
			const [a, b] = [sealed, today].map((side) => side.find(({ output }) => output === name));
			of += 1;
			kinds[plural(item.kind)] += 1;
			if (!a || !b || readingMoved(a, b) || uncertaintyMoved(a, b))
				differ.push([numbers.get(item.id), (a ?? b)!.symbol].filter(Boolean).join(' '));
		}
	}
	return { ...tally(of, differ), kinds };
}

function plural(kind: ItemKind) {
	if (kind === 'given') return 'givens';
	if (kind === 'check') return 'checks';
	return kind === 'lineModel' ? 'outputs' : 'calculations';
}

function uncertaintyMoved(a: Reading, b: Reading): boolean {
	const of = (outcome: Outcome) =>
		outcome.state === 'value' ? outcome.quantity.uncertainty : null;
	const [then, now] = [of(a.outcome), of(b.outcome)];
	return then === null || now === null ? then !== now : !sameFigure(then, now);
}
