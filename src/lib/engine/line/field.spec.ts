import { describe, expect, it } from 'vitest';
import { bodyField, moonField, type Field } from './field';
import { radiusAbove, radiusAtDepth } from './level';

const earthLike = { gm: 4e14, radius: 6.4e6, rate: 7.3e-5 };
const moonSystem = { moonGm: 5e12, primaryGm: 4e14, moonRadius: 1.7e6, distance: 3.8e8 };
const fields: [string, Field][] = [
	['one body', bodyField({ ...earthLike, j2: 0 })],
	['an oblate body', bodyField({ ...earthLike, j2: 1e-3 })],
	['the near side of a moon', moonField(moonSystem, 'near')],
	['the far side of a moon', moonField(moonSystem, 'far')]
];

describe.each(fields)('the field of %s', (_, field) => {
	const { balance, base, g, rise, depth, along } = field;
	const radii = [base, base * 1.5, balance * 0.9, balance * 1.1, balance * 2, balance * 4];

	it('pulls inwards below the balance radius and outwards above it', () => {
		for (const r of radii) expect(Math.sign(g(r))).toBe(Math.sign(balance - r));
	});

	it('has a potential whose slope is g and whose top is at the balance radius', () => {
		for (const r of radii) {
			const h = r * 1e-6;
			expect(rise(r - h, r + h) / (2 * h) / g(r)).toBeCloseTo(1, 6);
			expect((g(r + h) - g(r - h)) / (2 * h) / along(r)).toBeCloseTo(1, 6);
			expect(depth(r)).toBeGreaterThan(0);
			expect(depth(r) / rise(r, balance)).toBeCloseTo(1, 9);
		}
		expect(depth(balance)).toBeLessThan(1e-20);
	});

	it('keeps its digits a hair from the balance radius, where g is all but linear', () => {
		// The step is taken from the radii as they are in doubles.
		const a = balance * (1 + 1e-9);
		const b = balance * (1 + 2e-9);
		expect((g(b) - g(a)) / (b - a) / along(balance)).toBeCloseTo(1, 7);
	});

	it('gives the radius for a depth on either side', () => {
		for (const r of radii) {
			const found =
				r > balance ? radiusAbove(field, depth(r)) : radiusAtDepth(field, depth(r), base * 0.5);
			expect(Math.abs(found / r - 1)).toBeLessThan(1e-13);
		}
		expect(radiusAbove(field, 0)).toBe(balance);
	});
});
