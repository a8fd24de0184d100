/** From a plain SI figure to the quantity that is shown. */
import { equal, inWords } from '../quantities/dimension';
import { preferredUnit } from '../quantities/prefer';
import { fromSi, parseUnit, type Unit } from '../quantities/units';
import { LARGEST } from './compile';
import { Refusal, fault } from './faults';
import type { ValueType } from './value-type';
import type { Fault, Outcome, Quantity } from './results';

export const DEFAULT_DIGITS = 4;

type Wish = {
	/** Unit that was chosen; empty lets it be found. */
	unit: string;
	/** Unit of something of the same kind that the value came from. */
	hint?: string | null;
};

/** The unit in which a figure is shown, and the sizes for which it stays that one; null for any size. */
export type Showing = { text: string; unit: Unit; sizes: Sizes | null };

/** from ≤ |si| < below */
type Sizes = { from: number; below: number };

/** @throws Refusal where a value of this type cannot be shown so. */
export function showing(si: number, type: ValueType, wish: Wish): Showing {
	const chosen = wish.unit.trim();
	const { text, sizes } = chosen
		? { text: chosen, sizes: null }
		: unitFor(si, type, wish.hint ?? null);
	const parsed = parseUnit(text);
	if (!parsed.ok) {
		throw new Refusal('unknown-unit', parsed.message, { remedy: parsed.remedy, place: all(text) });
	}
	const { unit } = parsed;
	if (!equal(unit.dimension, type.dimension)) {
		const message =
			`The value is ${inWords(type.dimension)}; ` +
			`it cannot be shown in ${text}, which is ${inWords(unit.dimension)}.`;
		throw new Refusal('dimension', message, { place: all(text) });
	}
	if (unit.offset !== 0 && type.scale === 'difference') {
		const message = `The value is a difference of temperatures; it cannot be shown in ${text}, which has a zero of its own.`;
		throw new Refusal('dimension', message, { remedy: 'Show it in K.', place: all(text) });
	}
	return { text, unit, sizes };
}

/** @throws Refusal where the figure in that unit is too large to tell. */
export function inUnit(si: number, { text, unit }: Showing): number {
	const value = fromSi(si, unit);
	if (Math.abs(value) <= LARGEST) return value;
	throw new Refusal('beyond-any-build', `In ${text} the value is beyond any build: above 1e300.`);
}

/** A standard uncertainty in the unit: a length of its scale. Null where it is too large to tell. */
export function uncertaintyIn(uncertainty: number | null, unit: Unit): number | null {
	if (uncertainty === null) return null;
	const size = uncertainty / unit.factor;
	return size <= LARGEST ? size : null;
}

/** The outcome with its standard uncertainty, in SI. */
export function withUncertainty(outcome: Outcome, uncertainty: number | null): Outcome {
	if (outcome.state !== 'value' || uncertainty === null) return outcome;
	const { quantity } = outcome;
	const parsed = parseUnit(quantity.unit);
	const inUnit = parsed.ok ? uncertaintyIn(uncertainty, parsed.unit) : null;
	return { state: 'value', quantity: { ...quantity, uncertainty: inUnit } };
}

/** The value in the unit to show, or why it cannot be shown in it. */
export function shown(si: number, type: ValueType, manner: Wish & { digits: number }): Outcome {
	try {
		const how = showing(si, type, manner);
		const quantity: Quantity = {
			si,
			dimension: type.dimension,
			value: inUnit(si, how),
			unit: how.text,
			uncertainty: null,
			digits: manner.digits
		};
		return { state: 'value', quantity };
	} catch (error) {
		if (error instanceof Refusal) return { state: 'fault', faults: [error.in('unit')] };
		throw error;
	}
}

/** Sizes in the hinted unit that read well in it. */
const LEAST = 1e-2;
const MOST = 1e5;

function unitFor(si: number, type: ValueType, hint: string | null): Omit<Showing, 'unit'> {
	if (type.scale === 'point') return { text: 'degC', sizes: null };
	const size = Math.abs(si);
	const { text, ...sizes } = preferredUnit(size, type.dimension);
	const parsed = hint ? parseUnit(hint) : null;
	if (!parsed?.ok || parsed.unit.offset !== 0) return { text, sizes };
	// Bounds in SI, so that a figure which is computed anew is held against them without being converted.
	const [least, most] = [LEAST * parsed.unit.factor, MOST * parsed.unit.factor];
	if (size === 0) return { text: hint!, sizes: { from: 0, below: Number.MIN_VALUE } };
	if (size >= most) return { text, sizes: { ...sizes, from: Math.max(sizes.from, most) } };
	if (size >= least) return { text: hint!, sizes: { from: least, below: most } };
	return {
		text,
		sizes: {
			from: Math.max(sizes.from, Number.MIN_VALUE),
			below: Math.min(sizes.below, least)
		}
	};
}

const all = (text: string) => ({ from: 0, to: text.length });

/** Significant digits as typed; empty means four. */
export function parseDigits(text: string): number | Fault {
	const typed = text.trim();
	if (typed === '') return DEFAULT_DIGITS;
	const digits = Number(typed);
	if (Number.isInteger(digits) && digits >= 1 && digits <= 15) return digits;
	return fault('bad-number', `“${typed}” digits cannot be shown.`, {
		remedy: 'Write a whole number from 1 to 15.',
		span: { field: 'digits', from: 0, to: text.length }
	});
}
