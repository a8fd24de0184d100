/**
 * The field along a straight line from an anchor on the equator of one body, in the co-rotating frame.
 * r from the body's centre, m. Inward acceleration g(r) = GM/r² − ω²r, and a potential U with dU/dr = g.
 * With J2 (equator): g += (3/2) J2 GM R²/r⁴. Left out: higher harmonics, other bodies, the air.
 */
import type { Body } from './bodies';

export type Field = {
	/** Radius of the anchor, m. */
	base: number;
	/** Balance (synchronous) radius, m: g is zero there. */
	synchronous: number;
	/** Inward acceleration, m/s². */
	g: (r: number) => number;
	/** U(b) − U(a), J/kg, with (b − a) factored out so that near radii lose no digits. */
	rise: (a: number, b: number) => number;
};

export function bodyField(body: Body, { withJ2 = false } = {}): Field {
	const gm = body.gm.value;
	const base = body.radius.value;
	const omega2 = body.rate.value ** 2;
	const oblate = withJ2 && body.j2 ? body.j2.value * gm * base ** 2 : 0;
	const g = (r: number) => gm / r ** 2 - omega2 * r + (1.5 * oblate) / r ** 4;
	const rise = (a: number, b: number) =>
		(b - a) *
		(gm / (a * b) -
			(omega2 * (a + b)) / 2 +
			(0.5 * oblate * (a * a + a * b + b * b)) / (a * b) ** 3);
	return { base, synchronous: balance(gm, omega2, oblate), g, rise };
}

/** g(r) = 0: the cube root without J2, from there a few steps of Newton on r³ = (GM + (3/2) J2 GM R²/r²)/ω². */
function balance(gm: number, omega2: number, oblate: number): number {
	let r = Math.cbrt(gm / omega2);
	if (oblate === 0) return r;
	for (let i = 0; i < 20; i += 1) {
		const value = gm / r ** 2 - omega2 * r + (1.5 * oblate) / r ** 4;
		const slope = (-2 * gm) / r ** 3 - omega2 - (6 * oblate) / r ** 5;
		const step = value / slope;
		r -= step;
		if (Math.abs(step) < r * 1e-15) break;
	}
	return r;
}
