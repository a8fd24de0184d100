/**
 * The tension along a line whose length is fixed: T(r_t) = −m_c g(r_t) at the top, and downwards dT/dr = ρ A g,
 * with a step m g at each point mass. Straight line at rest in the co-rotating frame.
 */
import { topOf, type Line } from './line';
import type { Piece } from './piece';

/** Part of a piece with no point mass inside, on one side of the balance radius; so T is monotonic in it. */
export type Stretch = {
	/** m */
	from: number;
	/** m */
	to: number;
	piece: Piece;
	/** T just above `from`, N. */
	lower: number;
	/** T just below `to`, N. */
	upper: number;
	/** A just above `from`, m². */
	lowerArea: number;
	/** A just below `to`, m². */
	upperArea: number;
};

export type Hanging = {
	/** From the anchor to the top without a gap. */
	stretches: Stretch[];
	/** T₀, N: below a mass that sits at the anchor. */
	anchorTension: number;
};

/** @param cuts further radii, m, at which a stretch is to end */
export function hang(line: Line, cuts: readonly number[] = []): Hanging {
	const { field, density, pieces, masses, counterweight } = line;
	const radii = edgesOf(line, cuts);
	const stretches = new Array<Stretch>(radii.length - 1);
	let tension = -counterweight * field.g(topOf(line));
	let mass = masses.length - 1;
	let part = pieces.length - 1;
	for (let i = radii.length - 1; i >= 0; i -= 1) {
		const to = radii[i]!;
		for (; mass >= 0 && masses[mass]!.radius >= to; mass -= 1)
			tension -= masses[mass]!.mass * field.g(to);
		if (i === 0) break;
		while (pieces[part]!.from >= to) part -= 1;
		const piece = pieces[part]!;
		const from = radii[i - 1]!;
		const lower = tension - density * piece.weight(from, to);
		stretches[i - 1] = {
			from,
			to,
			piece,
			lower,
			upper: tension,
			lowerArea: piece.area(from),
			upperArea: piece.area(to)
		};
		tension = lower;
	}
	return { stretches, anchorTension: tension };
}

/** T(r), N, inside a stretch of the line. */
export const tensionAt = ({ density }: Line, { piece, to, upper }: Stretch, r: number): number =>
	upper - density * piece.weight(r, to);

/** Where something may jump or turn, upwards, each once. */
function edgesOf(line: Line, cuts: readonly number[]): number[] {
	const [bottom, top] = [line.pieces[0]!.from, topOf(line)];
	const inside = [line.field.balance, ...cuts].filter((r) => r > bottom && r < top);
	const radii = Float64Array.from([
		bottom,
		...line.pieces.map(({ to }) => to),
		...line.masses.map(({ radius }) => radius),
		...inside
	]).sort();
	return [...radii.filter((r, i) => i === 0 || r !== radii[i - 1])];
}
