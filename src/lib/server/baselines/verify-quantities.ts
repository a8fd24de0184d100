/**
 * Figures computed again from a baseline's content, held against those it was frozen with. What an older
 * engine did not tell is not held against it: before version 2 only givens had an uncertainty.
 */
import type { ItemResult, Outcome } from '$lib/engine/calc/results';
import { propagatesUncertainty } from '$lib/engine/version';
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
	stored: readonly ItemResult[],
	frozenWith: string
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
			const uncertain = item.kind === 'given' || propagatesUncertainty(frozenWith);
			if (!a || !b || readingMoved(a, b) || (uncertain && uncertaintyMoved(a, b)))
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

/** Through line models uncertainties come from differences, told to nine digits. */
const SAME_UNCERTAINTY = 1e-8;

function uncertaintyMoved(a: Reading, b: Reading): boolean {
	const [then, now] = [uncertainties(a.outcome), uncertainties(b.outcome)];
	return then.length !== now.length || then.some((u, i) => apart(u, now[i]!));
}

function uncertainties(outcome: Outcome): (number | null)[] {
	if (outcome.state === 'list') return outcome.list.uncertainties ?? [];
	return outcome.state === 'value' ? [outcome.quantity.uncertainty] : [];
}

function apart(then: number | null, now: number | null): boolean {
	if (then === null || now === null) return then !== now;
	return Math.abs(then - now) > SAME_UNCERTAINTY * Math.max(then, now);
}
