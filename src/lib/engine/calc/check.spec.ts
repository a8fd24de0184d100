import { describe, expect, it } from 'vitest';
import { check, checkOf, given } from './items.fixture';

const strength = [given('σ_d', '50.0', 'GPa'), given('σ_j', '47.2', 'GPa')];

describe('a check', () => {
	// Margin of safety as usually defined, allowable/actual − 1 (NASA-STD-5001): 60/50 − 1 = 0.2.
	it('has the margin of safety as its margin where both sides are positive', () => {
		const result = checkOf([...strength, check('σ_d', 'le', '60 GPa')]);
		expect(result.state).toBe('holds');
		expect(result.margin).toMatchObject({ kind: 'ratio', value: expect.closeTo(0.2, 12) });
		expect(checkOf([check('3 t', 'ge', '2 t')]).margin!.value).toBeCloseTo(0.5, 12);
	});

	it('fails by an amount in the unit of its sides', () => {
		const result = checkOf([...strength, check('σ_d', 'le', 'σ_j')]);
		expect(result.state).toBe('fails');
		expect(result.margin!.value).toBeCloseTo(47.2 / 50 - 1, 12);
		expect(result.shortBy).toEqual({ value: expect.closeTo(2.8, 10), unit: 'GPa' });
		expect(result.tex).toBe(
			'\\sigma_\\mathrm{d} = 50.0 \\ \\le\\  \\sigma_\\mathrm{j} = 47.2\\,\\mathrm{GPa}'
		);
	});

	it('is thin below the thin limit of the note', () => {
		const items = [...strength, check('σ_d', 'le', '54 GPa')];
		expect(checkOf(items, 0.1).state).toBe('thin');
		expect(checkOf(items, 0.05).state).toBe('holds');
	});

	it('is held against its required margin', () => {
		const result = checkOf([...strength, check('σ_d', 'le', '60 GPa', { required: '25 %' })]);
		expect(result).toMatchObject({ state: 'fails', required: 0.25 });
		expect(result.shortBy).toEqual({ value: expect.closeTo(2, 10), unit: 'GPa' });
	});

	it('takes sides that agree to twelve digits as equal', () => {
		expect(checkOf([check('0.1 + 0.2', 'le', '0.3')], 0).state).toBe('holds');
	});

	it('has a difference as its margin where a side is not positive', () => {
		const result = checkOf([check('-5 kN', 'le', '0')]);
		expect(result.margin).toMatchObject({ kind: 'difference', value: 5, unit: 'kN', relative: 1 });
		expect(checkOf([check('0.043', 'ge', '0')])).toMatchObject({
			state: 'thin',
			margin: { kind: 'difference', value: 0.043, unit: '' }
		});
	});

	it('holds within a tolerance by the share of it that is left', () => {
		const within = (left: string, tolerance: string) =>
			checkOf([check(left, 'within', '100 km', { tolerance })]);
		expect(within('104 km', '5 km')).toMatchObject({ state: 'holds', margin: { kind: 'ratio' } });
		expect(within('104 km', '5 km').margin!.value).toBeCloseTo(0.2, 12);
		expect(within('100 km', '5 km').margin!.value).toBe(1);
		expect(within('106 km', '5 km')).toMatchObject({
			state: 'fails',
			shortBy: { value: expect.closeTo(1, 9), unit: 'km' }
		});
		expect(within('100 km', '0 km').state).not.toBe('fails');
		expect(within('101 km', '0 km').state).toBe('fails');
		expect(within('101 km', '-1 km').faults[0]!.message).toBe('A tolerance is not negative.');
	});

	it('waits while a side has no value, and says why', () => {
		const result = checkOf([check('Φ', 'le', '2')]);
		expect(result).toMatchObject({ state: 'waits', margin: null });
		expect(result.faults[0]).toMatchObject({ code: 'unknown-symbol', span: { field: 'left' } });
		expect(checkOf([check('', 'le', '2')])).toMatchObject({
			state: 'waits',
			left: { state: 'blank' }
		});
	});

	it('names both dimensions where the sides cannot be compared', () => {
		expect(checkOf([check('2 t', 'le', '3 km')]).faults[0]!.message).toBe(
			'The two sides cannot be compared: the left is a mass, M, the right a length, L.'
		);
		expect(checkOf([check('2 t', 'le', '3 t', { required: '2 kg' })]).faults[0]!.message).toContain(
			'the margin is a pure number'
		);
	});

	it('never has an endless margin', () => {
		const { margin } = checkOf([check('1e-300', 'le', '1e300')]);
		expect(Number.isFinite(margin!.value)).toBe(true);
	});
});
