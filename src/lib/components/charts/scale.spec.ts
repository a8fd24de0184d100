import { expect, test } from 'vitest';
import { interpolate, linear, ticks } from './scale';

test('a linear scale carries the ends of the domain to the ends of the range', () => {
	const scale = linear([0, 100_000], [300, 0]);
	expect([scale(0), scale(25_000), scale(100_000)]).toEqual([300, 225, 0]);
});

test('ticks are round numbers inside the range', () => {
	expect(ticks(0, 100_000, 5)).toEqual([0, 20_000, 40_000, 60_000, 80_000, 100_000]);
	expect(ticks(0, 60.5, 4)).toEqual([0, 20, 40, 60]);
	expect(ticks(3, 3, 4)).toEqual([3]);
});

test('between rows of a table values lie on a straight line, and beyond its ends they stay', () => {
	expect(interpolate([0, 10, 20], [1, 3, 3], 5)).toBe(2);
	expect(interpolate([0, 10, 20], [1, 3, 3], 25)).toBe(3);
	expect(interpolate([0, 10, 20], [1, 3, 3], -1)).toBe(1);
});
