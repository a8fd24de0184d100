/** Identities of the special functions and distributions: A&S is Abramowitz and Stegun, Handbook of Mathematical Functions. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { erf, erfc } from './erf';
import { betaI, gammaQ, lnGamma, studentUpper } from './gamma';
import { normalDensity, normalProbability, normalQuantile } from './normal';
import { noncentralT } from './tolerance';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const log = (least: number, most: number) =>
	between(Math.log(least), Math.log(most)).map((ln) => Math.exp(ln));
const apart = (a: number, b: number) =>
	Math.abs(a - b) / Math.max(1e-300, Math.abs(a), Math.abs(b));

describe('the error function', () => {
	it('is odd, and with its complement comes to 1 (A&S 7.1.2, 7.1.9)', () => {
		fc.assert(
			fc.property(between(-30, 30), (x) => {
				expect(erf(-x) + erf(x)).toBe(0);
				expect(Math.abs(erf(x) + erfc(x) - 1)).toBeLessThan(4e-16);
			})
		);
	});
});

describe('the normal distribution', () => {
	it('has its quantile as the inverse of its probability, in both tails', () => {
		fc.assert(
			fc.property(log(1e-300, 0.5), (p) => {
				expect(apart(normalProbability(normalQuantile(p)), p)).toBeLessThan(1e-12);
				// Half a probability and more is told by its own digits, fewer than those of p.
				const upper = 1 - Math.max(p, 1e-9);
				expect(normalQuantile(upper)).toBeCloseTo(-normalQuantile(1 - upper), 8);
			})
		);
	});

	it('has its density as the slope of its probability', () => {
		fc.assert(
			fc.property(between(-6, 6), (z) => {
				const slope = (normalProbability(z + 1e-5) - normalProbability(z - 1e-5)) / 2e-5;
				expect(Math.abs(slope - normalDensity(z))).toBeLessThan(1e-9);
			})
		);
	});
});

describe('the gamma function', () => {
	it('goes on by Γ(a + 1) = a Γ(a) (A&S 6.1.15)', () => {
		fc.assert(
			fc.property(log(1e-3, 1e6), (a) => {
				const grown = lnGamma(a + 1) - lnGamma(a);
				expect(Math.abs(grown - Math.log(a))).toBeLessThan(1e-14 * (1 + Math.abs(lnGamma(a + 1))));
			})
		);
	});

	it('has an upper part that goes on by Q(a + 1, x) = Q(a, x) + xᵃ e⁻ˣ/Γ(a + 1) (A&S 6.5.21)', () => {
		fc.assert(
			fc.property(log(0.1, 500), between(0.01, 3), (a, share) => {
				const x = a * share;
				const step = Math.exp(a * Math.log(x) - x - lnGamma(a + 1));
				expect(Math.abs(gammaQ(a + 1, x) - gammaQ(a, x) - step)).toBeLessThan(1e-12);
				const [here, further] = [gammaQ(a, x), gammaQ(a, x * 1.01)];
				expect(further).toBeLessThanOrEqual(here);
			})
		);
	});
});

describe('the incomplete beta function', () => {
	it('is its own mirror, I_x(a, b) = 1 − I_{1−x}(b, a) (A&S 26.5.2), and rises with x', () => {
		fc.assert(
			fc.property(between(0.001, 0.999), log(0.1, 500), log(0.1, 500), (x, a, b) => {
				expect(Math.abs(betaI(x, a, b) + betaI(1 - x, b, a) - 1)).toBeLessThan(1e-11);
				expect(betaI(x * 1.0005, a, b)).toBeGreaterThanOrEqual(betaI(x, a, b) - 1e-14);
			})
		);
	});

	it('tells Student’s t, which nears the normal distribution', () => {
		fc.assert(
			fc.property(between(0, 5), (t) => {
				expect(Math.abs(studentUpper(t, 1e7) - normalProbability(-t))).toBeLessThan(1e-6);
				// One degree of freedom: Cauchy.
				expect(apart(studentUpper(t, 1), 0.5 - Math.atan(t) / Math.PI)).toBeLessThan(1e-10);
			})
		);
	});
});

describe('the non-central t', () => {
	it('has both sides come to 1, and at δ = 0 is Student’s', () => {
		fc.assert(
			fc.property(
				between(0, 6),
				fc.integer({ min: 1, max: 60 }),
				between(-2, 8),
				(t, nu, delta) => {
					const { below, above } = noncentralT(t, nu, delta);
					expect(Math.abs(below + above - 1)).toBeLessThan(1e-10);
					expect(Math.abs(noncentralT(t, nu, 0).above - studentUpper(t, nu))).toBeLessThan(1e-10);
				}
			),
			{ numRuns: 60 }
		);
	}, 60_000);
});
