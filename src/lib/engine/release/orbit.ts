/**
 * The orbit of a mass let go from a line at radius r: radial speed 0, tangential speed ωr in the
 * inertial frame, so that r is an apsis. Two bodies, conic sections (Kepler).
 *
 * Everything follows from x = ω²r³ against GM: x = GM on the synchronous orbit, x = 2 GM at escape. These
 * differences are taken in two doubles, so that an orbit a hair from either keeps its digits.
 * Left out: oblateness, other bodies, the air, the line's own swing.
 */
import {
	add,
	divide,
	exactly,
	multiply,
	negative,
	twoProduct,
	type DoubleDouble
} from '../numerics/double-double';
import type { TurningBody } from './turning-body';

/** ω²r³, m³/s² */
export const spin = ({ rate }: TurningBody, r: number): DoubleDouble =>
	multiply(twoProduct(rate, rate), multiply(twoProduct(r, r), exactly(r)));

/** C3 = ω²r² − 2GM/r, m²/s²: twice the energy per mass; from 0 on the mass escapes. */
export const c3At = (body: TurningBody, r: number): DoubleDouble =>
	divide(add(spin(body, r), exactly(-2 * body.gm)), exactly(r));

export type Orbit = {
	/** ωr, m/s */
	speed: number;
	/** m²/s² */
	c3: number;
	eccentricity: number;
	/** m from the centre */
	periapsis: number;
	/** None on an escape. */
	apoapsis: number | undefined;
	/** a, m; none on an escape. */
	semiMajorAxis: number | undefined;
	/** s; none on an escape. */
	period: number | undefined;
	/** v∞ = √C3, m/s; none where the mass stays bound. */
	excessSpeed: number | undefined;
};

/** The orbit from radius r, m. */
export function orbitFrom(body: TurningBody, r: number): Orbit {
	const { gm, rate } = body;
	const x = spin(body, r);
	const c3 = c3At(body, r)[0];
	const bound = -add(x, exactly(-2 * gm))[0];
	const eccentricity = Math.abs(add(x, exactly(-gm))[0]) / gm;
	const about = { speed: rate * r, c3, eccentricity };
	if (bound <= 0) {
		const open = { apoapsis: undefined, semiMajorAxis: undefined, period: undefined };
		return { ...about, ...open, periapsis: r, excessSpeed: Math.sqrt(c3) };
	}
	const other = (r * x[0]) / bound;
	const semiMajorAxis = (r * gm) / bound;
	return {
		...about,
		periapsis: Math.min(r, other),
		apoapsis: Math.max(r, other),
		semiMajorAxis,
		period: 2 * Math.PI * semiMajorAxis * Math.sqrt(semiMajorAxis / gm),
		excessSpeed: undefined
	};
}

/**
 * 2GM r_e − ω²r³ (r + r_e), m⁴/s²: above 0 where the periapsis lies below r_e < r_s, at 0 where it
 * grazes it. `entry` is r_e in two doubles.
 */
export function plunge(body: TurningBody, r: number, entry: DoubleDouble): number {
	const pull = multiply(exactly(2 * body.gm), entry);
	return add(pull, negative(multiply(spin(body, r), add(entry, exactly(r)))))[0];
}
