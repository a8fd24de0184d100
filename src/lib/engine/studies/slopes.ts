/** How the outputs of a model change with each given, about the estimates. */
import { derivatives } from '../numerics/derivative';
import { Refused } from '../methods/refused';
import type { Model } from './model';

export type Estimate = { name: string; value: number; u: number };

/** The outputs at the estimates. @throws Refused where the model refuses them. */
export function valuesAt(model: Model, givens: readonly Estimate[], outputs: number): Float64Array {
	const y = new Float64Array(outputs);
	model(
		Float64Array.from(givens, ({ value }) => value),
		y
	);
	return y;
}

/** Of a given's value, where its uncertainty is smaller: differences over less lose digits. */
const SHORTEST = 1e-3;
const SHORTENED = [1, 0.1, 0.01, 1e-3, 1e-4];

/**
 * ∂y/∂x, a row for each given. The first step is the given's standard uncertainty, or a thousandth of its
 * value where that is more; it is shortened where the model refuses so far away.
 * @throws Refused where it refuses however near.
 */
export function slopesOf(
	model: Model,
	givens: readonly Estimate[],
	outputs: number
): Float64Array[] {
	const x = Float64Array.from(givens, ({ value }) => value);
	return givens.map(({ name, value, u }, i) => {
		const at = (offset: number) => {
			const y = new Float64Array(outputs);
			x[i] = value + offset;
			try {
				model(x, y);
			} finally {
				x[i] = value;
			}
			return y;
		};
		const step = Math.max(u, SHORTEST * Math.abs(value));
		const slopes = nearEnough((share) => derivatives(at, outputs, step * share));
		if (slopes instanceof Float64Array) return slopes;
		throw new Refused(
			`There is no slope along ${name}: on one side of ${value} there is no result. ${slopes.message}`,
			{ remedy: 'Use Monte Carlo, or move the value away from its bound.' }
		);
	});
}

/** The first that is not refused; the last refusal otherwise. */
function nearEnough<T>(attempt: (share: number) => T): T | Refused {
	let refused: Refused | undefined;
	for (const share of SHORTENED) {
		try {
			return attempt(share);
		} catch (error) {
			if (!(error instanceof Refused)) throw error;
			refused = error;
		}
	}
	return refused!;
}
