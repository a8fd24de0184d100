/** Figures and states of results, in the words and signs that rows show. */
import type {
	CheckResult,
	Fault,
	ItemResult,
	Listed,
	Outcome,
	Quantity
} from '$lib/engine/calc/results';
import { formatFigure, unitText } from '$lib/engine/quantities/format';
import type { Item } from '$lib/note/items';
import type { CheckState } from '$lib/note/summary';

const THIN_SPACE = '\u202f';
const MINUS = '\u2212';

export type Figure = { value: string; unit: string; uncertainty: string };

export function figure(quantity: Quantity): Figure {
	return {
		value: formatFigure(quantity.value, quantity.digits),
		unit: unitText(quantity.unit),
		uncertainty:
			quantity.uncertainty === null ? '' : `±${THIN_SPACE}${formatFigure(quantity.uncertainty, 2)}`
	};
}

/** Value and unit in one word that does not break, e.g. "47.2 GPa". */
export function valueWithUnit(quantity: Quantity): string {
	const { value, unit } = figure(quantity);
	return unit === '' ? value : `${value}${THIN_SPACE}${unit}`;
}

/** How many values and between which: "5 values, 1 to 5 km". */
export function listWords({ count, least, greatest, unit, digits }: Listed): string {
	const values = count === 1 ? '1 value' : `${count} values`;
	const end = amount({ value: greatest, unit }, digits);
	const start = formatFigure(least, digits);
	return least === greatest ? `${values}, ${end}` : `${values}, ${start} to ${end}`;
}

export function amount({ value, unit }: { value: number; unit: string }, digits = 3): string {
	const shown = formatFigure(value, digits);
	return unit === '' ? shown : `${shown}${THIN_SPACE}${unitText(unit)}`;
}

/** A margin with its sign: three decimals for a ratio, its unit for a difference. */
type Margin = Pick<NonNullable<CheckResult['margin']>, 'kind' | 'value' | 'unit'>;

export function marginWords(margin: Margin): string {
	const sign = margin.value < 0 ? MINUS : '+';
	const size = Math.abs(margin.value);
	if (margin.kind === 'difference') return sign + amount({ value: size, unit: margin.unit });
	return sign + (size < 1000 ? size.toFixed(3) : formatFigure(size, 4));
}

/** ± its standard uncertainty; empty where that is exact or not known. */
export function marginUncertainty(margin: NonNullable<CheckResult['margin']>): string {
	if (!margin.uncertainty) return '';
	return `±${THIN_SPACE}${amount({ value: margin.uncertainty, unit: margin.unit }, 2)}`;
}

/** What the line does beside a row. */
export type Strand = { state: 'plain' | CheckState; margin: number | null };

/** One for all rows, so that a new result of a row that stays plain redraws nothing. */
const PLAIN: Strand = { state: 'plain', margin: null };

export function strandOf(item: Item, result: ItemResult | undefined): Strand {
	if (!result) return PLAIN;
	if (result.kind === 'check') {
		const margin = result.margin?.relative ?? null;
		return isBlankCheck(item) ? PLAIN : { state: result.state, margin };
	}
	const open =
		result.kind === 'lineModel'
			? result.faults.length > 0 || result.waitsFor.length > 0
			: result.outcome.state === 'waits' || result.outcome.state === 'fault';
	return open ? { state: 'waits', margin: null } : PLAIN;
}

function isBlankCheck(item: Item): boolean {
	return item.kind === 'check' && item.left.trim() === '' && item.right.trim() === '';
}

/** The two words for something without a value. */
export function faultWords(faults: readonly Fault[]): string {
	return faults.some((fault) => fault.code === 'beyond-any-build')
		? 'beyond any build'
		: 'cannot be computed';
}

export function faultsOf(outcome: Outcome | null): Fault[] {
	return outcome?.state === 'fault' ? outcome.faults : [];
}

/** The outcome in plain words, for pins, copies and names that are read aloud. */
export function outcomeWords(outcome: Outcome): string {
	switch (outcome.state) {
		case 'value':
			return valueWithUnit(outcome.quantity);
		case 'list':
			return listWords(outcome.list);
		case 'blank':
			return 'not given yet';
		case 'waits':
			return `waits for ${outcome.for.join(', ')}`;
		case 'fault':
			return faultWords(outcome.faults);
	}
}
