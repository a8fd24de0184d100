/** What holds of the statistics of any set of coupon results. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { toleranceFactor } from '../numerics/tolerance';
import { lognormalBasis, normalBasis, orderRank, weibullBasis, type Basis } from './basis';
import { testBatches } from './batches';
import { fitLognormal, fitNormal, testWeibull } from './fits';
import { outliers, summarise } from './sample';

/** Strengths about 50, in steps that no rounding blurs, not all alike. */
const results = fc
	.array(
		fc.integer({ min: -400, max: 400 }).map((step) => 50 + step / 64),
		{ minLength: 5, maxLength: 40 }
	)
	.filter((values) => new Set(values).size > 2);
const basis: fc.Arbitrary<Basis> = fc.record({
	share: fc.constantFrom(0.8, 0.9, 0.95, 0.99, 0.999),
	confidence: fc.constantFrom(0.75, 0.9, 0.95, 0.99)
});
const factor = fc.integer({ min: -8, max: 8 }).map((power) => 2 ** power * 1.25);

const near = (a: number, b: number, within = 1e-9) =>
	expect(Math.abs(a - b), `${a} and ${b}`).toBeLessThan(within * (1 + Math.abs(a)));

const SECONDS = 60_000;

describe('a basis value', () => {
	it('of the normal distribution moves and scales with the results', () => {
		fc.assert(
			fc.property(results, basis, factor, factor, (values, of, scale, shift) => {
				const plain = normalBasis(values, of);
				const moved = normalBasis(
					values.map((x) => scale * x + shift),
					of
				);
				near(moved.value, scale * plain.value + shift);
				near(moved.standardError, scale * plain.standardError);
			})
		);
	});

	it(
		'of the lognormal and Weibull distributions scales with the results',
		() => {
			fc.assert(
				fc.property(results, basis, factor, (values, of, scale) => {
					for (const limit of [lognormalBasis, weibullBasis]) {
						near(
							limit(
								values.map((x) => scale * x),
								of
							) / scale,
							limit(values, of),
							1e-7
						);
					}
				}),
				{ numRuns: 40 }
			);
		},
		SECONDS
	);

	it(
		'falls with the share and the confidence that are asked for',
		() => {
			fc.assert(
				fc.property(results, (values) => {
					const value = (share: number, confidence: number) =>
						normalBasis(values, { share, confidence }).value;
					expect(value(0.99, 0.95)).toBeLessThan(value(0.9, 0.95));
					expect(value(0.9, 0.99)).toBeLessThan(value(0.9, 0.95));
					const weibull = (share: number) => weibullBasis(values, { share, confidence: 0.95 });
					expect(weibull(0.99)).toBeLessThan(weibull(0.9));
				}),
				{ numRuns: 40 }
			);
		},
		SECONDS
	);

	it('by the order of the results takes one of the lowest, and more of them from more results', () => {
		fc.assert(
			fc.property(fc.integer({ min: 1, max: 5000 }), basis, (n, of) => {
				const rank = orderRank(n, of);
				expect(rank).toBeLessThanOrEqual(orderRank(n + 1, of));
				// At least the share asked for lies above it on average.
				expect(rank).toBeLessThanOrEqual((n + 1) * (1 - of.share) + 1);
			})
		);
	});
});

describe('a tolerance factor', () => {
	it('falls with the number of specimens towards the normal quantile', () => {
		fc.assert(
			fc.property(fc.integer({ min: 2, max: 400 }), basis, (n, { share, confidence }) => {
				const [few, more] = [n, n + 1].map((count) => toleranceFactor(count, share, confidence));
				expect(more!).toBeLessThan(few!);
				// z_P, Abramowitz and Stegun, table 26.5 (from memory).
				const limit = { 0.8: 0.84162, 0.9: 1.28155, 0.95: 1.64485, 0.99: 2.32635, 0.999: 3.09023 };
				expect(more!).toBeGreaterThan(limit[share as keyof typeof limit]);
			})
		);
	});
});

describe('a test of fit', () => {
	it('says the same whatever unit the results are in, and in whatever order they come', () => {
		fc.assert(
			fc.property(results, factor, (values, scale) => {
				const scaled = values.toReversed().map((x) => scale * x);
				for (const fit of [fitNormal, fitLognormal, testWeibull])
					near(fit(scaled).significance, fit(values).significance, 1e-6);
			})
		);
	});

	it('of batches says the same in whatever order they and their results come', () => {
		fc.assert(
			fc.property(fc.array(results, { minLength: 2, maxLength: 4 }), factor, (batches, scale) => {
				const turned = batches.toReversed().map((batch) => batch.map((x) => scale * x).reverse());
				near(testBatches(turned).statistic, testBatches(batches).statistic);
			})
		);
	});
});

describe('outliers', () => {
	it('are the same whatever unit the results are in; a result far off is one', () => {
		fc.assert(
			fc.property(results, factor, (values, scale) => {
				const which = (of: number[]) => outliers(of).map(({ index }) => index);
				expect(which(values.map((x) => scale * x))).toEqual(which(values));
				const { mean, deviation } = summarise(values);
				expect(which([...values, mean + 1000 * deviation])).toContain(values.length);
			})
		);
	});
});
