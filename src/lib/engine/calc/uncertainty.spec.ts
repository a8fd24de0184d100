import { describe, expect, it } from 'vitest';
import { calculation, check, given, lineModel } from './items.fixture';
import type { SheetItem } from './items';
import type { CheckResult, ItemResult } from './results';
import { createSheet } from './sheet';

const a = given('a', '20', 'GPa', '0.3');
const b = given('b', '5', 'GPa', '0.4');

function sheetOf(items: SheetItem[]) {
	const sheet = createSheet();
	sheet.apply({ upsert: items, order: items.map(({ id }) => id) });
	return sheet;
}

function quantity(results: ItemResult[], id: string) {
	const result = results.find((result) => result.id === id);
	if (result?.kind !== 'calculation' || result.outcome.state !== 'value') throw new Error(id);
	return result.outcome.quantity;
}

/** Of one expression beside these givens, in the shown unit. */
const of = (expression: string, givens: SheetItem[] = [a, b], unit = '') =>
	quantity(sheetOf([...givens, calculation('y', expression, unit)]).results(), 'y').uncertainty;

describe('the standard uncertainty of a quantity', () => {
	it('is the root of the sum of squares over independent givens', () => {
		expect(of('a + b')).toBeCloseTo(0.5, 12);
		expect(of('a*b', [a, b], 'GPa^2')).toBeCloseTo(Math.hypot(5 * 0.3, 20 * 0.4), 12);
	});

	it('counts what its parts have in common once', () => {
		const parts = [a, b, calculation('p', 'a + b'), calculation('q', 'a - b')];
		expect(of('p + q', parts)).toBeCloseTo(2 * 0.3, 12);
		expect(of('p / a', [a, calculation('p', '2 a')])).toBeNull();
	});

	it('is in the unit that the value is shown in', () => {
		expect(of('a', [a], 'MPa')).toBeCloseTo(300, 9);
		expect(of('T', [given('T', '20', 'degC', '0.5')], 'degF')).toBeCloseTo(0.9, 12);
	});

	it('is null where nothing that goes in is uncertain', () => {
		expect(of('2 c', [given('c', '3', 'm')])).toBeNull();
		expect(of('a > b ? c : b', [a, b, given('c', '3', 'GPa')])).toBeNull();
	});

	it('follows the branch taken and the greater argument', () => {
		expect(of('a > b ? a : b')).toBeCloseTo(0.3, 12);
		expect(of('max(a, b)')).toBeCloseTo(0.3, 12);
	});

	it('shares a tie, takes slope 1 at a corner, and sees no steps', () => {
		expect(of('max(x, y_1)', [given('x', '1', '', '1'), given('y_1', '1', '', '1')])).toBeCloseTo(
			Math.SQRT1_2,
			12
		);
		expect(of('abs(x)', [given('x', '0', '', '0.2')])).toBeCloseTo(0.2, 12);
		expect(of('round(x)', [given('x', '2.4', '', '0.2')])).toBeNull();
	});

	it('is not known where the slope is upright, nor for what follows', () => {
		const zero = given('x', '0', '', '0.1');
		expect(of('sqrt(x)', [zero])).toBeNull();
		expect(of('r + x', [zero, calculation('r', 'sqrt(x)')])).toBeNull();
	});

	it('stays in the range of numbers', () => {
		expect(of('x*1e299', [given('x', '1', '', '0.5')])! / 5e298).toBeCloseTo(1, 12);
		expect(of('x*1e299', [given('x', '1', '', '50')])).toBeNull();
		expect(of('x/1e200', [given('x', '1e-90', '', '1e-95')])! / 1e-295).toBeCloseTo(1, 12);
	});

	it('comes through a line model and on', () => {
		const givens = [given('ρ', '1300', 'kg/m^3', '13'), lineModel({ density: 'ρ' })];
		expect(of('line.mass/line.mass', givens)).toBeNull();
		expect(of('ln(line.taper)/ln(line.As/line.A0)', givens)! < 1e-9).toBe(true);
		// ln τ is in proportion to the density.
		const lnTaper = Math.log(3.5218601711);
		expect(of('ln(line.taper)', givens)! / (0.01 * lnTaper)).toBeCloseTo(1, 8);
	});

	it('is the same to the last digit in whatever order the items came', () => {
		const many = Array.from({ length: 12 }, (_, i) =>
			given(`x_${i}`, `${1 + i / 7}`, '', `${0.1 / (i + 1)}`)
		);
		const product = calculation('p', many.map(({ symbol }) => `sin(${symbol})`).join(' * '));
		const found = many.map((_, i) => {
			const turned = [...many.slice(i), ...many.slice(0, i), product];
			return quantity(sheetOf(turned).results(), 'p').uncertainty;
		});
		expect(found[0]).toBeGreaterThan(0);
		expect(new Set(found).size).toBe(1);
	});

	it('comes through more givens than are taken at once', () => {
		const many = Array.from({ length: 150 }, (_, i) => given(`x_${i}`, '1', '', '2'));
		const sums = [0, 1, 2, 3, 4].map((k) => {
			const part = many.slice(30 * k, 30 * (k + 1)).map(({ symbol }) => symbol);
			return calculation(`s_${k}`, part.join(' + '));
		});
		expect(of('s_0 + s_1 + s_2 + s_3 + s_4', [...many, ...sums])).toBeCloseTo(
			2 * Math.sqrt(150),
			9
		);
	});
});

describe('the standard uncertainty of a check', () => {
	const sheetWith = (...args: Parameters<typeof check>) =>
		sheetOf([a, b, check(...args)])
			.results()
			.find(({ id }) => id === 'check') as CheckResult;

	it('is that of its sides and of its margin', () => {
		const { left, right, margin } = sheetWith('b', 'le', 'a');
		expect(left).toMatchObject({ quantity: { uncertainty: 0.4 } });
		expect(right).toMatchObject({ quantity: { uncertainty: 0.3 } });
		// a/b − 1
		expect(margin!.uncertainty).toBeCloseTo((20 / 5) * Math.hypot(0.3 / 20, 0.4 / 5), 12);
		expect(sheetWith('a', 'ge', 'b').margin!.uncertainty).toBeCloseTo(margin!.uncertainty!, 12);
	});

	it('counts what the sides have in common once', () => {
		expect(sheetWith('a', 'le', '2 a').margin!.uncertainty).toBeNull();
	});

	it('is in the unit of a difference, and a share of the tolerance', () => {
		const difference = sheetWith('-b', 'le', 'a').margin!;
		expect(difference).toMatchObject({ kind: 'difference', unit: 'GPa' });
		expect(difference.uncertainty).toBeCloseTo(0.5, 12);
		const within = sheetWith('a', 'within', '18 GPa', { tolerance: 'b' }).margin!;
		// 1 − |a − 18|/b
		expect(within.uncertainty).toBeCloseTo(Math.hypot(0.3 / 5, (2 * 0.4) / 25), 12);
	});
});

describe('a second answer', () => {
	const items = [a, b, calculation('p', '2 a'), calculation('q', 'b + 1 GPa')];

	it('tells the results in which an uncertainty changed, once', () => {
		const sheet = sheetOf(items);
		expect(sheet.uncertainties().map(({ id }) => id)).toEqual(['p', 'q']);
		expect(sheet.uncertainties()).toEqual([]);
		const { changed } = sheet.apply({ upsert: [given('a', '20', 'GPa', '0.6')] });
		expect(changed.map(({ id }) => id)).toEqual(['a']);
		const told = sheet.uncertainties();
		expect(told.map(({ id }) => id)).toEqual(['p']);
		expect(quantity(told, 'p').uncertainty).toBeCloseTo(1.2, 12);
	});

	it('comes after the figures, which keep the uncertainty they had until then', () => {
		const sheet = sheetOf([given('a', '2', '', '0.1'), calculation('p', 'a^2')]);
		sheet.uncertainties();
		const { changed } = sheet.apply({ upsert: [given('a', '3', '', '0.1')] });
		expect(quantity(changed, 'p')).toMatchObject({ value: 9, uncertainty: expect.closeTo(0.4) });
		expect(quantity(sheet.uncertainties(), 'p').uncertainty).toBeCloseTo(0.6, 12);
	});
});
