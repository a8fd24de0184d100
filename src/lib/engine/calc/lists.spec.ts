/** Lists in expressions: what they come to, what they refuse, and how uncertain they are. */
import { describe, expect, it } from 'vitest';
import { calculation, check, given, lineModel, quantityOf, resultsOf } from './items.fixture';
import type { Listed, Quantity, QuantityResult } from './results';
import { createSheet } from './sheet';

const heights = calculation('h', '[0, 11 km, 20 km]');
const cuts = calculation('n', '[3, 4, 5]');
const items = [heights, cuts, given('a', '2', 'm', '0.1'), given('b', '3', 'm', '0.2')];

const outcomeOf = (expression: string, unit = '') =>
	quantityOf([...items, calculation('result', expression, unit)], 'result').outcome;
function listOf(expression: string, unit = ''): Listed {
	const outcome = outcomeOf(expression, unit);
	if (outcome.state !== 'list') throw new Error(JSON.stringify(outcome));
	return outcome.list;
}
function valueOf(expression: string, unit = ''): Quantity {
	const outcome = outcomeOf(expression, unit);
	if (outcome.state !== 'value') throw new Error(JSON.stringify(outcome));
	return outcome.quantity;
}
const faultIn = (expression: string) => {
	const outcome = outcomeOf(expression);
	if (outcome.state !== 'fault') throw new Error(JSON.stringify(outcome));
	return outcome.faults[0]!;
};

describe('a list', () => {
	it('has its values in one unit, and what sums them up', () => {
		expect(listOf('[1 km, 2500 m, 0]')).toMatchObject({
			unit: 'km',
			count: 3,
			values: [1, 2.5, 0],
			least: 0,
			greatest: 2.5,
			uncertainties: null
		});
		expect(listOf('[1 km, 2500 m, 0]').mean).toBeCloseTo(3.5 / 3, 12);
	});

	it('is shown in the unit that was chosen', () => {
		expect(listOf('h', 'm')).toMatchObject({ unit: 'm', values: [0, 11000, 20000] });
	});

	it('goes value by value with another, and each of its values with one value', () => {
		expect(listOf('n * n').values).toEqual([9, 16, 25]);
		expect(listOf('-(n + 1)/2').values).toEqual([-2, -2.5, -3]);
		expect(listOf('2^n').values).toEqual([8, 16, 32]);
		expect(listOf('sqrt(n^2)').values).toEqual([3, 4, 5]);
		expect(listOf('hypot(n, 4)').values[0]).toBe(5);
		expect(listOf('h - 1 km').values).toEqual([-1, 10, 19]);
		expect(listOf('a > b ? n : 2 n').values).toEqual([6, 8, 10]);
	});

	it('comes to one value by its least, greatest, sum, mean, number and deviation', () => {
		expect(valueOf('min(n)').si).toBe(3);
		expect(valueOf('max(0 km, h)')).toMatchObject({ value: 20, unit: 'km' });
		expect(valueOf('sum(n)').si).toBe(12);
		expect(valueOf('mean(h)').si).toBeCloseTo(31e3 / 3, 9);
		expect(valueOf('count(h)').si).toBe(3);
		expect(valueOf('std(n)').si).toBe(1);
		expect(valueOf('sum(1, [2, 3], 4)').si).toBe(10);
	});

	it('gives one of its values by its number, counted from 1', () => {
		expect(valueOf('h[2]')).toMatchObject({ value: 11, unit: 'km' });
		expect(valueOf('(2 n)[n[1]]').si).toBe(10);
		expect(valueOf('[7, 8][1]').si).toBe(7);
	});

	it('is typeset', () => {
		const { tex } = quantityOf([...items, calculation('result', '[1 km, a][2] + h[1]')], 'result');
		expect(tex).toBe('[1\\,\\mathrm{km},\\;a][2] + h[1]');
	});
});

describe('interpolation', () => {
	// U.S. Standard Atmosphere 1976, temperatures at the bounds of its layers: 288.15 K at 0, 216.65 K at 11 km
	// and at 20 km, 228.65 K at 32 km of geopotential height, linear between them.
	const layers = '[0, 11 km, 20 km, 32 km], [288.15 K, 216.65 K, 216.65 K, 228.65 K]';

	it('gives the temperatures of the standard atmosphere between its layers', () => {
		expect(valueOf(`interpolate(5 km, ${layers})`).si).toBeCloseTo(255.65, 9);
		expect(valueOf(`interpolate(30 km, ${layers})`).si).toBeCloseTo(226.65, 9);
		expect(listOf(`interpolate(h, ${layers})`).values).toEqual([288.15, 216.65, 216.65]);
	});

	it('reads descending tables as well', () => {
		expect(valueOf('interpolate(2.5, [3, 2, 1], [30, 20, 10])').si).toBeCloseTo(25, 12);
	});

	it.each([
		[`interpolate(33 km, ${layers})`, /33.km lies outside of \[0, 11.km/],
		['interpolate(4, n, [1, 2])', /n has 3 values and \[1, 2\] 2/],
		['interpolate(4, [4, 3, 5], n)', /must ascend or descend throughout; value 3 does not go on/],
		['interpolate(1, [1], [2])', /nothing between/],
		['interpolate(1 s, h, n)', /1.s cannot be looked up in it: it is a time/],
		['interpolate(a, b, n)', /reads from two lists; b is one value/],
		['interpolate(1, n)', /takes 3 arguments, not 2/]
	])('refuses %s', (expression, words) => {
		expect(faultIn(expression).message).toMatch(words);
	});
});

describe('what cannot be', () => {
	it.each([
		['[1 km, 2 s]', 'dimension', /2.s cannot be set beside it: it is a time/],
		['[1, [2, 3]]', 'dimension', /A place in a list takes one value; \[2, 3\] is a list/],
		['[]', 'syntax', /at least one value/],
		['[1, 2', 'syntax', /closing bracket is missing/],
		['1, 2]', 'syntax', /comma only parts/],
		['1 + 2]', 'syntax', /bracket is closed that was not opened/],
		['n + [1, 2]', 'domain', /n has 3 values and \[1, 2\] 2/],
		['1/(n - 4)', 'division-by-zero', /^At value 2: Division by zero/],
		['ln(n - 4)', 'domain', /^At value 1: ln/],
		['n[4]', 'domain', /n has 3 values: there is no value 4/],
		['n[0]', 'domain', /no value 0/],
		['n[1.5]', 'domain', /no value 1.5/],
		['n[a]', 'dimension', /number of a value is a pure number; a is a length/],
		['n[n]', 'dimension', /takes one value; n is a list/],
		['n[1, 2]', 'syntax', /named by one number/],
		['a[1]', 'dimension', /a is one value/],
		['n > 1 ? 1 : 2', 'dimension', /A comparison takes one value; n is a list/],
		['a > b ? n : 1', 'dimension', /one is a list, the other one value/],
		['std(3)', 'domain', /at least two values/],
		['std([3])', 'domain', /at least two values/],
		['n + sum', 'unknown-symbol', /sum/]
	])('%s is told as %s', (expression, code, words) => {
		const fault = faultIn(expression);
		expect(fault.code).toBe(code);
		expect(fault.message).toMatch(words);
	});

	it('is a list where one value is wanted', () => {
		const results = resultsOf([...items, check('n', 'le', '9'), lineModel({ top: 'h' })]);
		const words = 'n is a list, where one value is wanted.';
		expect(results.get('check')).toMatchObject({ faults: [{ message: words }] });
		expect(results.get('line')).toMatchObject({
			faults: [{ field: 'top', fault: { message: 'h is a list, where one value is wanted.' } }]
		});
	});

	it('is more work than anybody waits for', () => {
		const row = `(${Array(30).fill('x').join('+')})`;
		const much = calculation('y', Array(30).fill(row).join('+'));
		const listOf = (count: number) => calculation('x', `[${Array(count).fill('1').join(',')}]`);
		expect(resultsOf([listOf(1100), much]).get('y')).toMatchObject({ outcome: { state: 'list' } });
		const started = performance.now();
		expect(resultsOf([listOf(1200), much]).get('y')).toMatchObject({
			outcome: { faults: [{ code: 'too-long', remedy: expect.stringContaining('Split') }] }
		});
		expect(performance.now() - started).toBeLessThan(1000);
	});
});

describe('names of functions that lists brought', () => {
	it('are still symbols of a note', () => {
		const results = resultsOf([
			given('mean', '3', 'm'),
			calculation('c', 'mean^2 + sum(n) * 1 m^2'),
			cuts
		]);
		expect(results.get('c')).toMatchObject({ outcome: { quantity: { si: 21 } } });
	});
});

describe('the standard uncertainty of lists', () => {
	it('is that of each value', () => {
		expect(listOf('[a, b, 1 m]').uncertainties).toEqual([0.1, 0.2, null]);
		expect(listOf('2 * [a, b, a + b]', 'm').uncertainties!.map((u) => u && u.toFixed(12))).toEqual(
			[0.2, 0.4, 2 * Math.hypot(0.1, 0.2)].map((u) => u.toFixed(12))
		);
	});

	it('keeps what values have in common (JCGM 100, 5.1.2)', () => {
		expect(valueOf('sum([a, b])').uncertainty).toBeCloseTo(Math.hypot(0.1, 0.2), 12);
		expect(valueOf('sum([a, a])').uncertainty).toBeCloseTo(0.2, 12);
		expect(valueOf('sum([a, -a])').uncertainty).toBeNull();
		expect(listOf('[a, b] - [a, a]').uncertainties![0]).toBeNull();
		expect(valueOf('mean(n * a)').uncertainty).toBeCloseTo(0.4, 12);
		expect(valueOf('[a, b][2]').uncertainty).toBeCloseTo(0.2, 12);
		expect(valueOf('max([a, b])').uncertainty).toBeCloseTo(0.2, 12);
		// s = |a − b|/√2 of two values.
		expect(valueOf('std([a, b])').uncertainty).toBeCloseTo(Math.hypot(0.1, 0.2) / Math.SQRT2, 12);
	});

	it('goes through tables, by where one reads and what stands there', () => {
		expect(valueOf('interpolate(a, [1 m, 3 m], [10, 30])').uncertainty).toBeCloseTo(1, 12);
		expect(valueOf('interpolate(1.5, [1, 2], [a, b])').uncertainty).toBeCloseTo(
			Math.hypot(0.05, 0.1),
			12
		);
	});

	it('reaches checks and line models', () => {
		const loads = calculation('loads', '[10 t, m_c]');
		const results = resultsOf([
			given('m_c', '10', 't', '1'),
			loads,
			check('sum(loads)', 'le', '25 t'),
			lineModel({ lift: 'sum(loads)' })
		]);
		expect(results.get('check')).toMatchObject({ left: { quantity: { uncertainty: 1 } } });
		const line = results.get('line');
		if (line?.kind !== 'lineModel') throw new Error('No line.');
		const mass = line.outputs.find(({ name }) => name === 'mass')!.outcome;
		if (mass.state !== 'value') throw new Error('No mass.');
		// The mass is in proportion to the lift: 1 t in 20 t.
		expect(mass.quantity.uncertainty! / mass.quantity.value).toBeCloseTo(0.05, 7);
	});
});

describe('an edit', () => {
	it('of a value in a list reaches what was made of it', () => {
		const sheet = createSheet();
		sheet.apply({ upsert: [calculation('x', '[1, 2]'), calculation('y', 'sum(x)')] });
		const { changed } = sheet.apply({ upsert: [calculation('x', '[1, 5]')] });
		expect(changed.map(({ id }) => id)).toEqual(['x', 'y']);
		expect((changed[1] as QuantityResult).outcome).toMatchObject({ quantity: { si: 6 } });
	});

	it('that makes one value of a list is seen by what reads it', () => {
		const sheet = createSheet();
		sheet.apply({ upsert: [calculation('x', '[1, 2]'), calculation('y', 'x + 1')] });
		sheet.apply({ upsert: [calculation('x', '7')] });
		const fresh = createSheet();
		fresh.apply({ upsert: [calculation('x', '7'), calculation('y', 'x + 1')] });
		expect(sheet.results()).toEqual(fresh.results());
	});
});
