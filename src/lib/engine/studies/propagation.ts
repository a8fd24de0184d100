/**
 * The law of propagation of uncertainty, first order (JCGM 100, 5.1 and 5.2):
 * u²(y) = Σ c_i² u_i² + 2 Σ c_i c_j r_ij u_i u_j with c = ∂y/∂x, whether the slopes are exact or differences.
 */
import type { Matrix } from './correlation';

export type Propagated = {
	/** Standard uncertainty of the output. */
	u: number;
	/** c_i u_i, with sign. */
	contributions: Float64Array;
	/** Share of the variance of each given on its own; with the shares of the covariances together 1. */
	shares: Float64Array;
	/** A row for each pair that is correlated: 2 c_i c_j r_ij u_i u_j over the variance; may be negative. */
	covariances: { first: number; second: number; share: number }[];
};

/** Below this share of the largest term squared, what is left of terms that cancel is rounding. */
const ROUNDING = 1e-14;

/** Of one output with slopes c. Where nothing changes it, or all cancels, u and the shares are 0. */
export function propagate(slopes: ArrayLike<number>, u: Float64Array, r: Matrix): Propagated {
	const contributions = u.map((each, i) => each * slopes[i]!);
	const scale = contributions.reduce((most, each) => Math.max(most, Math.abs(each)), 0);
	const terms = contributions.map((each) => (scale > 0 ? each / scale : 0));
	const covariances: Propagated['covariances'] = [];
	let variance = 0;
	for (let i = 0; i < terms.length; i += 1) {
		variance += terms[i]! ** 2;
		for (let j = i + 1; j < terms.length; j += 1) {
			if (r[i]![j] === 0) continue;
			const share = 2 * r[i]![j]! * terms[i]! * terms[j]!;
			covariances.push({ first: i, second: j, share });
			variance += share;
		}
	}
	const told = variance > ROUNDING;
	const ofVariance = (term: number) => (told ? term / variance : 0);
	return {
		u: told ? scale * Math.sqrt(variance) : 0,
		contributions,
		shares: terms.map((each) => ofVariance(each ** 2)),
		covariances: covariances.map((row) => ({ ...row, share: ofVariance(row.share) }))
	};
}

/** The correlation of two outputs that follow from the same givens; 0 where one of them has no uncertainty. */
export function outputCorrelation(a: Propagated, b: Propagated, r: Matrix): number {
	if (a.u === 0 || b.u === 0) return 0;
	let sum = 0;
	for (let i = 0; i < r.length; i += 1)
		for (let j = 0; j < r.length; j += 1)
			sum += (a.contributions[i]! / a.u) * r[i]![j]! * (b.contributions[j]! / b.u);
	return Math.max(-1, Math.min(1, sum));
}
