/**
 * How line, counterweight and their total follow the radius of the top, r_t, for the exact taper. The total only
 * falls: d(total)/dr_t = σ_d A g′/g² < 0. So no r_t is best by mass; told is where the total comes near that at the range's top.
 */
import type { Told } from '../methods/parameter';
import { lnSum, told } from '../numerics/logarithm';
import { gradedTowards, integrate } from '../numerics/quadrature';
import { root } from '../numerics/root';
import type { Field } from './field';
import type { TaperShape } from './taper';

export type TradePoint = {
	/** r_t, m */
	top: number;
	line: Told;
	counterweight: Told;
	total: Told;
};

/**
 * @param lnPeak ln A(r_s), m²
 * @param tops r_t upwards, m, all beyond r_s
 */
export function tradeCurve(
	field: Field,
	{ lnMass, lnCounterweight }: TaperShape,
	lnPeak: number,
	tops: readonly number[]
): TradePoint[] {
	let line = lnMass(field.balance, field.base);
	let reached = field.balance;
	return tops.map((top) => {
		line = lnSum(line, lnMass(reached, top));
		reached = top;
		const counterweight = lnCounterweight(top);
		return {
			top,
			line: told(lnPeak + line),
			counterweight: told(lnPeak + counterweight),
			total: told(lnPeak + lnSum(line, counterweight))
		};
	});
}

/**
 * The least r_t at which the total is within the fraction `share` of the total at `rangeTop`; the lowest permitted top,
 * r_s (1 + 1e-9), where it is so everywhere.
 */
export function topWithin(
	field: Field,
	{ k, lnArea, lnMass, lnCounterweight }: TaperShape,
	{ designStress, rangeTop, share }: { designStress: number; rangeTop: number; share: number }
): number {
	const { balance, base, g, along } = field;
	// Over σ_d A(r_s), in which nothing overflows.
	const scaled = (ln: number) => Math.exp(ln - Math.log(designStress));
	const total = (top: number) =>
		scaled(lnMass(balance, base)) + scaled(lnMass(balance, top)) + scaled(lnCounterweight(top));
	const least = total(rangeTop);
	const wanted = share * least;
	const lowest = balance * (1 + 1e-9);
	if (total(lowest) - least <= wanted) return lowest;
	// In ln(r − r_s), in which the total falls evenly.
	const topAt = (u: number) => balance + Math.exp(u);
	const last = Math.log(rangeTop - balance);
	const close = root(
		(u) => (u === last ? 0 : total(topAt(u)) - least) - wanted,
		Math.log(lowest - balance),
		last
	);
	// The difference of two totals loses the digits of a small share; its integral does not.
	const slope = (r: number) => (Math.exp(lnArea(r)) * along(r)) / g(r) ** 2;
	let top = topAt(close);
	for (let i = 0; i < 3; i += 1) {
		// Over this distance A/g² has fallen to a fraction.
		const fall = (2 * along(top)) / g(top) + k * -g(top);
		const edges = gradedTowards(top, rangeTop, 1 / fall);
		const noise = 2 ** -52 * top * fall * Math.abs(slope(top));
		const excess = -integrate(slope, edges, 1e-11, noise).value;
		top -= (excess - wanted) / slope(top);
	}
	return top;
}
