import { describe, expect, it } from 'vitest';
import { parseNumber } from './number';

describe('a number as typed', () => {
	it.each([
		['110', 110, 3],
		['20.0', 20, 3],
		['1.2e-3', 1.2e-3, 2],
		['100 000', 1e5, 6],
		['100\u202f000.5', 100000.5, 7],
		['−4.5', -4.5, 2],
		['0.0110', 0.011, 3],
		['.5', 0.5, 1],
		[' 7 ', 7, 1],
		['0', 0, 1]
	])('%s is read', (text, value, digits) =>
		expect(parseNumber(text)).toEqual({ ok: true, value, digits })
	);

	it.each([
		['1,5', 'Write 1.5.'],
		['1,300.5', 'Write 1300.5.'],
		['1.2×10^-3', 'Write 1.2e-3.'],
		['1,300,000', 'Write 1300000.']
	])('%s is refused with what to write', (text, remedy) =>
		expect(parseNumber(text)).toMatchObject({ ok: false, remedy })
	);

	it.each(['abc', '1e999', '0x10', 'Infinity', 'NaN', '1 2', '--1', ''])(
		'%s is refused in words',
		(text) => expect(parseNumber(text)).toMatchObject({ ok: false, message: expect.any(String) })
	);
});
