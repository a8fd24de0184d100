import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UNIVERSAL } from '../quantities/universal';
import { exactly } from '../numerics/double-double';
import { departureAt } from './departure';
import { IN_PLANE, c3ToReach, heliocentricPath, relativeExcess } from './heliocentric';

/** Even over the range: doubles at random as they are stored lie near zero, most of them. */
const between = (min: number, max: number) => fc.nat(1e9).map((n) => min + (max - min) * (n / 1e9));
const distance = between(9, 13).map((exponent) => 10 ** exponent);
const angle = between(0, 2 * Math.PI);
const tilt = between(0, 1.5);

describe('the path about the Sun', () => {
	it('just reaches the distance for which it was asked, as an ellipse that touches both', () => {
		fc.assert(
			fc.property(distance, distance, (from, target) => {
				fc.pre(Math.abs(target / from - 1) > 1e-9);
				const c3 = c3ToReach(target, from, UNIVERSAL.sunGm.value);
				const excess = relativeExcess(exactly(c3), from, UNIVERSAL.sunGm.value);
				const { nearPoint, farPoint } = heliocentricPath(
					from,
					excess,
					IN_PLANE,
					target > from ? 1 : -1
				);
				expect(Math.min(from, target) / nearPoint).toBeCloseTo(1, 9);
				expect(Math.max(from, target) / farPoint!).toBeCloseTo(1, 9);
			})
		);
	});

	it('reaches the further outwards and inwards the faster it leaves', () => {
		const slow = between(0, 0.41);
		fc.assert(
			fc.property(slow, slow, (a, b) => {
				const [less, more] = [Math.min(a, b), Math.max(a, b)].map((w) => {
					const excess = exactly(w ** 2);
					return {
						out: heliocentricPath(1, excess, IN_PLANE, 1).farPoint!,
						back: heliocentricPath(1, excess, IN_PLANE, -1).nearPoint
					};
				});
				expect(more!.out).toBeGreaterThanOrEqual(less!.out);
				expect(more!.back).toBeLessThanOrEqual(less!.back);
			})
		);
	});

	it('leaves the Sun for good outwards from √2 − 1 of the body’s speed, inwards from √2 + 1', () => {
		const at = (w: number, sense: 1 | -1) =>
			heliocentricPath(1, exactly(w ** 2), IN_PLANE, sense).farPoint;
		expect(at(Math.SQRT2 - 1 - 1e-9, 1)).toBeGreaterThan(1e8);
		expect(at(Math.SQRT2 - 1 + 1e-9, 1)).toBeUndefined();
		expect(at(Math.SQRT2 + 1 - 1e-9, -1)).toBeGreaterThan(1e8);
		expect(at(Math.SQRT2 + 1 + 1e-9, -1)).toBeUndefined();
	});

	it('falls into the Sun when the body’s speed is taken off whole, and goes round backwards beyond', () => {
		expect(heliocentricPath(1, exactly(1), IN_PLANE, -1)).toMatchObject({
			nearPoint: 0,
			farPoint: 1
		});
		expect(heliocentricPath(1, exactly(2.25), IN_PLANE, -1).inclination).toBe(Math.PI);
	});
});

describe('the departure of a day', () => {
	it('stands off the body’s motion by δ, sin δ = sin ε |cos L|, in a direction of unit length', () => {
		fc.assert(
			fc.property(angle, tilt, (sun, slope) => {
				const { declination, direction } = departureAt(sun, slope);
				const { ahead, aheadShort, outward, north } = direction;
				expect(Math.hypot(ahead, outward, north)).toBeCloseTo(1, 13);
				expect(Math.cos(declination)).toBeCloseTo(ahead, 13);
				expect(1 - aheadShort).toBeCloseTo(ahead, 13);
				expect(Math.sin(declination)).toBeCloseTo(Math.abs(Math.sin(slope) * Math.cos(sun)), 13);
			})
		);
	});

	it('lies in the plane of the equator, whose pole leans towards longitude 90°', () => {
		fc.assert(
			fc.property(angle, tilt, (sun, slope) => {
				const { ahead, outward, north } = departureAt(sun, slope).direction;
				// Along the motion, from the Sun, out of the ecliptic: as vectors of the ecliptic.
				const x = ahead * Math.sin(sun) - outward * Math.cos(sun);
				const y = -ahead * Math.cos(sun) - outward * Math.sin(sun);
				expect(Math.abs(y * Math.sin(slope) + north * Math.cos(slope))).toBeLessThan(1e-13);
				expect(Math.hypot(x, y, north)).toBeCloseTo(1, 13);
			})
		);
	});
});
