/** Radii by their depth below the top of the potential. */
import type { Field } from './field';

/**
 * The radius whose depth U(r_s) − U(r) is `depth`, J/kg, on the side of `start`, which lies at least as deep.
 * Depth is convex on either side of r_s, so Newton's steps from there only come nearer.
 */
export function radiusAtDepth(field: Field, depth: number, start: number): number {
	const side = Math.sign(start - field.balance);
	let r = start;
	for (let i = 0; i < 200; i += 1) {
		const step = (field.depth(r) - depth) / field.g(r);
		if (!(step * side < 0) || Math.abs(step) < 1e-16 * r) break;
		r += step;
	}
	return r;
}

/** The radius above r_s at that depth. */
export function radiusAbove(field: Field, depth: number): number {
	// Depth is at least ω²(r − r_s)²/2, and on a line towards a primary it grows without bound.
	const furthest = field.balance + Math.sqrt(2 * depth) / field.omega;
	return radiusAtDepth(field, depth, Math.min(furthest, field.limit * (1 - 2 ** -53)));
}
