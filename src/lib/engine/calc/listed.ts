/** A list as it is told: in one unit for all of it, its first values, and what sums it up. */
import { fromSi } from '../quantities/units';
import { greatest, least, mean } from './gather';
import { uncertaintyIn, type Showing } from './quantity';
import type { Listed } from './results';

/** How many of the values cross to the page and into a baseline. */
export const MOST_TOLD = 1000;

export function listed(
	list: Float64Array,
	uncertainties: Float64Array | null,
	{ unit, text }: Showing,
	digits: number
): Listed {
	const told = list.subarray(0, MOST_TOLD);
	return {
		si: Array.from(told),
		dimension: unit.dimension,
		unit: text,
		digits,
		count: list.length,
		values: Array.from(told, (si) => fromSi(si, unit)),
		uncertainties:
			uncertainties &&
			Array.from(uncertainties.subarray(0, MOST_TOLD), (u) => uncertaintyIn(u || null, unit)),
		least: fromSi(least(list), unit),
		greatest: fromSi(greatest(list), unit),
		mean: fromSi(mean(list), unit)
	};
}

/** By its size; a list is shown in a unit in which that reads well. */
export function largestOf(list: Float64Array): number {
	const [low, high] = [least(list), greatest(list)];
	return Math.abs(low) > Math.abs(high) ? low : high;
}
