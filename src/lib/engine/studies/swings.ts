/** The swing of an output as one given after the other goes from its estimate to ± its standard uncertainty. */
import { Refused } from '../methods/refused';
import type { Model } from './model';
import type { Estimate } from './slopes';

export type Reach = Estimate & {
	/** Bounds that the given does not pass. */
	least?: number | undefined;
	most?: number | undefined;
};

/** Values of the outputs at one end; what the model refused there stands in words. */
export type End = { at: number; outputs: Float64Array } | { at: number; refusal: string };

export type Swing = { low: End; high: End };

/** A row for each given, in their order; an end that would pass a bound is taken at the bound. */
export function swingsOf(model: Model, givens: readonly Reach[], outputs: number): Swing[] {
	const estimates = Float64Array.from(givens, ({ value }) => value);
	const end = (i: number, at: number): End => {
		const x = Float64Array.from(estimates);
		x[i] = at;
		const y = new Float64Array(outputs);
		try {
			model(x, y);
		} catch (error) {
			if (!(error instanceof Refused)) throw error;
			return { at, refusal: error.message };
		}
		return { at, outputs: y };
	};
	return givens.map(({ value, u, least, most }, i) => ({
		low: end(i, Math.max(value - u, least ?? -Infinity)),
		high: end(i, Math.min(value + u, most ?? Infinity))
	}));
}
