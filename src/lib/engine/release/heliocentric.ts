/**
 * The path about the Sun after letting go: patched conics, the body on a circle of radius d about the
 * Sun, v∞ added to the body's velocity. Lengths in d and speeds in that of the body, v_b = √(GM_sun/d): w = v∞/v_b.
 *
 * 1 − w (a fall into the Sun), √2 − 1 − w (an escape from it) and √2 + 1 − w come from w² in two doubles, so that paths
 * near those limits keep their digits. Left out: the body's eccentricity, phasing, planets.
 */
import {
	add,
	divide,
	exactly,
	multiply,
	negative,
	type DoubleDouble
} from '../numerics/double-double';

/** How v∞ lies to the body's velocity: cosines to it and to the radius from the Sun, and out of the ecliptic. */
export type Direction = {
	/** Cosine to the body's velocity, above 0; the other way about is `sense` −1. */
	ahead: number;
	/** 1 − ahead */
	aheadShort: number;
	outward: number;
	north: number;
};

/** v∞ in the plane of the body's path and along its velocity. */
export const IN_PLANE: Direction = { ahead: 1, aheadShort: 0, outward: 0, north: 0 };

export type HeliocentricPath = {
	/** m from the Sun */
	nearPoint: number;
	/** m; none where the path leaves the Sun for good. */
	farPoint: number | undefined;
	/** rad, to the plane of the body's own path; above π/2 it goes round backwards. */
	inclination: number;
};

/** w² = C3 d/GM_sun */
export const relativeExcess = (c3: DoubleDouble, distance: number, sunGm: number): DoubleDouble =>
	divide(multiply(c3, exactly(distance)), exactly(sunGm));

/** √2 in two doubles. */
const ROOT_2: DoubleDouble = [Math.SQRT2, -9.667293313452913e-17];

/** a − w from a² − w², where a is 1, √2 − 1 or √2 + 1. */
function less(square: DoubleDouble, excess: DoubleDouble, a: number): number {
	return add(square, negative(excess))[0] / (a + Math.sqrt(excess[0]));
}

const SLOW = add(exactly(3), multiply(exactly(-2), ROOT_2));
const FAST = add(exactly(3), multiply(exactly(2), ROOT_2));

/** @param sense 1 with the body's velocity, −1 against it */
export function heliocentricPath(
	distance: number,
	excess: DoubleDouble,
	{ ahead, aheadShort, outward, north }: Direction,
	sense: 1 | -1
): HeliocentricPath {
	const w = Math.sqrt(excess[0]);
	const tangential = sense > 0 ? 1 + w * ahead : less(exactly(1), excess, 1) + w * aheadShort;
	const slowLess = less(SLOW, excess, Math.SQRT2 - 1);
	const fastLess = less(FAST, excess, Math.SQRT2 + 1);
	// d/a = 2 − v²/v_b²
	const bound =
		sense > 0
			? slowLess * (Math.SQRT2 + 1 + w) + 2 * w * aheadShort
			: fastLess * (Math.SQRT2 - 1 + w) - 2 * w * aheadShort;
	const radial = w * outward;
	const lift = w * north;
	// The parameter over d, and the eccentricity from its two components.
	const parameter = tangential ** 2 + lift ** 2;
	const e = Math.hypot(
		w * (2 * sense * ahead + w * (ahead ** 2 + north ** 2)),
		radial * Math.sqrt(parameter)
	);
	return {
		nearPoint: (distance * parameter) / (1 + e),
		farPoint: bound > 0 ? (distance * (1 + e)) / bound : undefined,
		inclination: Math.atan2(Math.abs(lift), tangential)
	};
}

/**
 * C3, m²/s², of the slowest departure in the plane that reaches `target` from a circle of radius `distance`, m
 * (Hohmann): v∞/v_b = |√(2D/(D + d)) − 1|.
 */
export function c3ToReach(target: number, distance: number, sunGm: number): number {
	const square = (2 * target) / (target + distance);
	const w = (target - distance) / (target + distance) / (1 + Math.sqrt(square));
	return w ** 2 * (sunGm / distance);
}
