/** The field along an arm that spins in free space: r from the centre of the spin, m; g = −Ω²r. */
import type { Field } from '../line/field';

/** @param rate Ω, rad/s. Left out: whatever body the tether orbits, and its gravity gradient. */
export function spinField(rate: number): Field {
	const square = rate ** 2;
	return {
		base: 0,
		balance: 0,
		limit: Infinity,
		omega: rate,
		beyond: (r) => r,
		g: (r) => -square * r,
		rise: (a, b) => (-square * (b - a) * (a + b)) / 2,
		depth: (r) => (square * r ** 2) / 2,
		along: () => -square,
		inPlane: () => -square,
		outOfPlane: () => 0
	};
}
