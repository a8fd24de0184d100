import { describe, expect, it } from 'vitest';
import { bodyField, moonField } from './field';
import { spreadOver } from './spread';
import type { Field } from './field';

const spread = (field: Field, k: number, near: number, far: number) =>
	spreadOver(field, near, far)(k);

const earth = bodyField({ gm: 3.986004418e14, radius: 6_378_137, rate: 7.292115e-5, j2: 0 });

describe('the length weighted by the section', () => {
	it('is the plain length where the line weighs nothing against its stress', () => {
		for (const end of [earth.base, 1e8, 1e10]) {
			const plain = Math.abs(end - earth.balance);
			expect(spread(earth, 1e-30, earth.balance, end) / plain).toBeCloseTo(1, 13);
		}
	});

	it('tends to half a Gaussian where the line is far too heavy', () => {
		// Laplace’s method: ∫ exp(−k |g′| x²/2) dx from 0, without a term in between.
		for (const k of [1e4, 1e12]) {
			const half = Math.sqrt(Math.PI / (2 * k * -earth.along(earth.balance)));
			const found = spread(earth, k, earth.balance, earth.base);
			expect(Math.abs(found / half - 1)).toBeLessThan(1 / Math.sqrt(k));
		}
	});

	it('falls as the line gets heavier, without a jump where the panels change', () => {
		const moon = moonField(
			{ moonGm: 4.9e12, primaryGm: 3.986e14, moonRadius: 1.7374e6, distance: 3.844e8 },
			'near'
		);
		for (const [field, end] of [
			[earth, earth.base],
			[earth, 1.5e8],
			[moon, moon.base],
			[moon, 3.7e8]
		] as const) {
			let before = spread(field, 1e-9, field.balance, end);
			for (let lnK = Math.log(1e-9); lnK < Math.log(1e-3); lnK += 1e-2) {
				const now = spread(field, Math.exp(lnK), field.balance, end);
				expect(now).toBeLessThan(before * (1 + 1e-11));
				before = now;
			}
		}
	});
});
