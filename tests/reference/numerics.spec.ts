/** Numerical tools against mpmath at 40 digits (make_numerics.py). */
import { describe, expect, it } from 'vitest';
import { erf, erfc } from '$lib/engine/numerics/erf';
import { integrate } from '$lib/engine/numerics/quadrature';
import points from './data/erf.json';
import integrals from './data/integrals.json';

describe('the error function', () => {
	it('agrees at 128 points to fourteen digits', () => {
		expect(points).toHaveLength(128);
		for (const point of points) {
			expect(Math.abs(erf(point.x) - point.erf), `erf(${point.x})`).toBeLessThan(
				1e-14 * Math.abs(point.erf) + 1e-300
			);
		}
	});

	it('has its complement right where it is tiny', () => {
		for (const point of points.filter(({ x }) => x > 2.5)) {
			expect(Math.abs(erfc(point.x) / point.erfc - 1), `erfc(${point.x})`).toBeLessThan(1e-12);
		}
	});
});

describe('the quadrature', () => {
	it('finds a narrow peak, a smooth integrand and a tail', () => {
		const close = (value: number, expected: number) =>
			expect(Math.abs(value / expected - 1)).toBeLessThan(1e-12);
		const gaussian = integrate((x) => Math.exp(-x * x * 1e6), [-1, -0.01, 0, 0.01, 1], 1e-12);
		close(gaussian.value, integrals.gaussian);
		close(integrate((x) => Math.log1p(x) / x, [1e-3, 1], 1e-12).value, integrals.logarithm);
		close(integrate((x) => Math.exp(-x), [0, 10, 100, 700], 1e-12).value, integrals.decay);
	});

	it('says so instead of going on for ever where an integral does not converge', () => {
		expect(() => integrate((x) => Math.sin(1e9 * x), [0, 1], 1e-12)).toThrow('did not converge');
	});
});
