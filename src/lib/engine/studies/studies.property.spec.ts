/** What holds of studies of any model that is linear, and of draws from any distribution. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { correlationMatrix } from './correlation';
import { drawFrom, type Distribution } from './distribution';
import type { Model } from './model';
import { momentsOf } from './moments';
import { startMonteCarlo } from './monte-carlo';
import { propagate } from './propagation';
import { slopesOf } from './slopes';
import { swingsOf } from './swings';

const size = fc.integer({ min: -30, max: 30 }).map((step) => 10 ** (step / 10));
const signed = fc.tuple(size, fc.boolean()).map(([value, minus]) => (minus ? -value : value));
const given = fc.record({ value: signed, u: size, slope: signed });
const givens = fc.array(given, { minLength: 1, maxLength: 5 });

const linear =
	(slopes: readonly number[]): Model =>
	(x, y) => {
		y[0] = slopes.reduce((sum, slope, i) => sum + slope * x[i]!, 0);
	};
const named = (of: readonly { value: number; u: number }[]) =>
	of.map(({ value, u }, i) => ({ name: `x_${i}`, value, u }));

/** Relative to the largest of the terms that were added. */
const near = (a: number, b: number, scale: number, within: number) =>
	expect(Math.abs(a - b) / scale, `${a} and ${b}`).toBeLessThan(within);

const SECONDS = 60_000;

describe('a linear model of independent givens', () => {
	it('has its coefficients as slopes, and u² = Σ (c u)²', () => {
		fc.assert(
			fc.property(givens, (of) => {
				const coefficients = of.map(({ slope }) => slope);
				const found = slopesOf(linear(coefficients), named(of), 1).map((row) => row[0]!);
				const largest = Math.max(
					...of.map(({ slope, value, u }) => Math.abs(slope * (Math.abs(value) + u)))
				);
				found.forEach((slope, i) =>
					near(slope * of[i]!.u, coefficients[i]! * of[i]!.u, largest, 1e-8)
				);
				const { u, shares } = propagate(
					coefficients,
					Float64Array.from(of, (each) => each.u),
					correlationMatrix(
						named(of).map(({ name }) => name),
						[]
					)
				);
				expect(u / Math.hypot(...of.map((each) => each.slope * each.u))).toBeCloseTo(1, 12);
				expect(shares.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
			})
		);
	});

	it('swings by c u to either side of its estimate', () => {
		fc.assert(
			fc.property(givens, (of) => {
				const reaches = named(of).map((reach) => ({ ...reach, least: undefined, most: undefined }));
				const largest = Math.max(
					...of.map(({ slope, value, u }) => Math.abs(slope * (Math.abs(value) + u)))
				);
				const swings = swingsOf(linear(of.map(({ slope }) => slope)), reaches, 1);
				swings.forEach(({ low, high }, i) => {
					if ('refusal' in low || 'refusal' in high) throw new Error('Refused.');
					const estimate = of.reduce((sum, { slope, value }) => sum + slope * value, 0);
					const swing = of[i]!.slope * of[i]!.u;
					near(high.outputs[0]! - estimate, swing, of.length * largest, 1e-12);
					near(estimate - low.outputs[0]!, swing, of.length * largest, 1e-12);
				});
			})
		);
	});

	it(
		'has by Monte Carlo the same mean and u but for chance, in whatever order its givens come',
		() => {
			fc.assert(
				fc.property(givens, fc.nat(1000), (of, seed) => {
					const study = startMonteCarlo({
						givens: of.map(({ value, u }, i) => ({
							name: `x_${i}`,
							distribution: { kind: 'normal' as const, mean: value, u }
						})),
						correlations: [],
						model: linear(of.map(({ slope }) => slope)),
						outputs: 1,
						checks: [],
						samples: 4000,
						seed
					});
					study.run(4000);
					const { mean, u, p5, p50, p95, least, greatest, regression } = study.statistics(0);
					const exact = Math.hypot(...of.map((each) => each.slope * each.u));
					const centre = of.reduce((sum, { slope, value }) => sum + slope * value, 0);
					// Six standard errors: u/√n of the mean, u/√(2n) of u.
					near(mean, centre, exact, 6 / Math.sqrt(4000));
					near(u, exact, exact, 6 / Math.sqrt(8000));
					expect([least, p5, p50, p95, greatest].toSorted((a, b) => a - b)).toEqual([
						least,
						p5,
						p50,
						p95,
						greatest
					]);
					expect(Math.abs(regression.rest)).toBeLessThan(0.2);
				}),
				{ numRuns: 40 }
			);
		},
		SECONDS
	);
});

const distribution: fc.Arbitrary<Distribution> = fc
	.tuple(
		fc.constantFrom('normal', 'lognormal', 'uniform', 'triangular'),
		size,
		fc.double({ min: 0.01, max: 0.6, noNaN: true }),
		fc.option(
			fc.tuple(
				fc.double({ min: 0.3, max: 0.95, noNaN: true }),
				fc.double({ min: 1.05, max: 2, noNaN: true })
			),
			{
				nil: null
			}
		)
	)
	.map(([kind, mean, relative, bounds]): Distribution => {
		const ends = bounds ? { least: bounds[0] * mean, most: bounds[1] * mean } : {};
		const u = relative * mean;
		if (kind === 'normal' || kind === 'lognormal') return { kind, mean, u, ...ends };
		const [low, high] = [mean - 2 * u, mean + 2 * u];
		return kind === 'uniform'
			? { kind, low, high, ...ends }
			: { kind: 'triangular', low, mode: mean, high, ...ends };
	});

describe('draws', () => {
	const probability = fc.double({ min: 1e-12, max: 1 - 1e-12, noNaN: true });

	it('ascend with the probability and keep within the bounds', () => {
		fc.assert(
			fc.property(distribution, probability, probability, (of, p, q) => {
				const { ofProbability } = drawFrom('x', of);
				const [low, high] = [p, q].toSorted((a, b) => a - b).map(ofProbability);
				expect(low!).toBeLessThanOrEqual(high!);
				for (const x of [low!, high!]) {
					expect(x).toBeGreaterThanOrEqual(of.least ?? -Infinity);
					expect(x).toBeLessThanOrEqual(of.most ?? Infinity);
				}
			}),
			{ numRuns: 400 }
		);
	});

	it(
		'have the mean and standard deviation that are told of them',
		() => {
			fc.assert(
				fc.property(distribution, (of) => {
					const { ofProbability } = drawFrom('x', of);
					const { mean, u } = momentsOf('x', of);
					const n = 20_000;
					const drawn = Array.from({ length: n }, (_, i) => ofProbability((i + 0.5) / n));
					const centre = drawn.reduce((sum, x) => sum + x, 0) / n;
					const spread = Math.sqrt(drawn.reduce((sum, x) => sum + (x - centre) ** 2, 0) / n);
					// Midpoints leave out what lies in the last half step of a tail.
					near(centre, mean, u, 2e-3);
					near(spread, u, u, 1e-2);
				}),
				{ numRuns: 60 }
			);
		},
		SECONDS
	);
});
