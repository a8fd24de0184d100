/**
 * From letting go at radius r to the entry interface r_e: speed, time and place of entry of a mass on
 * its own, on its ellipse about a point mass (Kepler).
 *
 * Anomalies are counted from the apoapsis, where it is let go: E′ = E − π, φ = ν − π. With x = ω²r³,
 * y = 2GM − x, d = r − r_e and b = 2GM r_e − ω²r³(r + r_e) the half angles are
 * tan²(E′/2) = d y/b and tan²(φ/2) = d x/b, exact just above the interface (d → 0) and near the radius from which the
 * periapsis grazes it (b → 0). Left out: the air, oblateness, and above all that the line holds together.
 */
import { add, exactly, negative, type DoubleDouble } from '../numerics/double-double';
import { gauss16 } from '../numerics/gauss';
import { plunge, spin } from './orbit';
import type { TurningBody } from './turning-body';

export type Entry = {
	/** Inertial speed, m/s: v_e² = ω²r² + 2GM (1/r_e − 1/r). */
	speed: number;
	/** Speed relative to the air, which turns with the body, m/s. */
	relativeSpeed: number;
	/** Below the horizontal, rad, of the inertial speed. */
	pathAngle: number;
	/** The same of the relative speed. */
	relativePathAngle: number;
	/** s from letting go */
	time: number;
	/** How far east of the point below the anchor's line it enters, rad: φ − ωt, not wrapped. */
	longitudeOffset: number;
};

/** Entry at r_e ≤ r of a mass let go at r, m; undefined where its periapsis does not lie below r_e. */
export function fallFrom(body: TurningBody, r: number, entry: DoubleDouble): Entry | undefined {
	const b = plunge(body, r, entry);
	if (!(b > 0)) return undefined;
	const { gm, rate } = body;
	const at = entry[0];
	const x = spin(body, r)[0];
	const y = 2 * gm - x;
	const drop = add(exactly(r), negative(entry))[0];
	const along = (rate * r ** 2) / at;
	// Over √d, so that the direction has its limit where d = 0.
	const downOverRoot = Math.sqrt(b / r) / at;
	const aheadOverRoot = (Math.sqrt(drop) * rate * (r + at)) / at;
	const root = Math.sqrt(drop);
	return {
		speed: Math.sqrt((rate * r) ** 2 + (2 * gm * drop) / (r * at)),
		relativeSpeed: root * Math.hypot(downOverRoot, aheadOverRoot),
		pathAngle: Math.atan2(root * downOverRoot, along),
		relativePathAngle: Math.atan2(downOverRoot, aheadOverRoot),
		...timeAndPlace({ gm, rate, r, x, y, drop, b })
	};
}

function timeAndPlace(it: Record<'gm' | 'rate' | 'r' | 'x' | 'y' | 'drop' | 'b', number>) {
	const { gm, rate, r, x, y, drop, b } = it;
	const eccentric = 2 * Math.atan2(Math.sqrt(drop * y), Math.sqrt(b));
	const turned = 2 * Math.atan2(Math.sqrt(drop * x), Math.sqrt(b));
	const e = (gm - x) / gm;
	const semiMajorAxis = (r * gm) / y;
	const time =
		semiMajorAxis * Math.sqrt(semiMajorAxis / gm) * (eccentric + e * Math.sin(eccentric));
	const offset = turned - rate * time;
	const precise = offset > 0.01 * turned;
	return { time, longitudeOffset: precise ? offset : smallOffset(e, (x * y) / gm ** 2, eccentric) };
}

/**
 * φ − ωt where the two are nearly alike: ∫ (dφ/dE′ − ω dt/dE′) dE′, whose integrand is a product of
 * factors above zero. It is smooth there, since E′ or e is small.
 */
function smallOffset(e: number, oneLessE2: number, eccentric: number): number {
	const ahead = (angle: number) => {
		const cos = Math.cos(angle);
		const fallen = 2 * Math.sin(angle / 2) ** 2;
		return (fallen * (2 + e + e * cos)) / (1 + e * cos);
	};
	const factor = (e * Math.sqrt(oneLessE2)) / (1 + e) ** 2;
	return factor * gauss16(ahead, 0, eccentric);
}
