/** Figures and units as people read them. Used on the page too, so it carries no unit table. */

const THIN = '\u202f';
const MINUS = '\u2212';
const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Values from here on, and below this, are written with a power of ten. */
const LARGEST_PLAIN = 1e7;
const SMALLEST_PLAIN = 1e-3;

/**
 * A value to so many significant digits: "1 494", "3.906", "−0.056", "1.70×10³³". Digits before the
 * point are never rounded away in plain notation (1 494 stays 1 494 at three digits).
 */
export function formatFigure(value: number, digits: number): string {
	const parts = figureParts(value, digits);
	if (!parts) return '—';
	const sign = parts.negative ? MINUS : '';
	const power = parts.power === null ? '' : `×10${raised(parts.power)}`;
	return sign + grouped(parts.mantissa, THIN) + power;
}

/** A distance in whole kilometres, for words: "35 786 km". */
export const kilometres = (metres: number) => `${formatFigure(Math.round(metres / 1e3), 1)} km`;

/** A distance for words, where the place itself matters: "42 164.17 km", "812.500 m". */
export const distance = (metres: number) =>
	Math.abs(metres) < 1e3 ? `${formatFigure(metres, 6)} m` : `${formatFigure(metres / 1e3, 7)} km`;

/** A value to so many digits for KaTeX. */
export function figureTex(value: number, digits: number): string {
	const parts = figureParts(value, digits);
	if (!parts) return '\\text{—}';
	const power = parts.power === null ? '' : `\\times 10^{${parts.power}}`;
	return (parts.negative ? '-' : '') + grouped(parts.mantissa, '\\,') + power;
}

type Parts = { negative: boolean; mantissa: string; power: number | null };

/** Null for what is no finite number, which no result is. */
function figureParts(value: number, digits: number): Parts | null {
	if (!Number.isFinite(value)) return null;
	const significant = Math.min(15, Math.max(1, Math.round(digits) || 4));
	const size = Math.abs(value);
	if (size === 0) return { negative: false, mantissa: '0', power: null };
	const rounded = Number(size.toPrecision(significant));
	if (rounded >= LARGEST_PLAIN || rounded < SMALLEST_PLAIN) {
		const [mantissa, exponent] = size.toExponential(significant - 1).split('e');
		return { negative: value < 0, mantissa: mantissa!, power: Number(exponent) };
	}
	const exponent = Math.floor(Math.log10(rounded));
	const decimals = Math.max(0, significant - 1 - exponent);
	return { negative: value < 0, mantissa: size.toFixed(decimals), power: null };
}

function grouped(mantissa: string, space: string): string {
	const [whole, decimals] = mantissa.split('.');
	const groups = whole!.replace(/\B(?=(\d{3})+$)/g, space);
	return decimals === undefined ? groups : `${groups}.${decimals}`;
}

const raised = (power: number) =>
	(power < 0 ? '⁻' : '') + String(Math.abs(power)).replace(/\d/g, (d) => RAISED[Number(d)]!);

const WORDS: Record<string, string> = {
	degC: '°C',
	degF: '°F',
	deg: '°',
	ohm: 'Ω',
	arcmin: '′',
	arcsec: '″',
	sidereal_day: 'sidereal day',
	inch: 'in'
};

/** A unit as typed, in print: "kg/m^3" → "kg/m³", "kg m^-3" → "kg·m⁻³", "um" → "µm". */
export function unitText(unit: string): string {
	return unit
		.trim()
		.replace(/sidereal[ _]day/g, 'sidereal_day')
		.replace(/\s*([/*·⋅×])\s*/g, '$1')
		.replace(/[*⋅×\s]+/g, '·')
		.replace(/\^\(?([-\u2212]?\d+)\)?/g, (_, power: string) =>
			raised(Number(power.replace(MINUS, '-')))
		)
		.replace(/[\p{L}_°%]+/gu, (name) => WORDS[name] ?? name.replace(/^u(?=\p{L})/u, 'µ'));
}
