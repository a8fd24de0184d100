/** A quantity as a person writes it into a field: "50", "50 GPa", "1 300 kg/m³", "23 h 56 min". */
import type { NumberParameter } from '$lib/engine/methods/parameter';
import { equal, inWords } from '$lib/engine/quantities/dimension';
import { unitText } from '$lib/engine/quantities/format';
import { parseNumber } from '$lib/engine/quantities/number';
import { parseUnit, toSi } from '$lib/engine/quantities/units';

export type ReadQuantity = { ok: true; si: number } | { ok: false; message: string };

/** A figure and what stands after it, up to the next figure that follows a space. */
const PART =
	/\s*([-+\u2212\u2013]?[\d.][\d.,\s]*(?:[eE][-+\u2212]?\d+)?)\s*([\p{L}°%Ω′″][^]*?)?(?=\s+[-+\u2212\u2013]?[\d.]|\s*$)/uy;

type Part = { figure: string; unit: string };

/** Null where it is not made of figures and units. */
function partsOf(typed: string): Part[] | null {
	const parts: Part[] = [];
	PART.lastIndex = 0;
	while (PART.lastIndex < typed.trimEnd().length) {
		const found = PART.exec(typed);
		if (!found) return null;
		parts.push({ figure: found[1]!.trim(), unit: (found[2] ?? '').trim() });
	}
	return parts;
}

/** In SI; a figure alone is in the unit of the field. Parts with units of their own are added up. */
export function readQuantity(typed: string, field: NumberParameter): ReadQuantity {
	const alone = parseNumber(typed);
	const parts = alone.ok ? [{ figure: typed, unit: field.unit }] : partsOf(typed);
	if (!alone.ok && (!parts || (parts.length === 1 && parts[0]!.unit === ''))) return refuse(alone);
	let si = 0;
	for (const [index, { figure, unit }] of parts!.entries()) {
		const number = parseNumber(figure);
		if (!number.ok) return refuse(number);
		const one = inSi(number.value, unit, field);
		if (!one.ok) return one;
		if (index > 0 && number.value < 0)
			return { ok: false, message: 'A sign stands before the whole only.' };
		si += index > 0 && si < 0 ? -one.si : one.si;
	}
	return { ok: true, si };
}

function inSi(value: number, text: string, { dimension, unit }: NumberParameter): ReadQuantity {
	const parsed = parseUnit(text);
	if (!parsed.ok) return refuse(parsed);
	const usual = unit === '' ? 'a figure without a unit' : `e.g. ${unitText(unit)}`;
	if (dimension && !equal(parsed.unit.dimension, dimension)) {
		const found =
			text === ''
				? 'A figure here has no unit'
				: `${text} is a unit of ${inWords(parsed.unit.dimension)}`;
		return { ok: false, message: `${found}; what is wanted is ${inWords(dimension)}, ${usual}.` };
	}
	if (parsed.unit.offset !== 0)
		return { ok: false, message: `${text} has a zero of its own. Write the value in K.` };
	return { ok: true, si: toSi(value, parsed.unit) };
}

const refuse = (why: { ok: boolean; message?: string; remedy?: string }): ReadQuantity => ({
	ok: false,
	message: `${why.message ?? ''} ${why.remedy ?? ''}`.trim()
});
