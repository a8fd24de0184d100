/**
 * Dimensions as exponents of mass, length, time, temperature, current, amount of substance and
 * luminous intensity. Plane angle is a pure number (radian = 1), as the SI has it.
 */
export type Dimension = readonly number[];

const SYMBOLS = ['M', 'L', 'T', 'Θ', 'I', 'N', 'J'] as const;
const TEX = ['M', 'L', 'T', '\\Theta', 'I', 'N', 'J'] as const;

/** Exponents in the order mass, length, time, temperature; the rest zero. */
export const dimension = (...exponents: number[]): Dimension =>
	SYMBOLS.map((_, index) => exponents[index] ?? 0);

export const PURE: Dimension = dimension();
export const MASS = dimension(1);
export const LENGTH = dimension(0, 1);
export const TIME = dimension(0, 0, 1);
export const TEMPERATURE = dimension(0, 0, 0, 1);
export const AREA = dimension(0, 2);
export const VELOCITY = dimension(0, 1, -1);
export const ACCELERATION = dimension(0, 1, -2);
export const FORCE = dimension(1, 1, -2);
export const PRESSURE = dimension(1, -1, -2);
export const ENERGY = dimension(1, 2, -2);
export const POWER = dimension(1, 2, -3);
export const DENSITY = dimension(1, -3);
export const SPECIFIC_STRENGTH = dimension(0, 2, -2);

export const times = (a: Dimension, b: Dimension): Dimension => a.map((e, i) => tidy(e + b[i]!));
export const over = (a: Dimension, b: Dimension): Dimension => a.map((e, i) => tidy(e - b[i]!));
export const toPower = (a: Dimension, power: number): Dimension => a.map((e) => tidy(e * power));
export const equal = (a: Dimension, b: Dimension) => a.every((e, i) => e === b[i]);
export const isPure = (a: Dimension) => a.every((e) => e === 0);

/** Exponents are rationals of small denominator; 5040 holds all of 1 to 10, so that ⅓ + ⅔ is 1. */
const tidy = (exponent: number) => Math.round(exponent * 5040) / 5040 + 0;

const NAMES: [Dimension, string][] = [
	[PURE, 'a pure number'],
	[MASS, 'a mass'],
	[LENGTH, 'a length'],
	[TIME, 'a time'],
	[TEMPERATURE, 'a temperature'],
	[AREA, 'an area'],
	[dimension(0, 3), 'a volume'],
	[dimension(0, 0, -1), 'a rate'],
	[VELOCITY, 'a velocity'],
	[ACCELERATION, 'an acceleration'],
	[FORCE, 'a force'],
	[PRESSURE, 'a pressure or stress'],
	[ENERGY, 'an energy'],
	[POWER, 'a power'],
	[DENSITY, 'a density'],
	[SPECIFIC_STRENGTH, 'a specific strength'],
	[dimension(1, -1), 'a mass per length'],
	[dimension(1, -2), 'a mass per area'],
	[dimension(1, 0, -1), 'a mass rate'],
	[dimension(1, 1, -1), 'a momentum'],
	[dimension(1, 0, -2), 'a stiffness'],
	[dimension(0, 3, -2), 'a gravitational parameter'],
	[dimension(0, -2, -1), 'a flux'],
	[dimension(0, 0, 0, -1), 'an expansion coefficient'],
	[dimension(0, 0, 0, 0, 1), 'a current'],
	[dimension(0, 0, 1, 0, 1), 'a charge'],
	[dimension(1, 2, -3, 0, -1), 'a voltage'],
	[dimension(0, 0, 0, 0, 0, 1), 'an amount of substance']
];

/** "M L⁻¹ T⁻²"; "1" for a pure number. */
export function dimensionText(d: Dimension): string {
	const parts = d.flatMap((e, i) => (e === 0 ? [] : [SYMBOLS[i]! + superscript(e)]));
	return parts.join(' ') || '1';
}

/** The same for KaTeX: \mathsf{M}\,\mathsf{L}^{-1}\,\mathsf{T}^{-2}. */
export function dimensionTex(d: Dimension): string {
	const parts = d.flatMap((e, i) => {
		if (e === 0) return [];
		return [`\\mathsf{${TEX[i]!}}` + (e === 1 ? '' : `^{${fraction(e)}}`)];
	});
	return parts.join('\\,') || '1';
}

/** "a pressure or stress, M L⁻¹ T⁻²", or "of dimension M² L" where the trade has no name. */
export function inWords(d: Dimension): string {
	if (isPure(d)) return 'a pure number';
	const named = NAMES.find(([known]) => equal(known, d));
	return named ? `${named[1]}, ${dimensionText(d)}` : `of dimension ${dimensionText(d)}`;
}

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** "⁻²"; nothing for 1; "^(1/2)" for a fraction, for which there are no raised signs. */
export function superscript(exponent: number): string {
	if (exponent === 1) return '';
	const text = fraction(exponent);
	if (text.includes('/')) return `^(${text})`;
	return text.replace('-', '⁻').replace(/\d/g, (digit) => RAISED[Number(digit)]!);
}

/** "-2", "1/3": the exponent as a fraction in lowest terms. */
export function fraction(exponent: number): string {
	for (let denominator = 1; denominator <= 10; denominator += 1) {
		const numerator = exponent * denominator;
		if (Math.abs(numerator - Math.round(numerator)) < 1e-6) {
			return denominator === 1
				? `${Math.round(numerator)}`
				: `${Math.round(numerator)}/${denominator}`;
		}
	}
	return exponent.toFixed(4);
}
