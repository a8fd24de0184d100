/**
 * The field along a straight line in the co-rotating frame, written once for all places where a line may
 * stand: r from the centre of the body that carries the anchor, m; inward acceleration g(r), and a
 * potential U with dU/dr = g. Everything about a line is computed on these alone.
 */

export type Field = {
	/** Radius of the anchor, m. */
	base: number;
	/** Balance radius, m: g is zero there (synchronous radius; L1 or L2 on a line from a moon). */
	balance: number;
	/** No line reaches this radius, m: the centre of the primary; Infinity on one body. */
	limit: number;
	/** Rate of rotation of the frame, rad/s. */
	omega: number;
	/** Inward acceleration, m/s². */
	g: (r: number) => number;
	/** U(b) − U(a), J/kg, with (b − a) factored out so that near radii lose no digits. */
	rise: (a: number, b: number) => number;
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
	const g = (r: number) => gm / r ** 2 - omega2 * r + (1.5 * oblate) / r ** 4;
	return {
		base: radius,
		balance: balance(gm, omega2, oblate),
		limit: Infinity,
		omega: rate,
		g,
		rise: (a, b) =>
			(b - a) *
			(gm / (a * b) -
				(omega2 * (a + b)) / 2 +
				(0.5 * oblate * (a * a + a * b + b * b)) / (a * b) ** 3),
		along: (r) => (-2 * gm) / r ** 3 - omega2 - (6 * oblate) / r ** 5,
		inPlane: (r) => g(r) / r,
		outOfPlane: (r) => gm / r ** 3 + (4.5 * oblate) / r ** 5
	};
}

/** g(r) = 0: the cube root without J2, from there a few steps of Newton. */
function balance(gm: number, omega2: number, oblate: number): number {
	const r = Math.cbrt(gm / omega2);
	if (oblate === 0) return r;
	return newton(
		r,
		(r) => gm / r ** 2 - omega2 * r + (1.5 * oblate) / r ** 4,
		(r) => (-2 * gm) / r ** 3 - omega2 - (6 * oblate) / r ** 5
	);
}

function newton(start: number, f: (x: number) => number, slope: (x: number) => number): number {
	let x = start;
	for (let i = 0; i < 60; i += 1) {
		const step = f(x) / slope(x);
		x -= step;
		if (Math.abs(step) < Math.abs(x) * 1e-15) break;
	}
	return x;
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
 * away from it (far side): s from the moon's centre, ω² = G(M₁ + M₂)/d³ from the distance. Left out: the
 * orbit's eccentricity and inclination, the bodies' oblateness, other bodies.
 */
export function moonField(system: MoonSystem, side: 'near' | 'far'): Field {
	const { moonGm, primaryGm, moonRadius, distance: d } = system;
	const towards = side === 'near' ? -1 : 1;
	const omega2 = (moonGm + primaryGm) / d ** 3;
	const barycentre = (d * primaryGm) / (moonGm + primaryGm);
	const fromPrimary = (s: number) => d + towards * s;
	const g = (s: number) =>
		moonGm / s ** 2 +
		(towards * primaryGm) / fromPrimary(s) ** 2 -
		towards * omega2 * (barycentre + towards * s);
	const along = (s: number) =>
		(-2 * moonGm) / s ** 3 - (2 * primaryGm) / fromPrimary(s) ** 3 - omega2;
	const outOfPlane = (s: number) => moonGm / s ** 3 + primaryGm / fromPrimary(s) ** 3;
	return {
		base: moonRadius,
		// Hill's radius is near L1 and L2 alike.
		balance: newton(d * Math.cbrt(moonGm / (3 * primaryGm)), g, along),
		limit: side === 'near' ? d : Infinity,
		omega: Math.sqrt(omega2),
		g,
		rise: (a, b) =>
			(b - a) *
			(moonGm / (a * b) +
				(towards * primaryGm) / (fromPrimary(a) * fromPrimary(b)) -
				(towards * omega2 * (2 * barycentre + towards * (a + b))) / 2),
		along,
		inPlane: (s) => outOfPlane(s) - omega2,
		outOfPlane
	};
}
