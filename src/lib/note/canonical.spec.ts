import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonicalJson, canonicalNumber, sameFigure } from './canonical';

test('writes the sample of RFC 8785 §3.2.3 with its keys in order', () => {
	const sample = {
		'\u20ac': 'Euro Sign',
		'\r': 'Carriage Return',
		'\ufb33': 'Hebrew Letter Dalet With Dagesh',
		'1': 'One',
		'\ud83d\ude00': 'Emoji: Grinning Face',
		'\u0080': 'Control',
		'\u00f6': 'Latin Small Letter O With Diaeresis'
	};
	expect(Object.values(JSON.parse(canonicalJson(sample)))).toEqual([
		// An engine lists the integer-like key first; it is first in the RFC as well, after "\r".
		'One',
		'Carriage Return',
		'Control',
		'Latin Small Letter O With Diaeresis',
		'Euro Sign',
		'Emoji: Grinning Face',
		'Hebrew Letter Dalet With Dagesh'
	]);
	expect(canonicalJson(sample).startsWith('{"\\r":"Carriage Return","1":"One",')).toBe(true);
});

test('writes literals and strings as RFC 8785 §3.2.2 does', () => {
	expect(
		canonicalJson({
			literals: [null, true, false],
			string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"\u002f'
		})
	).toBe('{"literals":[null,true,false],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}');
});

test('rounds numbers to twelve significant digits', () => {
	// RFC 8785 §3.2.2 writes 333333333.3333333, 1e+30, 4.5, 0.002 and 1e-27; here at 12 digits.
	expect(canonicalJson([333333333.3333333, 1e30, 4.5, 2e-3, 0.000000000000000000000000001])).toBe(
		'[333333333.333,1e+30,4.5,0.002,1e-27]'
	);
	expect(canonicalJson([-0, 50e9, Math.PI])).toBe('[0,50000000000,3.14159265359]');
});

test('leaves out members that are undefined and refuses what JSON cannot say', () => {
	expect(canonicalJson({ b: 1, a: undefined })).toBe('{"b":1}');
	expect(() => canonicalJson({ a: Number.NaN })).toThrow('NaN');
	expect(() => canonicalJson([Infinity])).toThrow('Infinity');
});

test('has no line break in it, whatever is written', () => {
	fc.assert(
		fc.property(fc.jsonValue(), (value) => {
			expect(canonicalJson(value)).not.toMatch(/[\r\n]/);
		})
	);
});

test('is the same for a value that went through JSON, in any order of keys', () => {
	fc.assert(
		fc.property(fc.jsonValue(), (value) => {
			const text = canonicalJson(value);
			expect(canonicalJson(JSON.parse(text))).toBe(text);
		})
	);
});

test('takes two platforms to agree when they differ in the last bit only', () => {
	fc.assert(
		fc.property(
			fc.double({ noNaN: true, noDefaultInfinity: true, min: 1e-200, max: 1e200 }),
			(x) => {
				expect(sameFigure(x, x * (1 + Number.EPSILON))).toBe(true);
				expect(sameFigure(x, x * (1 + 1e-9))).toBe(false);
			}
		)
	);
	expect(canonicalNumber(1 - 1e-13)).toBe(1);
});
