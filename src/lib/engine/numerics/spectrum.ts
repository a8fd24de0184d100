/**
 * The lowest eigenvalues of a symmetric problem L(s) v = 0 whose count below s is the number of negative
 * eigenvalues of L(s): K − s M, and K + s C − s² M for s > 0 with K and M positive definite (there every
 * crossing is downwards, because vᵀ(C − 2 s M) v = −(s vᵀMv + vᵀKv/s)). Each is isolated by the inertia of
 * L D Lᵀ and bisection, and polished by inverse iteration with the Rayleigh quotient, so that none is missed.
 */
import { factorise, solve, type Banded } from './banded';

export type Problem = {
	/** Fills the matrix L(s). */
	load: (s: number, matrix: Banded) => void;
	/** The matrix to fill, kept for all. */
	matrix: Banded;
	/** The s for which vᵀ L(s) v = 0, nearest the eigenvalue when v is near its vector. */
	rayleigh: (v: Float64Array) => number;
	/** M v, in place. */
	weigh: (v: Float64Array) => void;
};

export type Eigenpair = { value: number; vector: Float64Array };

/** Width, as a share of the value, at which an isolated eigenvalue is polished. */
const NARROW = 0.15;
const SAME = 1e-13;
/** Against the guess of the size of the lowest, this is zero. */
const ZERO = 1e-14;

/**
 * @param most how many are wanted, from the lowest
 * @param start a first guess of the size of the lowest, above 0
 * @param floor below it there are none
 */
export function lowest(problem: Problem, most: number, start: number, floor: number): Eigenpair[] {
	const { matrix, load } = problem;
	const wanted = Math.min(most, matrix.size);
	const below = (s: number) => {
		load(s, matrix);
		return factorise(matrix);
	};
	// Sorted; below the floor there are none.
	const samples = [{ s: floor, count: 0 }];
	const sample = (s: number) => {
		const count = below(s);
		const at = samples.findIndex((other) => other.s > s);
		samples.splice(at < 0 ? samples.length : at, 0, { s, count });
		return count;
	};
	for (let s = start, n = 0; sample(s) < wanted && n < 400; n += 1) s *= 4;

	const found: Eigenpair[] = [];
	for (let k = 1; k <= wanted; k += 1) {
		for (let n = 0; n < 200; n += 1) {
			const high = samples.findIndex(({ count }) => count >= k);
			const [lower, upper] = [samples[high - 1]!, samples[high]!];
			const width = upper.s - lower.s;
			const middle = between(lower.s, upper.s);
			const size = Math.max(Math.abs(lower.s), Math.abs(upper.s));
			const isolated = lower.count === k - 1 && upper.count === k;
			if (isolated && width < NARROW * size) {
				const pair = polish(problem, middle, lower.s, upper.s);
				if (pair) {
					found.push(pair);
					break;
				}
			}
			if (width <= SAME * size || size <= ZERO * start) {
				found.push(inverse(problem, middle));
				break;
			}
			sample(middle);
		}
	}
	return found;
}

/** By ratio on each side of zero, where the ends lie far apart; else half way. */
function between(low: number, high: number): number {
	if (low < 0 && high > 0) return 0;
	if (low < 0) return -between(-high, -low);
	if (low === 0) return high / 8;
	return high > 2 * low ? Math.sqrt(low * high) : (low + high) / 2;
}

/** Rayleigh-quotient iteration; null when it leaves the interval that holds the eigenvalue. */
function polish(problem: Problem, start: number, low: number, high: number): Eigenpair | null {
	const pair = inverse(problem, start);
	for (let n = 0; n < 12; n += 1) {
		const { value } = pair;
		if (!(value >= low && value <= high)) return null;
		const next = step(problem, value, pair.vector);
		pair.value = next;
		if (Math.abs(next - value) <= SAME * Math.abs(next)) return pair;
	}
	return null;
}

function inverse(problem: Problem, shift: number): Eigenpair {
	const vector = new Float64Array(problem.matrix.size);
	// No mode is orthogonal to it but by accident.
	for (let i = 0; i < vector.length; i += 1) vector[i] = 1 + 0.5 * Math.sin(1 + 1.7 * i);
	let value = shift;
	for (let n = 0; n < 2; n += 1) value = step(problem, shift, vector);
	return { value, vector };
}

/** One inverse iteration at the shift, in place; answers with the Rayleigh quotient. */
function step({ load, matrix, rayleigh, weigh }: Problem, shift: number, vector: Float64Array) {
	load(shift, matrix);
	factorise(matrix);
	weigh(vector);
	solve(matrix, vector);
	let size = 0;
	for (const x of vector) size = Math.max(size, Math.abs(x));
	for (let i = 0; i < vector.length; i += 1) vector[i]! /= size;
	return rayleigh(vector);
}
