/** From a plain SI figure to the quantity that is shown. */
import { equal, inWords } from '../quantities/dimension';
import { preferredUnit } from '../quantities/prefer';
import { fromSi, parseUnit } from '../quantities/units';
import { LARGEST } from './compile';
import { fault } from './faults';
import type { ValueType } from './infer';
import type { Fault, Outcome, Quantity } from './results';

export const DEFAULT_DIGITS = 4;

type Manner = {
	/** Unit that was chosen; empty lets it be found. */
	unit: string;
	/** Unit of something of the same kind that the value came from. */
	hint?: string | null;
	digits: number;
};

/** The value in the unit to show, or why it cannot be shown in it. */
export function shown(si: number, type: ValueType, manner: Manner): Outcome {
	const text = manner.unit.trim() || unitFor(si, type, manner.hint ?? null);
	const parsed = parseUnit(text);
	if (!parsed.ok) return refused(unitFault('unknown-unit', parsed.message, parsed.remedy, text));
	const { unit } = parsed;
	if (!equal(unit.dimension, type.dimension)) {
		const message =
			`The value is ${inWords(type.dimension)}; ` +
			`it cannot be shown in ${text}, which is ${inWords(unit.dimension)}.`;
		return refused(unitFault('dimension', message, '', text));
	}
	if (unit.offset !== 0 && type.scale === 'difference') {
		const message = `The value is a difference of temperatures; it cannot be shown in ${text}, which has a zero of its own.`;
		return refused(unitFault('dimension', message, 'Show it in K.', text));
	}
	const value = fromSi(si, unit);
	if (!(Math.abs(value) <= LARGEST)) {
		return refused(
			fault('beyond-any-build', `In ${text} the value is beyond any build: above 1e300.`)
		);
	}
	const quantity: Quantity = {
		si,
		dimension: type.dimension,
		value,
		unit: text,
		uncertainty: null,
		digits: manner.digits
	};
	return { state: 'value', quantity };
}

/** The hint as long as the value reads well in it. */
function unitFor(si: number, type: ValueType, hint: string | null): string {
	if (type.scale === 'point') return 'degC';
	const parsed = hint ? parseUnit(hint) : null;
	if (parsed?.ok && parsed.unit.offset === 0) {
		const size = Math.abs(si / parsed.unit.factor);
		if (size === 0 || (size >= 1e-2 && size < 1e5)) return hint!;
	}
	return preferredUnit(si, type.dimension);
}

const refused = (reason: Fault): Outcome => ({ state: 'fault', faults: [reason] });

const unitFault = (
	code: 'unknown-unit' | 'dimension',
	message: string,
	remedy: string,
	text: string
) => fault(code, message, { remedy, span: { field: 'unit', from: 0, to: text.length } });

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
