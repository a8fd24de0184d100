/**
 * How the outputs of a Monte Carlo run moved with its givens: sums of products about shifted origins,
 * gathered sample by sample, and the linear regression of each output on the givens.
 */
import type { Matrix } from './correlation';
import type { Moments } from './moments';

export type Regression = {
	/** b_i² s_i² over the variance of the output. */
	shares: number[];
	/** 2 b_i b_j s_ij over it, for the pairs asked for. */
	covariances: number[];
	/** What is not linear in the givens, and what chance left: 1 less all of the above. */
	rest: number;
};

export type Comovement = {
	add: (x: Float64Array, y: Float64Array) => void;
	/** The linear correlation of two givens as drawn. */
	correlation: (i: number, j: number) => number;
	/** Of output k. */
	regression: (k: number, pairs: readonly (readonly [number, number])[]) => Regression;
};

/** A given that follows from those before it to this share adds nothing of its own. */
const FOLLOWS = 1e-10;

export function comovement(givens: readonly Moments[], outputs: number): Comovement {
	const n = givens.length;
	const size = n + outputs;
	const centre = new Float64Array(size);
	const scale = new Float64Array(size);
	givens.forEach(({ mean, u }, i) => {
		centre[i] = mean;
		scale[i] = 1 / u;
	});
	const values = new Float64Array(size);
	const sums = new Float64Array(size);
	const products = new Float64Array(size * size);
	let count = 0;

	/** Sum of products about the means, in units of the scales. */
	const about = (a: number, b: number) =>
		products[Math.min(a, b) * size + Math.max(a, b)]! - (sums[a]! * sums[b]!) / count;

	return {
		add(x, y) {
			if (count === 0)
				y.forEach((first, k) => {
					centre[n + k] = first;
					scale[n + k] = 1 / (Math.abs(first) || 1);
				});
			for (let a = 0; a < n; a += 1) values[a] = (x[a]! - centre[a]!) * scale[a]!;
			for (let a = n; a < size; a += 1) values[a] = (y[a - n]! - centre[a]!) * scale[a]!;
			for (let a = 0; a < size; a += 1) {
				sums[a]! += values[a]!;
				if (a >= n) products[a * size + a]! += values[a]! ** 2;
				else for (let b = a; b < size; b += 1) products[a * size + b]! += values[a]! * values[b]!;
			}
			count += 1;
		},
		correlation(i, j) {
			const spread = Math.sqrt(about(i, i) * about(j, j));
			return spread > 0 ? about(i, j) / spread : 0;
		},
		regression(k, pairs) {
			const total = about(n + k, n + k);
			const matrix = givens.map((_, i) => Float64Array.from(givens, (_, j) => about(i, j)));
			const right = Float64Array.from(givens, (_, i) => about(i, n + k));
			const b = solve(matrix, right);
			const share = (term: number) => (total > 0 && Number.isFinite(term) ? term / total : 0);
			const shares = givens.map((_, i) => share(b[i]! ** 2 * about(i, i)));
			const covariances = pairs.map(([i, j]) => share(2 * b[i]! * b[j]! * about(i, j)));
			const told = [...shares, ...covariances].reduce((sum, each) => sum + each, 0);
			return { shares, covariances, rest: total > 0 ? 1 - told : 0 };
		}
	};
}

/** Normal equations by Cholesky's factor; a given that follows from those before it gets 0. */
function solve(matrix: Matrix, right: Float64Array): Float64Array {
	const n = right.length;
	const l = matrix.map((row) => Float64Array.from(row));
	const z = new Float64Array(n);
	for (let i = 0; i < n; i += 1) {
		for (let j = 0; j <= i; j += 1) {
			let rest = matrix[i]![j]!;
			for (let k = 0; k < j; k += 1) rest -= l[i]![k]! * l[j]![k]!;
			if (i === j) l[i]![i] = rest > FOLLOWS * matrix[i]![i]! ? Math.sqrt(rest) : 0;
			else l[i]![j] = l[j]![j]! > 0 ? rest / l[j]![j]! : 0;
		}
		let rest = right[i]!;
		for (let k = 0; k < i; k += 1) rest -= l[i]![k]! * z[k]!;
		z[i] = l[i]![i]! > 0 ? rest / l[i]![i]! : 0;
	}
	const b = new Float64Array(n);
	for (let i = n - 1; i >= 0; i -= 1) {
		let rest = z[i]!;
		for (let k = i + 1; k < n; k += 1) rest -= l[k]![i]! * b[k]!;
		b[i] = l[i]![i]! > 0 ? rest / l[i]![i]! : 0;
	}
	return b;
}
