import { expect, test } from 'vitest';
import type { Listed } from '$lib/engine/calc/results';
import { amount, listWords, marginUncertainty, marginWords, outcomeWords } from './figures';

// U+202F between value and unit and U+2212 for minus: ISO 80000-1, 7.3 and the sheet's grammar.
test('a margin as a ratio has a sign and three decimals', () => {
	expect(marginWords({ kind: 'ratio', value: 0.0432, unit: '' })).toBe('+0.043');
	expect(marginWords({ kind: 'ratio', value: -0.0561, unit: '' })).toBe('\u22120.056');
	expect(marginWords({ kind: 'ratio', value: 0, unit: '' })).toBe('+0.000');
});

test('a margin as a difference carries its unit', () => {
	expect(marginWords({ kind: 'difference', value: -2.8, unit: 'GPa' })).toBe('\u22122.80\u202fGPa');
});

test('a list says how many values it has and between which they lie', () => {
	const list = { unit: 'km', digits: 3, si: [], values: [], uncertainties: null, mean: 0 };
	const length: Listed['dimension'] = [0, 1, 0, 0, 0, 0, 0];
	const of = (count: number, least: number, greatest: number) =>
		listWords({ ...list, dimension: length, count, least, greatest });
	expect(of(3, 1, 20)).toBe('3 values, 1.00 to 20.0\u202fkm');
	expect(of(1, 7, 7)).toBe('1 value, 7.00\u202fkm');
});

test('a margin tells its standard uncertainty to two digits, in its unit', () => {
	const margin = { kind: 'difference', value: 3, unit: 'GPa', relative: 0.1 } as const;
	expect(marginUncertainty({ ...margin, uncertainty: 0.0512 })).toBe('±\u202f0.051\u202fGPa');
	expect(marginUncertainty({ ...margin, uncertainty: null })).toBe('');
});

test('a pure number stands without a unit', () => {
	expect(amount({ value: 1.5, unit: '' })).toBe('1.50');
});

test('an outcome without a value is said in words', () => {
	expect(outcomeWords({ state: 'waits', for: ['σ_d', 'ρ'], rootIds: [] })).toBe('waits for σ_d, ρ');
	expect(outcomeWords({ state: 'blank' })).toBe('not given yet');
});
