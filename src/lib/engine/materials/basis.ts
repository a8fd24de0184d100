/** Basis values: what a share P of the population exceeds, with confidence γ. */
import { betaI } from '../numerics/gamma';
import { toleranceFactor } from '../numerics/tolerance';
import { summarise } from './sample';
import { weibullLimit } from './weibull';

export type Basis = { share: number; confidence: number };

export const A_BASIS: Basis = { share: 0.99, confidence: 0.95 };
export const B_BASIS: Basis = { share: 0.9, confidence: 0.95 };

export type NormalBasis = {
	value: number;
	factor: number;
	/** s √(1/n + k²/(2(n − 1))) */
	standardError: number;
};

export function normalBasis(values: readonly number[], { share, confidence }: Basis): NormalBasis {
	const { n, mean, deviation } = summarise(values);
	const factor = toleranceFactor(n, share, confidence);
	return {
		factor,
		value: mean - factor * deviation,
		standardError: deviation * Math.sqrt(1 / n + factor ** 2 / (2 * (n - 1)))
	};
}

export const lognormalBasis = (values: readonly number[], basis: Basis): number =>
	Math.exp(normalBasis(values.map(Math.log), basis).value);

export const weibullBasis = (values: readonly number[], { share, confidence }: Basis): number =>
	weibullLimit(values, share, confidence);

/**
 * The rank r whose order statistic is the limit whatever the distribution: the largest with
 * P(Bin(n, 1 − P) ≥ r) ≥ γ; 0 where there are too few specimens.
 */
export function orderRank(n: number, { share, confidence }: Basis): number {
	const holds = (r: number) => betaI(1 - share, r, n - r + 1) >= confidence;
	if (!holds(1)) return 0;
	let [low, high] = [1, n + 1];
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (middle <= n && holds(middle)) low = middle;
		else high = middle;
	}
	return low;
}

/** Least number of specimens for a limit whatever the distribution: P^n ≤ 1 − γ. */
export const leastSpecimens = ({ share, confidence }: Basis): number =>
	Math.ceil(Math.log1p(-confidence) / Math.log(share) - 1e-12);
