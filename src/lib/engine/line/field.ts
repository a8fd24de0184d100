/**
 * The field along a straight line in the co-rotating frame, written once for all places where a line may
 * stand: r from the centre of the body that carries the anchor, m; inward acceleration g(r), and a
 * potential U with dU/dr = g. Everything about a line is computed on these alone.
 *
 * g and the depth below the balance radius are reckoned from that radius, with (r_s − r) and its square
 * factored out of every term: what is left are terms of one sign, so that nothing is lost to cancellation however
 * near the balance r lies. For this r_s is known to twice the digits of a double.
 */
import {
	add,
	divide,
	exactly,
	multiply,
	negative,
	twoProduct,
	twoSum,
	type DoubleDouble
} from '../numerics/double-double';
import { root } from '../numerics/root';

export type Field = {
	/** Radius of the anchor, m. */
	base: number;
	/** Balance radius, m: g is zero there (synchronous radius; L1 or L2 on a line from a moon). */
	balance: number;
	/** No line reaches this radius, m: the centre of the primary; Infinity on one body. */
	limit: number;
	/** Rate of rotation of the frame, rad/s. */
	omega: number;
	/** r − r_s, m, with the digits of r_s that a double has no place for. */
	beyond: (r: number) => number;
	/** Inward acceleration, m/s². */
	g: (r: number) => number;
	/** U(b) − U(a), J/kg, with (b − a) factored out so that near radii lose no digits. */
	rise: (a: number, b: number) => number;
	/** U(r_s) − U(r) ≥ 0, J/kg: how far r lies below the top of the potential, on either side of it. */
	depth: (r: number) => number;
	/** Stiffness per unit mass along the line, k_x = dg/dr, 1/s². */
	along: (r: number) => number;
	/** The same transverse in the plane of rotation, k_y, 1/s². */
	inPlane: (r: number) => number;
	/** The same transverse out of the plane, k_z, 1/s². */
	outOfPlane: (r: number) => number;
};

/** One body: gravitational parameter m³/s², equatorial radius m, rate of rotation rad/s, J2. */
export type Spheroid = { gm: number; radius: number; rate: number; j2: number };

/**
 * An anchor on the equator of one body: g = GM/r² − ω²r, with J2 (equator) + (3/2) J2 GM R²/r⁴.
 * Left out: higher harmonics, other bodies, the air.
 */
export function bodyField({ gm, radius, rate, j2 }: Spheroid): Field {
	const omega2 = rate ** 2;
	const oblate = j2 * gm * radius ** 2;
	const along = (r: number) => (-2 * gm) / r ** 3 - omega2 - (6 * oblate) / r ** 5;
	const [s, low] = polished(spheroidBalance(gm, omega2, oblate), along, (r) => {
		const spin = multiply(twoProduct(rate, rate), r);
		const square = multiply(r, r);
		const flat = multiply(twoProduct(1.5 * j2, gm), twoProduct(radius, radius));
		const pull = divide(exactly(gm), square);
		return add(add(pull, divide(divide(flat, square), square)), negative(spin));
	});
	const beyond = (r: number) => r - s - low;
	const g = (r: number) => {
		const sum = 1 / r + 1 / s;
		const squares = 1 / r ** 2 + 1 / s ** 2;
		return -beyond(r) * ((sum * (gm + 1.5 * oblate * squares)) / (r * s) + omega2);
	};
	return {
		base: radius,
		balance: s,
		limit: Infinity,
		omega: rate,
		beyond,
		g,
		rise: (a, b) =>
			(b - a) *
			(gm / (a * b) -
				(omega2 * (a + b)) / 2 +
				(0.5 * oblate * (1 / a ** 2 + 1 / (a * b) + 1 / b ** 2)) / (a * b)),
		depth: (r) =>
			beyond(r) ** 2 *
			((gm + 0.5 * oblate * (3 / s ** 2 + 2 / (r * s) + 1 / r ** 2)) / (r * s ** 2) + omega2 / 2),
		along,
		inPlane: (r) => g(r) / r,
		outOfPlane: (r) => gm / r ** 3 + (4.5 * oblate) / r ** 5
	};
}

/** g(r) = 0: the cube root without J2; g is convex and falls, so Newton's steps from there only rise. */
function spheroidBalance(gm: number, omega2: number, oblate: number): number {
	let r = Math.cbrt(gm / omega2);
	for (let i = 0; i < 60 && oblate > 0; i += 1) {
		const excess = gm / r ** 2 - omega2 * r + (1.5 * oblate) / r ** 4;
		const step = excess / ((2 * gm) / r ** 3 + omega2 + (6 * oblate) / r ** 5);
		r += step;
		if (Math.abs(step) < r * 1e-15) break;
	}
	return r;
}

/** A root of g near r to twice the digits: two steps of Newton on g in double-double. */
function polished(
	r: number,
	slope: (r: number) => number,
	g: (r: DoubleDouble) => DoubleDouble
): DoubleDouble {
	let found: DoubleDouble = [r, 0];
	for (let i = 0; i < 2; i += 1) {
		found = twoSum(found[0], found[1] - g(found)[0] / slope(found[0]));
	}
	return found;
}

export type MoonSystem = {
	/** Gravitational parameters of the moon and its primary, m³/s². */
	moonGm: number;
	primaryGm: number;
	/** Radius of the moon, m. */
	moonRadius: number;
	/** Between the centres, m. */
	distance: number;
};

/**
 * An anchor on a tidally locked moon on a circular orbit, the line towards the primary (near side) or
 * away from it (far side): s from the moon's centre, ω² = G(M₁ + M₂)/d³ from the distance. The primary's pull and
 * the turning about the barycentre, ω²x₂ = GM₁/d², are taken together, so that a small moon loses no digits:
 * g = GM₂/s² − s [GM₁(2d ∓ s)/(d²(d ∓ s)²) + ω²]. Left out: the orbit's eccentricity and inclination, the
 * bodies' oblateness, other bodies.
 */
export function moonField(system: MoonSystem, side: 'near' | 'far'): Field {
	const { moonGm, primaryGm, moonRadius, distance: d } = system;
	const towards = side === 'near' ? -1 : 1;
	const omega2 = (moonGm + primaryGm) / d ** 3;
	const fromPrimary = (s: number) => d + towards * s;
	const plain = (s: number) =>
		moonGm / s ** 2 -
		s * ((primaryGm * (2 * d + towards * s)) / (d * fromPrimary(s)) ** 2 + omega2);
	const along = (s: number) =>
		(-2 * moonGm) / s ** 3 - (2 * primaryGm) / fromPrimary(s) ** 3 - omega2;
	// g falls all the way: it is above zero near the moon, below it at the primary's centre or 2 d away.
	const start = root(plain, d * 1e-30, side === 'near' ? d * (1 - 2 ** -53) : 2 * d);
	const [balance, low] = polished(start, along, (s) => {
		const [moon, primary, between] = [moonGm, primaryGm, d].map(exactly) as DoubleDouble[];
		const signed = towards < 0 ? negative(s) : s;
		const span = multiply(between!, add(between!, signed));
		const square = multiply(between!, between!);
		const tide = divide(
			multiply(primary!, add(add(between!, between!), signed)),
			multiply(span, span)
		);
		const spin = divide(divide(add(moon!, primary!), square), between!);
		return add(divide(moon!, multiply(s, s)), negative(multiply(s, add(tide, spin))));
	});
	const beyond = (s: number) => s - balance - low;
	const outOfPlane = (s: number) => moonGm / s ** 3 + primaryGm / fromPrimary(s) ** 3;
	return {
		base: moonRadius,
		balance,
		limit: side === 'near' ? d : Infinity,
		omega: Math.sqrt(omega2),
		beyond,
		g: (s) => {
			const [here, there] = [fromPrimary(s), fromPrimary(balance)];
			return (
				-beyond(s) *
				((moonGm * (1 / s + 1 / balance)) / (s * balance) +
					(primaryGm * (1 / here + 1 / there)) / (here * there) +
					omega2)
			);
		},
		rise: (a, b) =>
			(b - a) *
			(moonGm / (a * b) -
				(primaryGm * (d * (a + b) + towards * a * b)) / (d * d * fromPrimary(a) * fromPrimary(b)) -
				(omega2 * (a + b)) / 2),
		depth: (s) =>
			beyond(s) ** 2 *
			(moonGm / (s * balance ** 2) +
				primaryGm / (fromPrimary(s) * fromPrimary(balance) ** 2) +
				omega2 / 2),
		along,
		// k_z − ω², the primary's part of the rate taken together with its pull.
		inPlane: (s) =>
			moonGm * (1 / s ** 3 - 1 / d ** 3) -
			(towards * primaryGm * s * (3 * d ** 2 + 3 * towards * d * s + s ** 2)) /
				(d * fromPrimary(s)) ** 3,
		outOfPlane
	};
}
