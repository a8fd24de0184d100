import { expect, test } from 'vitest';
import { panelsOf, profileCsv } from './panels';

const profile = {
	height: [0, 35_786_000, 100_000_000],
	area: [3.9e-6, 13.75e-6, 8.25e-6],
	stress: [50e9, 50e9, 50e9],
	tension: [195_000, 687_500, 412_500],
	synchronous: 35_786_000
};

test('each panel is in the largest unit that keeps its greatest value above one', () => {
	expect(panelsOf(profile).map(({ unit }) => unit)).toEqual(['mm²', 'GPa', 'kN']);
	expect(panelsOf(profile)[0]!.values[1]).toBeCloseTo(13.75, 10);
});

test('the table comes as CSV with quoted captions and CRLF, as RFC 4180 has it', () => {
	expect(profileCsv(profile).split('\r\n')).toEqual([
		'"height, km","section, mm²","stress, GPa","tension, kN"',
		'0,3.9,50,195',
		'35786,13.75,50,687.5',
		'100000,8.25,50,412.5',
		''
	]);
});
