/** A line under many sets of climbers: what the worst of them does. The line itself is hung once. */
import { marginOf } from './as-built';
import { topOf, type Line, type PointMass } from './line';
import { hangForSurvey, survey, type Extremes } from './survey';

export type Moment = Extremes & { margin: number | undefined };

/**
 * @param limitStress σ_al/FS, Pa
 * @param moments the climbers on the line at each moment, besides its own point masses
 */
export function envelope(
	line: Line,
	limitStress: number,
	moments: readonly (readonly PointMass[])[]
): Moment[] {
	const hanging = hangForSurvey(line);
	return moments.map((climbers) => {
		const found = survey(line, hanging, limitStress, climbers);
		return { ...found, margin: marginOf(limitStress, found.stress) };
	});
}

/** One climber at `count` radii, equally spaced, both ends among them. */
export function climberGrid(
	line: Line,
	mass: number,
	{ from = line.pieces[0]!.from, to = topOf(line), count }: Grid
): PointMass[][] {
	return Array.from({ length: count }, (_, i) => {
		const radius = i === count - 1 ? to : from + (i * (to - from)) / (count - 1);
		return [{ radius, mass }];
	});
}

export type Grid = { from?: number | undefined; to?: number | undefined; count: number };

/** The place in the list of the least figure; null where there is none. The first of equal ones. */
export function leastOf<T>(list: readonly T[], figure: (item: T) => number | undefined) {
	let found: number | null = null;
	let least = Infinity;
	list.forEach((item, i) => {
		const value = figure(item);
		if (value !== undefined && value < least) [found, least] = [i, value];
	});
	return found as number | null;
}
