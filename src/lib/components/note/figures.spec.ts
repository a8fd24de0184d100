import { expect, test } from 'vitest';
import { amount, marginUncertainty, marginWords, outcomeWords } from './figures';

// U+202F between value and unit and U+2212 for minus: ISO 80000-1, 7.3 and the sheet's grammar.
test('a margin as a ratio has a sign and three decimals', () => {
	expect(marginWords({ kind: 'ratio', value: 0.0432, unit: '' })).toBe('+0.043');
	expect(marginWords({ kind: 'ratio', value: -0.0561, unit: '' })).toBe('\u22120.056');
	expect(marginWords({ kind: 'ratio', value: 0, unit: '' })).toBe('+0.000');
});

test('a margin as a difference carries its unit', () => {
	expect(marginWords({ kind: 'difference', value: -2.8, unit: 'GPa' })).toBe('\u22122.80\u202fGPa');
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
