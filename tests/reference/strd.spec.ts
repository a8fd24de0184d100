/**
 * NIST Statistical Reference Datasets, univariate summary statistics: all nine sets with their certified mean
 * and standard deviation (n − 1). The data are those of the GNU Scientific Library's tests (Debian's source
 * package gsl 2.7.1, statistics/test_nist.c); NumAcc2 to NumAcc4 are made as their definition says.
 */
import { describe, expect, it } from 'vitest';
import { calculation, quantityOf } from '$lib/engine/calc/items.fixture';
import { couponStatistics } from '$lib/engine/methods/coupon-statistics';
import { answer } from '$lib/engine/methods/method';
import { meanAndDeviation } from '$lib/engine/numerics/sample';
import sets from './data/strd.json';

/** A middle value, then so many pairs a tenth below and above it. */
const alternating = (middle: number, low: number, high: number) => [
	middle,
	...Array.from({ length: 500 }, () => [low, high]).flat()
];

type Dataset = { name: string; mean: number; s: number; values: number[]; digits: number };

/** With as many digits as doubles can keep there: NumAcc3 and NumAcc4 hold tenths beside a million and ten. */
const SETS: Dataset[] = [
	{ name: 'Lew', ...sets.Lew, digits: 14 },
	{ name: 'Lottery', ...sets.Lottery, digits: 14 },
	{ name: 'Mavro', ...sets.Mavro, digits: 12 },
	{ name: 'Michelso', ...sets.Michelso, digits: 13 },
	{ name: 'PiDigits', ...sets.PiDigits, values: [...sets.PiDigits.digits].map(Number), digits: 14 },
	{ name: 'NumAcc1', ...sets.NumAcc1, digits: 15 },
	{ name: 'NumAcc2', ...sets.NumAcc2, values: alternating(1.2, 1.1, 1.3), digits: 14 },
	{
		name: 'NumAcc3',
		...sets.NumAcc3,
		values: alternating(1000000.2, 1000000.1, 1000000.3),
		digits: 9
	},
	{
		name: 'NumAcc4',
		...sets.NumAcc4,
		values: alternating(10000000.2, 10000000.1, 10000000.3),
		digits: 8
	}
];

const within = (got: number, certified: number, digits: number) =>
	expect(Math.abs(got / certified - 1), `${got} for ${certified}`).toBeLessThan(10 ** -digits);

it('all nine sets are tried', () => {
	expect(SETS.map(({ values }) => values.length)).toEqual([
		200, 218, 50, 100, 5000, 3, 1001, 1001, 1001
	]);
});

describe('mean and standard deviation of the NIST StRD', () => {
	it.each(SETS)('$name are the certified ones', ({ mean, s, values, digits }) => {
		const found = meanAndDeviation(Float64Array.from(values));
		within(found.mean, mean, 14);
		within(found.s, s, digits);
	});

	const strengths = SETS.filter(({ values }) => values.every((value) => value > 0));
	it.each(strengths)('$name by the method for coupons', ({ mean, s, values, digits }) => {
		const found = answer(couponStatistics, { values });
		if (!found.ok) throw new Error(found.refusal.message);
		within(found.outputs.mean, mean, 14);
		within(found.outputs.deviation, s, digits);
	});

	const short = SETS.filter(({ values }) => values.length < 300);
	it.each(short)('$name as a list in a note', ({ mean, s, values, digits }) => {
		const of = (name: string) => {
			const list = calculation('x', `[${values.join(', ')}]`);
			const { outcome } = quantityOf([list, calculation('y', `${name}(x)`)], 'y');
			if (outcome.state !== 'value') throw new Error(JSON.stringify(outcome));
			return outcome.quantity.si;
		};
		within(of('mean'), mean, 14);
		within(of('std'), s, digits);
	});
});
