/**
 * Departures over the year. The line turns in the plane of the equator, which is tilted by ε to the
 * ecliptic, and v∞ can be had in any direction of that plane: the best one lies along the projection of the body's
 * heliocentric velocity on it. With the Sun at longitude L, seen from the body and counted from its equinox, and s =
 * sin ε cos L: the velocity stands at δ = asin |s| to the equator. v∞ then has the cosines √(1 − s²) to
 * the velocity, −sin²ε sin L cos L/√(1 − s²) to the radius from the Sun and s cos ε/√(1 − s²) out of the ecliptic.
 *
 * Frame: ecliptic and equinox of date. The body moves on a circle; left out: its eccentricity, aberration, planets.
 */
import { Refused } from '../methods/refused';
import type { Direction } from './heliocentric';

export type Departure = {
	/** δ, rad: between the heliocentric velocity and the equator. */
	declination: number;
	direction: Direction;
};

/** Cosine of δ below which the velocity stands upright on the equator and has no projection there. */
const UPRIGHT = 1e-9;

/** @param sun longitude, rad. @param tilt rad. @throws Refused where the velocity stands upright on the equator */
export function departureAt(sun: number, tilt: number): Departure {
	const sine = Math.sin(tilt) * Math.cos(sun);
	const ahead = Math.hypot(Math.cos(tilt) * Math.cos(sun), Math.sin(sun));
	if (ahead < UPRIGHT)
		throw new Refused(
			'The body’s velocity stands upright on its equator: it has no projection there.'
		);
	return {
		declination: Math.atan2(Math.abs(sine), ahead),
		direction: {
			ahead,
			aheadShort: sine ** 2 / (1 + ahead),
			outward: (-(Math.sin(tilt) ** 2) * Math.sin(sun) * Math.cos(sun)) / ahead,
			north: (sine * Math.cos(tilt)) / ahead
		}
	};
}
