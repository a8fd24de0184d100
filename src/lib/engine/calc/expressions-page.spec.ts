/** The page about expressions says what they come to. */
import { readFileSync } from 'node:fs';
import { describe, expect, it, test } from 'vitest';
import { outcomeWords } from '../../components/note/figures';
import { FUNCTIONS } from './functions';
import { calculation, quantityOf } from './items.fixture';
import { CONSTANTS } from '../quantities/constants';
import { UNITS } from '../quantities/unit-table';

const page = readFileSync('docs/expressions.md', 'utf8');
const rows = [...page.matchAll(/^\| `(.+?)` +\| (.+?) +\|$/gm)].map(
	([, expression, value]) => [expression!, value!] as const
);

const plain = (words: string) => words.replaceAll('\u202f', ' ');

describe('the page about expressions', () => {
	it('has its examples', () => expect(rows.length).toBeGreaterThan(15));

	test.each(rows)('%s comes to %s', (expression, value) => {
		const unit = /(?:^|[\d ])([A-Za-z]+)$/.exec(value.replace(/^\d+ values?,/, ''))?.[1] ?? '';
		for (const digits of ['1', '2', '3', '4']) {
			const { outcome } = quantityOf(
				[{ ...calculation('x', expression, unit, digits), id: 'x' }],
				'x'
			);
			if (plain(outcomeWords(outcome)) === value) return;
		}
		const { outcome } = quantityOf([calculation('x', expression, unit)], 'x');
		expect(plain(outcomeWords(outcome))).toBe(value);
	});

	it('names units, constants and functions that there are', () => {
		for (const name of ['sidereal_day', 'au', 'tex', 'ksi', 'degC'])
			expect(UNITS.has(name)).toBe(true);
		for (const name of ['pi', 'e', 'g_0', 'G', 'earth.GM', 'mars.radius'])
			expect(CONSTANTS.has(name), name).toBe(true);
		for (const name of ['interpolate', 'sum', 'mean', 'std', 'count'])
			expect(Object.keys(FUNCTIONS)).toContain(name);
	});
});
