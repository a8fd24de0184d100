import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { root } from './root';

describe('the root of a function in a bracket', () => {
	it('is met to the last digits, also where the function is flat or steep', () => {
		const functions: ((x: number) => number)[] = [
			(x) => x,
			(x) => x ** 3,
			(x) => Math.expm1(50 * x),
			(x) => Math.atan(1e6 * x),
			(x) => Math.sign(x) * Math.sqrt(Math.abs(x))
		];
		fc.assert(
			fc.property(
				fc.double({ min: -5, max: 5, noNaN: true }),
				fc.nat(functions.length - 1),
				(zero, which) => {
					const found = root((x) => functions[which]!(x - zero), -6, 7);
					expect(Math.abs(found - zero)).toBeLessThan(1e-14 * Math.max(1, Math.abs(zero)));
				}
			)
		);
	});

	it('takes either order of the ends and a root at an end', () => {
		expect(root((x) => x - 1, 1, 3)).toBe(1);
		expect(root((x) => x - 3, 1, 3)).toBe(3);
		expect(root((x) => x * x - 2, 2, 0)).toBeCloseTo(Math.SQRT2, 15);
	});
});
