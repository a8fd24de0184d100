/**
 * Reads units: "kg/m^3", "kg m^-3", "kg·m⁻³", "N/tex", "mm²", "J/(kg K)", "1/s".
 *
 * A product after a division is refused unless the divisor is in parentheses: J/kg K may be read in
 * two ways (SI Brochure, 5.4.1).
 */
import { PURE, times, toPower, type Dimension } from './dimension';
import { UNITS } from './unit-table';

export type Unit = {
	/** As typed. */
	text: string;
	factor: number;
	/** SI value of the zero of the scale: 273.15 for °C, 0 for all but °C and °F. */
	offset: number;
	dimension: Dimension;
	/** The units named in it, with where each stands in the text it was read from. */
	names: { name: string; from: number; to: number }[];
};

export const NO_UNIT: Unit = { text: '', factor: 1, offset: 0, dimension: PURE, names: [] };

const NAME = /sidereal[ _]day|[\p{L}°Ω]+|%/uy;
const POWER =
	/\^\s*([-\u2212]?\d{1,2})(?![\d.])|\^\s*\(\s*([-\u2212]?\d{1,2})(?:\/([1-9]))?\s*\)|(⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]{1,2})/y;
const ONE_OVER = /1\s*\/\s*/y;
const SPACE = /[ \t\u00a0\u2009\u202f]*/y;

/** A unit written in a longer text from `from` on; null when none stands there. */
export function scanUnit(text: string, from: number, { tight }: { tight: boolean }) {
	const reader = new UnitReader(text, from, tight);
	const unit = reader.product(true);
	if (!unit || !(unit.factor > 1e-200 && unit.factor < 1e200)) return null;
	return { unit: { ...unit, text: text.slice(from, reader.at) }, to: reader.at };
}

/** Reads one unit. In an expression (`tight`) no space may stand around / and ·: there it means an operation. */
class UnitReader {
	constructor(
		private text: string,
		public at: number,
		private tight: boolean
	) {}

	/** Factors up to the first thing that cannot go on the unit. */
	product(outermost: boolean): Unit | null {
		const inverse = outermost && !this.tight && this.take(ONE_OVER) !== null;
		const first = this.factor(inverse);
		let unit = first && inverse ? joined(NO_UNIT, first, -1) : first;
		let divided = inverse;
		while (unit) {
			const before = this.at;
			const sign = this.separator(outermost);
			const next = sign === '' || (sign === '·' && divided) ? null : this.factor(sign === '/');
			if (!next) {
				this.at = before;
				return unit;
			}
			divided ||= sign === '/';
			unit = joined(unit, next, sign === '/' ? -1 : 1);
		}
		return null;
	}

	private separator(outermost: boolean): '' | '/' | '·' {
		const start = this.at;
		this.skip(SPACE);
		const spaced = this.at > start;
		const sign = this.text[this.at] ?? '';
		if (sign !== '' && '/*·⋅×'.includes(sign)) {
			this.at += 1;
			const after = this.at;
			this.skip(SPACE);
			if (this.tight && outermost && (spaced || this.at > after)) return '';
			return sign === '/' ? '/' : '·';
		}
		return spaced ? '·' : '';
	}

	private factor(divisor = false): Unit | null {
		if (divisor && this.text[this.at] === '(') return this.group();
		const from = this.at;
		const name = this.take(NAME)?.[0].replace(' ', '_');
		const definition = name === undefined ? undefined : UNITS.get(name);
		// A longer name only begins like a unit (m_lift, h2), and what opens a parenthesis is a function.
		if (!definition || /[\p{L}\p{Nd}_(.]/u.test(this.text[this.at] ?? '')) {
			this.at = from;
			return null;
		}
		const names = [{ name: name!, from, to: this.at }];
		const power = this.power();
		const { factor, dimension, offset = 0 } = definition;
		if (power === 1) return { text: '', factor, offset, dimension, names };
		return {
			text: '',
			factor: factor ** power,
			offset: 0,
			dimension: toPower(dimension, power),
			names
		};
	}

	private group(): Unit | null {
		const from = this.at;
		this.at += 1;
		const unit = this.product(false);
		if (unit && this.text[this.at] === ')') {
			this.at += 1;
			return unit;
		}
		this.at = from;
		return null;
	}

	private power(): number {
		const found = this.take(POWER);
		if (!found) return 1;
		if (found[4]) return raisedNumber(found[4]);
		return Number((found[1] ?? found[2])!.replace('\u2212', '-')) / Number(found[3] ?? 1);
	}

	private take(pattern: RegExp) {
		pattern.lastIndex = this.at;
		const found = pattern.exec(this.text);
		if (found) this.at = pattern.lastIndex;
		return found;
	}

	private skip(pattern: RegExp) {
		this.take(pattern);
	}
}

/** In a product a temperature unit is a difference: W/(m °C) is W/(m K). */
function joined(a: Unit, b: Unit, sign: 1 | -1): Unit {
	return {
		text: '',
		factor: sign === 1 ? a.factor * b.factor : a.factor / b.factor,
		offset: 0,
		dimension: times(a.dimension, toPower(b.dimension, sign)),
		names: [...a.names, ...b.names]
	};
}

const raisedNumber = (raised: string) =>
	Number([...raised].map((sign) => (sign === '⁻' ? '-' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign))).join(''));
