/** A given: a number as typed, its unit and its standard uncertainty. */
import { parseNumber } from '../quantities/number';
import { parseUnit, toSi } from '../quantities/units';
import { LARGEST } from './compile';
import { fault } from './faults';
import type { GivenItem } from './items';
import type { Fault, FaultCode, Outcome } from './results';

export function evaluateGiven(item: GivenItem): Outcome {
	const unit = parseUnit(item.unit);
	if (item.value.trim() === '') return { state: 'blank' };
	const number = parseNumber(item.value);
	const uncertainty = number.ok ? readUncertainty(item.uncertainty, number.value) : null;
	const faults: Fault[] = [];
	if (!number.ok) faults.push(at(item, 'value', 'bad-number', number));
	if (!unit.ok) faults.push(at(item, 'unit', 'unknown-unit', unit));
	if (typeof uncertainty === 'object' && uncertainty) {
		faults.push(at(item, 'uncertainty', 'bad-number', uncertainty));
	}
	if (!number.ok || !unit.ok || faults.length > 0) return { state: 'fault', faults };
	const si = toSi(number.value, unit.unit);
	if (!(Math.abs(si) <= LARGEST)) {
		const words = {
			message: 'The value is beyond any build: above 1e300 in SI units.',
			remedy: ''
		};
		return { state: 'fault', faults: [at(item, 'value', 'beyond-any-build', words)] };
	}
	return {
		state: 'value',
		quantity: {
			si,
			dimension: unit.unit.dimension,
			value: number.value,
			unit: item.unit.trim(),
			uncertainty: uncertainty as number | null,
			digits: number.digits
		}
	};
}

type Words = { message: string; remedy: string };

function at(item: GivenItem, field: keyof GivenItem, code: FaultCode, words: Words): Fault {
	const span = { field, from: 0, to: item[field].length };
	return fault(code, words.message, { remedy: words.remedy, span });
}

/** In the unit of the value, or as a percentage of it; nothing typed and 0 both mean exact. */
function readUncertainty(text: string, value: number): number | null | Words {
	const typed = text.trim().replace(/^±\s*/, '');
	if (typed === '') return null;
	const percent = typed.endsWith('%');
	const number = parseNumber(percent ? typed.slice(0, -1) : typed);
	if (!number.ok) return number;
	if (number.value < 0) {
		return { message: 'A standard uncertainty is not negative.', remedy: '' };
	}
	const size = percent ? (number.value / 100) * Math.abs(value) : number.value;
	return size === 0 ? null : size;
}
