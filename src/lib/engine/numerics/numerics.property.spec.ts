/** What holds of quadrature, differences, banded systems and samples, whatever they are given. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, banded, factorise, solve } from './banded';
import { derivatives } from './derivative';
import { gauss16 } from './gauss';
import { lobatto } from './lobatto';
import { lnOf, lnSum, told } from './logarithm';
import { integrate } from './quadrature';
import { histogram, meanAndDeviation, quantile7 } from './sample';

const figure = fc.integer({ min: -1000, max: 1000 }).map((n) => n / 64);
const coefficients = (most: number) => fc.array(figure, { minLength: 1, maxLength: most });
const at = (c: readonly number[], x: number) => c.reduceRight((sum, a) => sum * x + a, 0);
const primitive = (c: readonly number[]) => [0, ...c.map((a, i) => a / (i + 1))];
const size = (c: readonly number[]) => 1 + c.reduce((sum, a) => sum + Math.abs(a), 0);
const ends = fc.tuple(
	fc.double({ min: -1, max: 0, noNaN: true }),
	fc.double({ min: 0.01, max: 1, noNaN: true })
);

describe('quadrature', () => {
	it('is exact for polynomials: Gauss of 16 nodes to degree 31, Kronrod’s rule to 22', () => {
		fc.assert(
			fc.property(coefficients(32), ends, (c, [from, to]) => {
				const exact = at(primitive(c), to) - at(primitive(c), from);
				expect(Math.abs(gauss16((x) => at(c, x), from, to) - exact)).toBeLessThan(1e-13 * size(c));
				const low = c.slice(0, 23);
				const wanted = at(primitive(low), to) - at(primitive(low), from);
				const { value } = integrate((x) => at(low, x), [from, to], 1e-12);
				expect(Math.abs(value - wanted)).toBeLessThan(1e-12 * size(low));
			})
		);
	});

	it('comes to the same over parts, and with the opposite sign backwards in Gauss’s rule', () => {
		fc.assert(
			fc.property(ends, fc.double({ min: 0.1, max: 3, noNaN: true }), ([from, to], k) => {
				const f = (x: number) => Math.exp(-k * x * x) + Math.abs(x) ** 1.5;
				const whole = integrate(f, [from, 0, to], 1e-11).value;
				const parts = integrate(f, [from, 0], 1e-11).value + integrate(f, [0, to], 1e-11).value;
				expect(Math.abs(whole - parts)).toBeLessThan(1e-9);
				expect(gauss16(f, from, to)).toBeCloseTo(-gauss16(f, to, from), 14);
			})
		);
	});

	it('with nodes at both ends (Lobatto) is exact to degree 2p − 1 (A&S 25.4.32)', () => {
		fc.assert(
			fc.property(fc.integer({ min: 2, max: 14 }), coefficients(28), (order, all) => {
				const c = all.slice(0, 2 * order);
				const { nodes, weights, derivative } = lobatto(order);
				const exact = at(primitive(c), 1) - at(primitive(c), -1);
				const sum = nodes.reduce((total, x, i) => total + weights[i]! * at(c, x), 0);
				expect(Math.abs(sum - exact)).toBeLessThan(1e-12 * size(c));
				const low = c.slice(0, order + 1);
				const slope = low.slice(1).map((a, i) => a * (i + 1));
				nodes.forEach((x, i) => {
					const found = nodes.reduce(
						(total, y, j) => total + derivative[i * (order + 1) + j]! * at(low, y),
						0
					);
					expect(Math.abs(found - at(slope, x))).toBeLessThan(1e-10 * size(low) * order ** 2);
				});
			})
		);
	});
});

describe('differences', () => {
	it('come to the slope of a polynomial', () => {
		fc.assert(
			fc.property(coefficients(8), fc.double({ min: -2, max: 2, noNaN: true }), (c, x) => {
				const slope = at(
					c.slice(1).map((a, i) => a * (i + 1)),
					x
				);
				const [found] = derivatives((offset) => Float64Array.of(at(c, x + offset)), 1, 0.1);
				expect(Math.abs(found! - slope)).toBeLessThan(1e-9 * size(c) * 2 ** c.length);
			})
		);
	});
});

describe('a banded system', () => {
	it('is solved: the matrix times what was found is the right-hand side', () => {
		const system = fc.integer({ min: 1, max: 12 }).chain((n) =>
			fc.record({
				n: fc.constant(n),
				band: fc.integer({ min: 0, max: Math.min(3, n - 1) }),
				entries: fc.array(figure, { minLength: n * 4, maxLength: n * 4 }),
				right: fc.array(figure, { minLength: n, maxLength: n })
			})
		);
		fc.assert(
			fc.property(system, ({ n, band, entries, right }) => {
				const matrix = banded(n, band);
				const full = Array.from({ length: n }, () => new Float64Array(n));
				for (let i = 0; i < n; i += 1)
					for (let j = Math.max(0, i - band); j <= i; j += 1) {
						// The diagonal outweighs its row, so that no pivot is near zero; signs as they come.
						const value = i === j ? 100 + Math.abs(entries[4 * i]!) : entries[4 * i + (i - j)]!;
						const signed = i === j && entries[4 * i]! < 0 ? -value : value;
						add(matrix, i, j, signed);
						full[i]![j] = full[j]![i] = signed;
					}
				const x = Float64Array.from(right);
				const negative = factorise(matrix);
				solve(matrix, x);
				full.forEach((row, i) => {
					const found = row.reduce((sum, a, j) => sum + a * x[j]!, 0);
					expect(Math.abs(found - right[i]!)).toBeLessThan(1e-11 * (1 + Math.abs(right[i]!)));
				});
				// Gershgorin: as many negative eigenvalues as negative entries on such a diagonal.
				expect(negative).toBe(full.filter((row, i) => row[i]! < 0).length);
			})
		);
	});
});

describe('figures held by their logarithm', () => {
	it('add up as they are', () => {
		const ln = fc.double({ min: -600, max: 600, noNaN: true });
		fc.assert(
			fc.property(ln, ln, (a, b) => {
				expect(lnSum(a, b)).toBe(lnSum(b, a));
				expect(lnSum(a, b)).toBeGreaterThanOrEqual(Math.max(a, b));
				expect(lnSum(a, a)).toBeCloseTo(a + Math.LN2, 10);
				expect(lnOf(told(a))).toBeCloseTo(a, 9);
				expect(lnSum(a, -Infinity)).toBe(a);
			})
		);
	});
});

describe('a sample', () => {
	const sample = fc.array(figure, { minLength: 2, maxLength: 60 });

	it('has its quantiles between its ends, and moves and scales with its figures', () => {
		fc.assert(
			fc.property(
				sample,
				fc.double({ min: 0, max: 1, noNaN: true }),
				figure,
				(figures, p, shift) => {
					const sorted = Float64Array.from(figures).sort();
					const q = quantile7(sorted, p);
					expect(q).toBeGreaterThanOrEqual(sorted[0]!);
					expect(q).toBeLessThanOrEqual(sorted.at(-1)!);
					const moved = meanAndDeviation(sorted.map((x) => 2 * x + shift));
					const { mean, s } = meanAndDeviation(sorted);
					expect(moved.mean).toBeCloseTo(2 * mean + shift, 10);
					expect(moved.s).toBeCloseTo(2 * s, 10);
				}
			)
		);
	});

	it('has all its figures in its histogram', () => {
		fc.assert(
			fc.property(sample, fc.integer({ min: 1, max: 30 }), (figures, bins) => {
				const sorted = Float64Array.from(figures).sort();
				const { edges, counts } = histogram(sorted, bins);
				expect(counts.reduce((sum, count) => sum + count, 0)).toBe(figures.length);
				expect(edges).toHaveLength(counts.length + 1);
				expect([edges[0], edges.at(-1)]).toEqual([sorted[0], sorted.at(-1)]);
			})
		);
	});
});
