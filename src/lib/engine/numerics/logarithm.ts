/** Figures held by their natural logarithm, so that neither 1e400 nor 1e-400 is lost. */
import type { Told } from '../methods/parameter';

/** ln(eᵃ + eᵇ); either may be −Infinity, the logarithm of nothing. */
export function lnSum(a: number, b: number): number {
	const [large, small] = a > b ? [a, b] : [b, a];
	return small === -Infinity ? large : large + Math.log1p(Math.exp(small - large));
}

const LARGEST_LN = 300 * Math.LN10;

/** The figure itself up to 1e300, its decimal logarithm above; below 1e-323 it is 0. */
export const told = (ln: number): Told =>
	ln <= LARGEST_LN ? Math.exp(ln) : { log10: ln / Math.LN10 };

export const lnOf = (figure: Told): number =>
	typeof figure === 'number' ? Math.log(figure) : figure.log10 * Math.LN10;
