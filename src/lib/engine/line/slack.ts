/** Where a line would have to push: T < 0. */
import { root } from '../numerics/root';
import type { Line } from './line';
import { tensionAt, type Hanging } from './tension';

/** What counts as rounding, as a fraction of the greatest tension. */
const ROUNDING = 1e-13;

export type Interval = { from: number; to: number };

/** The radii between which the line is slack, upwards. Less than 1e-13 of the greatest tension is rounding. */
export function slackIn(line: Line, { stretches }: Hanging, greatestTension: number): Interval[] {
	const least = -ROUNDING * Math.max(0, greatestTension);
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
	return found;
}
