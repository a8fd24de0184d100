import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figureTex, formatFigure } from './format';

const THIN = '\u202f';

describe('a figure', () => {
	it.each([
		[3.905748, 4, '3.906'],
		[50, 4, '50.00'],
		[1494.2, 3, `1${THIN}494`],
		[100000, 6, `100${THIN}000`],
		[1234567.8, 4, `1${THIN}234${THIN}568`],
		[-0.056, 2, '−0.056'],
		[0.944, 3, '0.944'],
		[0.99996, 4, '1.000'],
		[1.6987e33, 3, '1.70×10³³'],
		[6.6743e-11, 6, '6.67430×10⁻¹¹'],
		[9999999.9, 4, '1.000×10⁷'],
		[0, 4, '0'],
		[-0, 4, '0'],
		[2, 1, '2']
	])('%d at %d digits is %s', (value, digits, text) =>
		expect(formatFigure(value, digits)).toBe(text)
	);

	it('is set for KaTeX with the same digits', () => {
		expect(figureTex(100000, 6)).toBe('100\\,000');
		expect(figureTex(-1.6987e33, 3)).toBe('-1.70\\times 10^{33}');
	});

	it('never reads NaN or Infinity', () => {
		const numbers = fc.oneof(fc.double(), fc.constantFrom(NaN, Infinity, -Infinity));
		fc.assert(
			fc.property(numbers, fc.oneof(fc.integer(), fc.constant(NaN)), (value, digits) => {
				expect(formatFigure(value, digits)).not.toMatch(/NaN|Infinity|undefined/);
			})
		);
	});

	it('reads back to the value within its digits', () => {
		const finite = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e300, max: 1e300 });
		const back = (text: string) =>
			Number(
				text
					.replaceAll(THIN, '')
					.replace('−', '-')
					.replace(
						/×10(.*)/,
						(_, power: string) =>
							`e${[...power].map((s) => (s === '⁻' ? '-' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(s))).join('')}`
					)
			);
		fc.assert(
			fc.property(finite, fc.integer({ min: 1, max: 15 }), (value, digits) => {
				expect(Math.abs(back(formatFigure(value, digits)) - value)).toBeLessThanOrEqual(
					Math.abs(value) * 10 ** (1 - digits)
				);
			})
		);
	});
});
