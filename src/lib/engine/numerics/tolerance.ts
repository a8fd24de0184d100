/**
 * One-sided tolerance factors of the normal distribution: x̄ − k s lies below a share P of the population
 * with confidence γ, k = t′_{γ; n−1, z_P √n}/√n with the non-central t. (Natrella, NBS Handbook 91.)
 */
import { normalProbability, normalQuantile } from './normal';
import { stirlingRest } from './gamma';
import { integrate } from './quadrature';
import { root } from './root';

/** P(T′ ≤ t) and its complement, T′ non-central t with ν degrees of freedom: ∫ Φ(ts − δ) f(s) ds, s = χ_ν/√ν. */
export function noncentralT(
	t: number,
	nu: number,
	delta: number
): { below: number; above: number } {
	const a = nu / 2;
	const front = Math.log(2) + 0.5 * Math.log(a / (2 * Math.PI)) - stirlingRest(a);
	// ln f = front + a (1 − s² + 2 ln s) − ln s, free of large terms that cancel.
	const density = (s: number) =>
		s <= 0 ? (nu === 1 ? Math.exp(front + a) : 0) : Math.exp(front + a * curve(s) - Math.log(s));
	const spread = 1 / Math.sqrt(2 * nu);
	const marks = [-9, -4, -2, -1, 0, 1, 2, 4, 9].map((n) => 1 + n * spread);
	const turn = delta / t;
	if (t !== 0) marks.push(...[-8, -3, 0, 3, 8].map((n) => turn + n / Math.abs(t)));
	const least = Math.max(0, 1 - 14 * spread);
	const most = Math.sqrt(1 + 20 * spread + 80 / nu);
	const edges = [least, ...marks.filter((s) => s > least && s < most), most].sort((x, y) => x - y);
	const part = (sign: 1 | -1) =>
		integrate((s) => normalProbability(sign * (t * s - delta)) * density(s), edges, 1e-13).value;
	return { below: part(1), above: part(-1) };
}

/** 1 − s² + 2 ln s, with its digits near s = 1. */
function curve(s: number): number {
	const x = s - 1;
	if (Math.abs(x) > 0.1) return 1 - s * s + 2 * Math.log(s);
	let [term, sum] = [x * x, -2 * x * x];
	for (let n = 3; n < 40; n += 1) {
		term *= -x;
		sum += (-2 * term) / n;
	}
	return sum;
}

/** k for n specimens, share P and confidence γ; n ≥ 2, 0 < P, γ < 1. */
export function toleranceFactor(n: number, share: number, confidence: number): number {
	const size = Math.sqrt(n);
	const delta = normalQuantile(share) * size;
	const off = (t: number) => {
		const { below, above } = noncentralT(t, n - 1, delta);
		return confidence > 0.5 ? 1 - confidence - above : below - confidence;
	};
	let [low, high] = [delta - 4, delta + 4];
	for (let step = 8; off(low) > 0; step *= 2) low -= step;
	for (let step = 8; off(high) < 0; step *= 2) high += step;
	return root(off, low, high) / size;
}
