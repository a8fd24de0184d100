/** Stretches of a line over which the section is smooth, with the integrals that statics needs in closed form. */
import { gauss16 } from '../numerics/gauss';
import type { Field } from './field';
import { spreadOver } from './spread';

/** A stretch [from, to] over which the section is smooth. */
export type Piece = {
	/** m */
	from: number;
	/** m */
	to: number;
	/** A(r), m² */
	area: (r: number) => number;
	/** dA/dr where the section is linear in r, m; null where it is a taper. */
	slope: number | null;
	/** ∫ A g dr from a up to b, m⁴/s²; times ρ it is the gain of tension from a to b. */
	weight: (a: number, b: number) => number;
	/** ∫ A dr from a up to b, m³ */
	volume: (a: number, b: number) => number;
};

export const constantPiece = (field: Field, from: number, to: number, area: number): Piece => ({
	from,
	to,
	area: () => area,
	slope: 0,
	weight: (a, b) => area * field.rise(a, b),
	volume: (a, b) => area * (b - a)
});

export function linearPiece(
	field: Field,
	[from, start]: readonly [radius: number, area: number],
	[to, end]: readonly [radius: number, area: number]
): Piece {
	if (start === end) return constantPiece(field, from, to, start);
	const slope = (end - start) / (to - from);
	// A mean of both ends, so that it is exact at them however far apart the two sections are.
	const area = (r: number) => (start * (to - r) + end * (r - from)) / (to - from);
	return {
		from,
		to,
		area,
		slope,
		weight: (a, b) => overPanels((r) => area(r) * field.g(r), a, b, field.limit),
		volume: (a, b) => area((a + b) / 2) * (b - a)
	};
}

/** The constant-stress taper A = A(r_s) exp{−k [U(r_s) − U(r)]}, k = ρ/σ_d: there ∫ A g dr = [A]/k. */
export function taperPiece(
	field: Field,
	{ k, peakArea }: { k: number; peakArea: number },
	from: number,
	to: number
): Piece {
	const area = (r: number) => peakArea * Math.exp(-k * field.depth(r));
	const volumeFrom = (near: number, far: number) => area(near) * spreadOver(field, near, far)(k);
	return {
		from,
		to,
		area,
		slope: null,
		weight: (a, b) => {
			const rise = k * field.rise(a, b);
			// From the larger of the two sections, so that nothing overflows.
			return rise > 0 ? (-area(b) * Math.expm1(-rise)) / k : (area(a) * Math.expm1(rise)) / k;
		},
		volume: (a, b) => {
			if (b <= field.balance) return volumeFrom(b, a);
			if (a >= field.balance) return volumeFrom(a, b);
			return volumeFrom(field.balance, a) + volumeFrom(field.balance, b);
		}
	};
}

/**
 * ∫ f from a to b where f is smooth but for poles at the centre, r = 0, and at `limit`: over panels no longer than twice
 * their distance from both, where sixteen points leave nothing above rounding.
 */
function overPanels(f: (r: number) => number, a: number, b: number, limit: number): number {
	let sum = 0;
	for (let from = a; from < b;) {
		const reach = from + Math.min(2 * from, (2 / 3) * (limit - from));
		const to = reach > from && reach < b ? reach : b;
		sum += gauss16(f, from, to);
		from = to;
	}
	return sum;
}
