/** Bodies and radii at random, for properties that hold for all of them. */
import fc from 'fast-check';
import type { TurningBody } from './turning-body';

/** From a boulder to a giant; the balance radius from just above the surface to 10⁴ radii. */
export const someBody: fc.Arbitrary<TurningBody> = fc
	.record({
		size: fc.double({ min: 1, max: 9, noNaN: true }),
		density: fc.double({ min: 300, max: 2e4, noNaN: true }),
		ratio: fc.double({ min: 0.01, max: 1e4, noNaN: true })
	})
	.map(({ size, density, ratio }) => {
		const radius = 10 ** size;
		const gm = 6.6743e-11 * density * (4 / 3) * Math.PI * radius ** 3;
		const rate = Math.sqrt(gm / (radius * (1 + ratio)) ** 3);
		return { gm, radius, rate, balance: Math.cbrt(gm / rate ** 2) };
	});

/** Where between two figures. */
export const share = fc.double({ min: 0, max: 1, noNaN: true });
