/**
 * The greatest stress and the least tension of a line, also with climbers on it, whose pulls are added to the tension of
 * the line without them: it is hung once, however many positions are looked at.
 */
import type { Line, PointMass } from './line';
import { hang, tensionAt, type Hanging, type Stretch } from './tension';
import { innerPeak, turningRadii } from './turning';

export type Extremes = {
	/** Greatest stress, Pa; where no section is under tension −Infinity or below zero. */
	stress: number;
	/** Lowest radius, m, at which the margin is within 1e-9 of its least. */
	stressRadius: number;
	/** N */
	leastTension: number;
	/** Lowest radius of the least tension, m. */
	leastTensionRadius: number;
	/** N */
	greatestTension: number;
	/** T₀, N */
	anchorTension: number;
};

/** How near to the least a margin counts as the same. */
const SAME_MARGIN = 1e-9;

/** Hung so that the stress turns nowhere twice inside a stretch. */
export const hangForSurvey = (line: Line, cuts: readonly number[] = []): Hanging =>
	hang(line, [...turningRadii(line), ...cuts]);

/**
 * @param hanging of `hangForSurvey`
 * @param limitStress what the stress is held against, Pa; its margin is limitStress/σ − 1
 * @param climbers point masses besides those of the line, in any order
 */
export function survey(
	line: Line,
	{ stretches, anchorTension }: Hanging,
	limitStress: number,
	climbers: readonly PointMass[] = []
): Extremes {
	const { field } = line;
	const down = [...climbers].sort((a, b) => b.radius - a.radius);
	const found: Extremes = {
		stress: -Infinity,
		stressRadius: NaN,
		leastTension: Infinity,
		leastTensionRadius: NaN,
		greatestTension: -Infinity,
		anchorTension
	};
	const look = (r: number, area: number, tension: number) => {
		if (tension <= found.leastTension) {
			found.leastTension = tension;
			found.leastTensionRadius = r;
		}
		if (tension > found.greatestTension) found.greatestTension = tension;
		const stress = tension / area;
		if (stress > found.stress) found.stress = stress;
		// Downwards, so that the last that is as good as the greatest is the lowest.
		const same = found.stress / stress - 1 <= (SAME_MARGIN * found.stress) / limitStress;
		if (stress === found.stress || (stress > 0 && same)) found.stressRadius = r;
	};
	/** What the climbers above add to the tension, N. */
	let added = 0;
	const part = (stretch: Stretch, from: number, to: number) => {
		const { piece } = stretch;
		const inside = (r: number) => added + tensionAt(line, stretch, r);
		const [isTop, isBottom] = [to === stretch.to, from === stretch.from];
		const upper = isTop ? added + stretch.upper : inside(to);
		const lower = isBottom ? added + stretch.lower : inside(from);
		const upperArea = isTop ? stretch.upperArea : piece.area(to);
		const lowerArea = isBottom ? stretch.lowerArea : piece.area(from);
		look(to, upperArea, upper);
		// T and A are monotonic here: no stress inside is above this, so most stretches of a long table are passed by.
		const most = Math.max(lower, upper) / Math.min(lowerArea, upperArea);
		if (piece.slope && most > found.stress) {
			const peak = innerPeak(line, piece, [from, lower], [to, upper], inside);
			if (peak !== null) look(peak, piece.area(peak), inside(peak));
		}
		look(from, lowerArea, lower);
	};
	let next = 0;
	const passed = (r: number) => next < down.length && down[next]!.radius >= r;
	const take = () => (added -= down[next]!.mass * field.g(down[next++]!.radius));
	for (let i = stretches.length - 1; i >= 0; i -= 1) {
		const stretch = stretches[i]!;
		let to = stretch.to;
		while (passed(to)) take();
		while (next < down.length && down[next]!.radius > stretch.from) {
			const from = down[next]!.radius;
			part(stretch, from, to);
			to = from;
			while (passed(to)) take();
		}
		part(stretch, stretch.from, to);
	}
	while (next < down.length) take();
	found.anchorTension = anchorTension + added;
	if (found.anchorTension < found.leastTension) {
		found.leastTension = found.anchorTension;
		found.leastTensionRadius = stretches[0]!.from;
	}
	return found;
}
