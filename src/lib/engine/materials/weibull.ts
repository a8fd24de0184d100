/** The two-parameter Weibull distribution, fitted by maximum likelihood, and its lower tolerance limits. */
import { gammaQ } from '../numerics/gamma';
import { integrate } from '../numerics/quadrature';
import { root } from '../numerics/root';
import { Refused } from '../methods/refused';

export type Weibull = { scale: number; shape: number };

/** Logarithms of the values about their mean: the data scaled by their geometric mean. */
function scaled(values: readonly number[]) {
	const logs = values.map(Math.log);
	const centre = logs.reduce((sum, y) => sum + y, 0) / logs.length;
	return { centre, logs: logs.map((y) => y - centre) };
}

/** @throws Refused when all values are the same. */
export function fitWeibull(values: readonly number[]): Weibull {
	const { centre, logs } = scaled(values);
	const most = Math.max(...logs);
	if (!(most > 0)) throw new Refused('All results are the same: nothing can be fitted to them.');
	// Σ x^β ln x/Σ x^β − 1/β = mean ln x = 0, each power against the largest so that none overflows.
	const off = (shape: number) => {
		let [weight, sum] = [0, 0];
		for (const y of logs) {
			const power = Math.exp(shape * (y - most));
			weight += power;
			sum += power * y;
		}
		return sum / weight - 1 / shape;
	};
	let high = 1 / most;
	while (off(high) < 0) high *= 2;
	let low = high;
	while (off(low) > 0) low /= 2;
	const shape = root(off, low, high);
	const mean = logs.reduce((sum, y) => sum + Math.exp(shape * (y - most)), 0) / logs.length;
	return { shape, scale: Math.exp(centre + most + Math.log(mean) / shape) };
}

/**
 * Lower limit for the value that a share P exceeds, with confidence γ, exact by conditioning on the
 * ancillaries (J. F. Lawless, Statistical Models and Methods for Lifetime Data): with y = ln x, b = 1/β and
 * S(b) = Σ e^{y_i/b}, b has the density b^{−n} S^{−n} and u = ln α follows from a gamma variable, so that
 * P(limit ≤ y) = ∫ p(b) Q(n, S(b) e^{w − y/b}) db with w = ln(−ln P).
 */
export function weibullLimit(values: readonly number[], share: number, confidence: number): number {
	const n = values.length;
	const { centre, logs } = scaled(values);
	const { shape } = fitWeibull(values);
	const most = Math.max(...logs);
	const w = Math.log(-Math.log(share));
	// ln S(b), against the largest term.
	const lnSum = (b: number) =>
		most / b + Math.log(logs.reduce((sum, y) => sum + Math.exp((y - most) / b), 0));
	// In ln b, where the density is nearly even-sided; Σ y_i = 0.
	const lnDensity = (lnB: number) => {
		const b = Math.exp(lnB);
		return (1 - n) * lnB - n * lnSum(b);
	};
	const centreB = -Math.log(shape);
	const peak = lnDensity(centreB);
	const density = (lnB: number) => Math.exp(lnDensity(lnB) - peak);
	const step = 1 / Math.sqrt(n);
	let [low, high] = [centreB, centreB];
	while (density(low) > 1e-22) low -= step;
	while (density(high) > 1e-22) high += step;
	const edges = Array.from({ length: 9 }, (_, i) => low + ((high - low) * i) / 8);
	const whole = integrate(density, edges, 1e-12).value;
	const below = (y: number) =>
		integrate(
			(lnB) => {
				const b = Math.exp(lnB);
				return density(lnB) * gammaQ(n, Math.exp(lnSum(b) + w - y / b));
			},
			edges,
			1e-11
		).value / whole;
	const off = (y: number) => below(y) - (1 - confidence);
	const spread = 1 / shape;
	let [least, greatest] = [w * spread - spread, w * spread + spread];
	for (let by = spread; off(least) > 0; by *= 2) least -= by;
	for (let by = spread; off(greatest) < 0; by *= 2) greatest += by;
	return Math.exp(centre + root(off, least, greatest));
}
