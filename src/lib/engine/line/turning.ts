/** Where the stress along a section that is linear in r may turn. */
import { root } from '../numerics/root';
import type { Line } from './line';
import type { Piece } from './piece';

/**
 * Radii at which A g turns inside linear pieces. At a radius where σ' = ρ g − σ A'/A is zero, σ'' = ρ (A g)'/A: so
 * between two such radii σ has greatest values inside or least values inside, one at the most. In a constant section
 * and in a taper σ turns at r_s only. A g turns at most once in a piece: below r_s where A grows, anywhere where A shrinks.
 */
export function turningRadii({ field, pieces }: Line): number[] {
	return pieces.flatMap((piece) => {
		const { from, to, slope } = piece;
		if (!slope) return [];
		const turn = (r: number) => field.along(r) * piece.area(r) + field.g(r) * slope;
		return turn(from) * turn(to) < 0 ? [root(turn, from, to)] : [];
	});
}

/** A radius with the tension, N, there. */
export type Tensed = readonly [radius: number, tension: number];

/**
 * The radius inside (from, to) at which the stress is greatest, if there is one.
 * @param tension T(r), N
 */
export function innerPeak(
	{ field, density }: Line,
	{ area, slope }: Piece,
	[from, lower]: Tensed,
	[to, upper]: Tensed,
	tension: (r: number) => number
): number | null {
	if (slope === null) return null;
	// σ' A²
	const climb = (r: number, T: number) => density * field.g(r) * area(r) ** 2 - T * slope;
	if (!(climb(from, lower) > 0 && climb(to, upper) < 0)) return null;
	return root((r) => climb(r, tension(r)), from, to);
}
