/** Functions that take values one by one, from lists or written out, and come to one value. */
import { meanAndDeviation } from '../numerics/sample';

export type Gather = (values: ArrayLike<number>) => number;

export function least(values: ArrayLike<number>): number {
	let found = Infinity;
	for (let i = 0; i < values.length; i += 1) if (values[i]! < found) found = values[i]!;
	return found;
}

export function greatest(values: ArrayLike<number>): number {
	let found = -Infinity;
	for (let i = 0; i < values.length; i += 1) if (values[i]! > found) found = values[i]!;
	return found;
}

/** Keeps what each addition rounds off (Neumaier, ZAMM 54 (1974) 39), so that the order makes no difference. */
export function total(values: ArrayLike<number>): number {
	let sum = 0;
	let lost = 0;
	for (let i = 0; i < values.length; i += 1) {
		const value = values[i]!;
		const next = sum + value;
		lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
		sum = next;
	}
	// Where the sum overflows, what was lost is no number.
	return Number.isFinite(sum) ? sum + lost : sum;
}

/** Arithmetic mean, found by shares: a mean that can be told does not fail on a sum that cannot. */
export const mean: Gather = (values) => meanAndDeviation(Float64Array.from(values)).mean;

/** Standard deviation of a sample (n − 1); not a number for a single value, which has none. */
export const deviation: Gather = (values) =>
	values.length > 1 ? meanAndDeviation(Float64Array.from(values)).s : NaN;
