/** Symmetric matrices with entries near the diagonal only, and their factors L D Lᵀ. */

/** Row i holds its entries from column i − band to i, at [i (band + 1) + band − (i − j)]. */
export type Banded = { size: number; band: number; entries: Float64Array };

export const banded = (size: number, band: number): Banded => ({
	size,
	band,
	entries: new Float64Array(size * (band + 1))
});

export function add(matrix: Banded, i: number, j: number, value: number): void {
	const { band, entries } = matrix;
	const [row, column] = i >= j ? [i, j] : [j, i];
	entries[row * (band + 1) + band - (row - column)]! += value;
}

/**
 * Turns the matrix into its factors in place and counts the negative pivots: by Sylvester's law of inertia
 * as many as it has negative eigenvalues. Without pivoting; a pivot of zero is moved by a rounding error.
 */
export function factorise({ size, band, entries }: Banded): number {
	const width = band + 1;
	let negative = 0;
	let scale = 0;
	for (let i = 0; i < size; i += 1) scale = Math.max(scale, Math.abs(entries[i * width + band]!));
	const least = scale * 1e-300 || Number.MIN_VALUE;
	for (let i = 0; i < size; i += 1) {
		const row = i * width + band - i;
		const first = Math.max(0, i - band);
		// Row i of L D first, then of L.
		for (let j = first; j < i; j += 1) {
			const other = j * width + band - j;
			let sum = entries[row + j]!;
			for (let k = Math.max(first, j - band); k < j; k += 1)
				sum -= entries[row + k]! * entries[other + k]!;
			entries[row + j] = sum;
		}
		let pivot = entries[row + i]!;
		for (let j = first; j < i; j += 1) {
			const product = entries[row + j]!;
			const below = product / entries[j * width + band]!;
			entries[row + j] = below;
			pivot -= product * below;
		}
		if (Math.abs(pivot) < least) pivot = least;
		if (pivot < 0) negative += 1;
		entries[row + i] = pivot;
	}
	return negative;
}

/** Solves in place for the right-hand side `x`, with the factors that `factorise` left. */
export function solve({ size, band, entries }: Banded, x: Float64Array): void {
	const width = band + 1;
	for (let i = 0; i < size; i += 1) {
		const row = i * width + band - i;
		let sum = x[i]!;
		for (let j = Math.max(0, i - band); j < i; j += 1) sum -= entries[row + j]! * x[j]!;
		x[i] = sum;
	}
	for (let i = 0; i < size; i += 1) x[i]! /= entries[i * width + band]!;
	for (let i = size - 1; i >= 0; i -= 1) {
		const row = i * width + band - i;
		for (let j = Math.max(0, i - band); j < i; j += 1) x[j]! -= entries[row + j]! * x[i]!;
	}
}
