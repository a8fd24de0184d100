import fc from 'fast-check';
import { expect, it } from 'vitest';
import { add, banded, factorise, solve, type Banded } from './banded';
import { lowest } from './spectrum';

const entry = (matrix: Banded, i: number, j: number) => {
	const [row, column] = i >= j ? [i, j] : [j, i];
	const { band, entries } = matrix;
	return row - column > band ? 0 : entries[row * (band + 1) + band - (row - column)]!;
};

/** A random symmetric matrix with a heavy diagonal, so that no pivot vanishes. */
const matrices = fc
	.record({
		size: fc.integer({ min: 1, max: 30 }),
		band: fc.integer({ min: 0, max: 6 }),
		seed: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 60, maxLength: 60 })
	})
	.map(({ size, band, seed }) => {
		const matrix = banded(size, band);
		for (let i = 0; i < size; i += 1) {
			for (let j = Math.max(0, i - band); j < i; j += 1) add(matrix, i, j, seed[(7 * i + j) % 60]!);
			add(matrix, i, i, (seed[i]! < 0 ? -1 : 1) * (2 * band + 1));
		}
		return matrix;
	});

it('solves what it has factorised', () => {
	fc.assert(
		fc.property(matrices, (matrix) => {
			const { size } = matrix;
			const wanted = Float64Array.from({ length: size }, (_, i) => Math.cos(i));
			const right = wanted.map((_, i) =>
				wanted.reduce((sum, x, j) => sum + entry(matrix, i, j) * x, 0)
			);
			factorise(matrix);
			solve(matrix, right);
			right.forEach((x, i) => expect(x).toBeCloseTo(wanted[i]!, 8));
		})
	);
});

it('counts the negative eigenvalues: as many as diagonal signs in a matrix with a heavy diagonal', () => {
	// Gershgorin's circles do not reach zero.
	fc.assert(
		fc.property(matrices, (matrix) => {
			const signs = Array.from({ length: matrix.size }, (_, i) => entry(matrix, i, i) < 0);
			expect(factorise(matrix)).toBe(signs.filter(Boolean).length);
		})
	);
});

/** The chain of n equal masses and springs, held at one end: λ = 4 sin²(π (2k − 1)/(2 (2n + 1))). */
function chain(size: number, shift: number) {
	const stiffness = banded(size, 1);
	for (let i = 0; i < size; i += 1) {
		add(stiffness, i, i, (i === size - 1 ? 1 : 2) + shift);
		if (i > 0) add(stiffness, i, i - 1, -1);
	}
	return {
		matrix: banded(size, 1),
		load(s: number, { entries }: Banded) {
			entries.set(stiffness.entries);
			for (let i = 0; i < size; i += 1) entries[2 * i + 1]! -= s;
		},
		rayleigh(v: Float64Array) {
			let [energy, weight] = [0, 0];
			v.forEach((x, i) => {
				energy += (x - (i === 0 ? 0 : v[i - 1]!)) ** 2 + shift * x * x;
				weight += x * x;
			});
			return energy / weight;
		},
		weigh() {}
	};
}

it('finds the lowest eigenvalues of a chain of masses and springs, none missed, below zero as well', () => {
	fc.assert(
		fc.property(
			fc.integer({ min: 1, max: 60 }),
			fc.constantFrom(0, 3, -0.5, -2.2),
			(size, shift) => {
				const wanted = Math.min(size, 6);
				const found = lowest(chain(size, shift), wanted, 1, -1e6).map(({ value }) => value);
				const exact = Array.from(
					{ length: wanted },
					(_, k) => 4 * Math.sin((Math.PI * (2 * k + 1)) / (2 * (2 * size + 1))) ** 2 + shift
				);
				expect(found).toHaveLength(wanted);
				found.forEach((value, k) => expect(Math.abs(value - exact[k]!)).toBeLessThan(1e-10));
			}
		)
	);
});
