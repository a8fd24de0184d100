/** The figures of an item, one by one, and how far they moved. */
import type { CheckResult, Dimension, ItemResult, Listed, Outcome } from '../engine/calc/results';
import { canonicalJson, sameFigure } from './canonical';
import { FIELDS, type FieldForm, type Item, type NoteContent } from './items';

/** A note's content with what its sheet answered: a baseline, or the live note now. */
export type Side = { content: NoteContent; results: readonly ItemResult[] };

/** One figure: a quantity, an output of a line model, or the left side of a check with its margin. */
export type Reading = {
	itemId: string;
	/** Name of the output of a line model; empty otherwise. */
	output: string;
	symbol: string;
	symbolTex: string;
	description: string;
	outcome: Outcome;
	check: Pick<CheckResult, 'state' | 'margin'> | null;
};

export function readingsOf(item: Item, result: ItemResult | undefined): Reading[] {
	if (!result) return [];
	const itemId = item.id;
	const description = 'description' in item ? item.description : '';
	switch (result.kind) {
		case 'given':
		case 'calculation': {
			const { symbol, symbolTex, outcome } = result;
			return [{ itemId, output: '', symbol, symbolTex, description, outcome, check: null }];
		}
		case 'check': {
			const { left: outcome, state, margin } = result;
			const check = { state, margin };
			return [{ itemId, output: '', symbol: '', symbolTex: '', description, outcome, check }];
		}
		case 'lineModel':
			return result.outputs.map(({ name, symbolTex, description, outcome }) => ({
				itemId,
				output: name,
				symbol: `${result.symbol}.${name}`,
				symbolTex,
				description,
				outcome,
				check: null
			}));
	}
}

/** Change of the value over its size before; null where there is nothing to hold against each other. */
export function relativeChange(before: Outcome, after: Outcome): number | null {
	if (before.state !== 'value' || after.state !== 'value') return null;
	const [from, to] = [before.quantity, after.quantity];
	if (!sameDimension(from.dimension, to.dimension)) return null;
	if (sameFigure(from.si, to.si)) return 0;
	const change = (to.si - from.si) / Math.abs(from.si);
	return Number.isFinite(change) ? change : null;
}

/** A third as an exponent is 0.333333333333 in a baseline, with more digits in a fresh result. */
const sameDimension = (a: Dimension, b: Dimension) =>
	a.every((exponent, index) => Math.abs(exponent - (b[index] ?? 0)) < 1e-6);

export function outcomeMoved(before: Outcome, after: Outcome): boolean {
	if (before.state === 'value' && after.state === 'value') {
		return relativeChange(before, after) !== 0;
	}
	if (before.state === 'list' && after.state === 'list') return listMoved(before.list, after.list);
	return before.state !== after.state;
}

function listMoved(before: Listed, after: Listed): boolean {
	if (before.count !== after.count || !sameDimension(before.dimension, after.dimension))
		return true;
	return after.si.some((si, i) => !sameFigure(before.si[i]!, si));
}

export function readingMoved(before: Reading, after: Reading): boolean {
	return (
		outcomeMoved(before.outcome, after.outcome) ||
		before.check?.state !== after.check?.state ||
		marginMoved(before.check?.margin ?? null, after.check?.margin ?? null)
	);
}

function marginMoved(before: CheckResult['margin'], after: CheckResult['margin']): boolean {
	if (!before || !after) return before !== after;
	return before.kind !== after.kind || !sameFigure(before.value, after.value);
}

/** The fields of an item that read otherwise, by name. */
export function changedFields(before: Item, after: Item): string[] {
	if (before.kind !== after.kind) return ['kind'];
	const [was, is] = [before, after] as unknown as Record<string, unknown>[];
	return (Object.entries(FIELDS[after.kind]) as [string, FieldForm][])
		.filter(([field, form]) =>
			form === 'typed' || form === 'choice'
				? was![field] !== is![field]
				: canonicalJson(was![field]) !== canonicalJson(is![field])
		)
		.map(([field]) => field);
}
