/** Where a line would have to push: T < 0. */
import { root } from '../numerics/root';
import type { Line } from './line';
import { tensionAt, type Hanging } from './tension';

/** The tension, N, below which a line counts as slack: less than 1e-13 of the greatest is rounding. */
export const slackBelow = (greatestTension: number) => -1e-13 * Math.max(0, greatestTension);

export type Interval = { from: number; to: number };

/**
 * The radii between which the line is slack, upwards. Where only the anchor would have to push, under a mass that sits
 * there, both are its radius.
 */
export function slackIn(
	line: Line,
	{ stretches, anchorTension }: Hanging,
	greatestTension: number
): Interval[] {
	const least = slackBelow(greatestTension);
	const found: Interval[] = [];
	for (const stretch of stretches) {
		const { from, to, lower, upper } = stretch;
		if (!(Math.min(lower, upper) < least)) continue;
		// T is monotonic inside a stretch.
		const turn = lower * upper < 0 ? root((r) => tensionAt(line, stretch, r), from, to) : null;
		const part = {
			from: lower < 0 || turn === null ? from : turn,
			to: upper < 0 || turn === null ? to : turn
		};
		const last = found.at(-1);
		if (last && last.to === part.from) last.to = part.to;
		else found.push(part);
	}
	const bottom = stretches[0]!.from;
	if (anchorTension < least && found[0]?.from !== bottom)
		found.unshift({ from: bottom, to: bottom });
	return found;
}
