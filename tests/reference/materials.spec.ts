/**
 * Material allowables against mpmath and SciPy (make_materials.py), published tables and the literature.
 * Tolerance 1e-9 for closed forms and factors, 1e-8 for integrals.
 */
import { describe, expect, it } from 'vitest';
import { allowable } from '$lib/engine/methods/allowable';
import { batchTest } from '$lib/engine/methods/batch-test';
import { couponStatistics } from '$lib/engine/methods/coupon-statistics';
import { answer } from '$lib/engine/methods/method';
import { toleranceFactor } from '$lib/engine/methods/tolerance-factor';
import { criticalResidual } from '$lib/engine/materials/sample';
import data from './data/materials.json';

const relative = (got: number, expected: number) => Math.abs(got / expected - 1);

const factorOf = (specimens: number, share: number, confidence: number) => {
	const found = answer(toleranceFactor, { specimens, share, confidence });
	if (!found.ok) throw new Error(found.refusal.message);
	return found.outputs;
};

describe('tolerance factors', () => {
	it('are those of the published tables', () => {
		// NIST/SEMATECH e-Handbook 7.2.6.3; M. G. Natrella, NBS Handbook 91, table A-7.
		const table = { 10: [2.355, 3.981], 20: [1.926, 3.295], 30: [1.777, 3.064] };
		for (const [n, [b, a]] of Object.entries(table)) {
			expect(factorOf(Number(n), 0.9, 0.95).factor).toBeCloseTo(b!, 3);
			expect(factorOf(Number(n), 0.99, 0.95).factor).toBeCloseTo(a!, 3);
		}
	});

	it('agree with mpmath in 50 cases', () => {
		expect(data.factors).toHaveLength(50);
		for (const { n, share, confidence, factor } of data.factors)
			expect(
				relative(factorOf(n, share, confidence).factor, factor),
				`${n}, ${share}, ${confidence}`
			).toBeLessThan(1e-9);
	});

	it('name 29 specimens for a B-basis and 299 for an A-basis whatever the distribution', () => {
		// CMH-17, common practice.
		expect(factorOf(10, 0.9, 0.95).leastSpecimens).toBe(29);
		expect(factorOf(10, 0.99, 0.95).leastSpecimens).toBe(299);
		expect(data.ranks).toHaveLength(22);
		for (const { n, share, confidence, rank } of data.ranks)
			expect(factorOf(n, share, confidence).rank, `${n}, ${share}`).toBe(rank);
	});
});

describe('coupon statistics', () => {
	it('agree with SciPy for 24 samples of three distributions', () => {
		expect(data.samples).toHaveLength(24);
		for (const { values, expected } of data.samples) {
			const found = answer(couponStatistics, { values });
			if (!found.ok) throw new Error(found.refusal.message);
			const { mean, deviation, fits } = found.outputs;
			expect(relative(mean, expected.mean)).toBeLessThan(1e-12);
			expect(relative(deviation, expected.deviation)).toBeLessThan(1e-10);
			const [normal, lognormal, weibull] = fits;
			expect(relative(normal!.statistic, expected.normal)).toBeLessThan(1e-9);
			expect(relative(lognormal!.statistic, expected.lognormal)).toBeLessThan(1e-9);
			expect(relative(weibull!.statistic, expected.weibull)).toBeLessThan(1e-8);
			expect(relative(weibull!.first, expected.scale)).toBeLessThan(1e-9);
			expect(relative(weibull!.second, expected.shape)).toBeLessThan(1e-9);
			expect(relative(criticalResidual(values.length, 0.05), expected.critical)).toBeLessThan(1e-9);
		}
	});

	it('hold a Weibull limit against the integral over both parameters', () => {
		const limited = data.samples.filter((sample) => 'limit' in sample);
		expect(limited.length).toBeGreaterThanOrEqual(6);
		for (const { values, limit } of limited) {
			const found = answer(allowable, { values });
			if (!found.ok) throw new Error(found.refusal.message);
			expect(relative(found.outputs.weibull!, limit!)).toBeLessThan(1e-7);
		}
	});

	it('tell an outlier and keep it', () => {
		const found = answer(couponStatistics, { values: [10, 10.1, 9.9, 10.2, 9.8, 10, 14] });
		if (!found.ok) throw new Error(found.refusal.message);
		expect(found.outputs.outliers).toMatchObject([{ specimen: 7, value: 14 }]);
		expect(found.outputs.specimens).toBe(7);
		expect(found.warnings.join()).toContain('Specimen 7 is an outlier');
	});
});

describe('the batch test', () => {
	it('gives the published figure for four laboratories', () => {
		// Scholz and Stephens (1987), table 4: smoothness of paper; A² standardised 4.480.
		const batches = [
			[38.7, 41.5, 43.8, 44.5, 45.5, 46.0, 47.7, 58.0],
			[39.2, 39.3, 39.7, 41.4, 41.8, 42.9, 43.3, 45.8],
			[34.0, 35.0, 39.0, 40.0, 43.0, 43.0, 44.0, 45.0],
			[34.0, 34.8, 34.8, 35.4, 37.2, 37.8, 41.2, 42.8]
		].map((values, i) => ({ name: `laboratory ${i + 1}`, values }));
		const found = answer(batchTest, { batches });
		if (!found.ok) throw new Error(found.refusal.message);
		expect(found.outputs.statistic).toBeCloseTo(4.48, 2);
		expect(found.outputs.differ).toBe(true);
	});

	it('agrees with SciPy for 20 sets of batches, with ties and without', () => {
		expect(data.batches).toHaveLength(20);
		for (const { batches, statistic, critical } of data.batches) {
			const named = batches.map((values, i) => ({ name: `${i}`, values }));
			const found = answer(batchTest, { batches: named });
			if (!found.ok) throw new Error(found.refusal.message);
			expect(Math.abs(found.outputs.statistic - statistic)).toBeLessThan(1e-9);
			expect(Math.abs(found.outputs.critical - critical)).toBeLessThan(1e-9);
		}
	});
});

describe('a basis value', () => {
	const { values } = data.samples[0]!;

	it('waits for a reason where batches that differ are to be pooled', () => {
		const shifted = [...values, ...values.map((x) => x * 1.5)];
		const batches = shifted.map((_, i) => (i < values.length ? '1' : '2'));
		const alone = answer(allowable, { values: shifted, batches });
		if (!alone.ok) throw new Error(alone.refusal.message);
		expect(alone.outputs).toMatchObject({ batchesDiffer: true });
		expect(alone.outputs.value).toBeUndefined();
		const pooled = answer(allowable, { values: shifted, batches, poolingReason: 'Same loom.' });
		if (!pooled.ok) throw new Error(pooled.refusal.message);
		expect(pooled.warnings.join()).toContain('Same loom.');
	});

	it.each([
		[{ values: [1, 1, 1, 1] }, 'no spread'],
		[{ values: [1, 2] }, '4 to'],
		[{ values: [1, 2, 3, 4], batches: ['a'] }, 'name the batch of each']
	])('is refused in words: %j', (input, words) => {
		const found = answer(allowable, input);
		expect(found).toMatchObject({ ok: false });
		if (!found.ok) expect(found.refusal.message).toContain(words);
	});

	it('leaves out lognormal and Weibull where results are not above 0', () => {
		const found = answer(allowable, { values: [-1, 2, 3, 1, 0.5] });
		if (!found.ok) throw new Error(found.refusal.message);
		expect(found.outputs.weibull).toBeUndefined();
		expect(found.outputs.normal).toBeLessThan(0);
	});
});
