/** What the parts of an expression with lists come to: their values, and what uncertain givens do to each. */
import { Refusal } from './faults';

/**
 * One value, or those of a list. `shares` has for each value a row of ∂f/∂xᵢ · uᵢ, as wide as there are
 * uncertain givens xᵢ; null where all values are exact.
 */
export type Figures = { values: ArrayLike<number>; shares: Float64Array | null };

/** Values found on the way, of all parts together: what takes longer holds up who types. */
export const MOST_STEPS = 1_000_000;

/** What one run reads and may spend. */
export class Inputs {
	private steps = 0;

	constructor(
		/** Of the names of the expression, in their order. */
		readonly named: readonly Figures[],
		/** How many givens the shares are for. */
		readonly width: number
	) {}

	/** @throws Refusal where the run has found more values than it may. */
	spend(steps: number): void {
		this.steps += steps;
		if (this.steps <= MOST_STEPS) return;
		throw new Refusal(
			'too-long',
			'The lists are too long for so much to be done with them at once.',
			{
				remedy: 'Split the expression into several calculations.'
			}
		);
	}
}

/** Where in some figures a value stands. */
export type Place = { figures: Figures; at: number };

/** Adds up, for the value at `to`, what the values at these places pass on of their shares by these slopes. */
export function passOn(
	found: Figures,
	to: number,
	width: number,
	places: readonly Place[],
	slopes: readonly number[]
): void {
	const row = found.shares!.subarray(to * width, (to + 1) * width);
	places.forEach(({ figures: { shares }, at }, k) => {
		const slope = slopes[k]!;
		// What does nothing to the whole does nothing, however uncertain it is.
		if (!shares || slope === 0) return;
		for (let i = 0; i < width; i += 1) {
			const share = shares[at * width + i]!;
			if (share !== 0) row[i]! += slope * share;
		}
	});
}
