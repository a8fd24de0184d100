/**
 * Slopes of a function that is known by its values only: central differences at steps halved twice,
 * extrapolated to step 0 (Richardson; W. H. Press et al., Numerical Recipes, 3rd ed., 5.7), in the
 * logarithm of a figure that is positive, where a taper over many decades is nearly straight. The step
 * is made shorter until two extrapolations agree to 1e-9, as it must near an end of the domain.
 *
 * Told to nine digits: the differences magnify the last bit, in which platforms differ.
 */

/** At x; null where the function refuses x. Null for a figure that it does not have there. */
export type Figures = (x: number) => readonly (number | null)[] | null;

const FIRST_STEP = 1 / 64;
const SHORTEST = 1e-7;
const AGREED = 1e-9;
const DIGITS = 9;
/** A change of the whole argument that changes a figure by so small a share is none: it is rounding. */
const NOTHING = 1e-9;

/** The slope of each figure at x, NaN where none is found. */
export function slopesOf(figures: Figures, x: number): number[] {
	const at = figures(x) ?? [];
	const best = at.map(() => ({ slope: NaN, doubt: Infinity }));
	const scale = Math.abs(x) || 1;
	for (let step = FIRST_STEP; step > SHORTEST; step /= 8) {
		const found = extrapolated(figures, x, at, step * scale);
		found?.forEach((estimate, i) => {
			if (estimate.doubt < best[i]!.doubt) best[i] = estimate;
		});
		if (best.every(({ doubt }, i) => doubt <= AGREED || at[i] === null)) break;
	}
	return best.map(({ slope }) => Number(slope.toPrecision(DIGITS)));
}

type Estimate = {
	slope: number;
	/** How far two extrapolations differ, as a share. */ doubt: number;
};

function extrapolated(
	figures: Figures,
	x: number,
	at: readonly (number | null)[],
	step: number
): Estimate[] | null {
	const sides = [step, step / 2, step / 4].map((h) => {
		// What is added is what the two points lie apart, rounding included.
		const [above, below] = [x + h, x - h];
		return { above: figures(above), below: figures(below), apart: above - below };
	});
	if (sides.some(({ above, below }) => !above || !below)) return null;
	return at.map((middle, i) => {
		const ends = sides.map(({ above, below }) => [above![i] ?? null, below![i] ?? null] as const);
		const known = ends.flat();
		if (middle === null || known.includes(null)) return { slope: NaN, doubt: Infinity };
		const inLog = middle > 0 && known.every((figure) => figure! > 0);
		const scaled = (figure: number) => (inLog ? Math.log(figure / middle) : figure);
		const [one, two, three] = ends.map(
			([above, below], k) => (scaled(above!) - scaled(below!)) / sides[k]!.apart
		) as [number, number, number];
		const [coarse, fine] = [two + (two - one) / 3, three + (three - two) / 3];
		const slope = fine + (fine - coarse) / 15;
		if (inLog && Math.abs(slope) * (Math.abs(x) || 1) < NOTHING) return { slope: 0, doubt: 0 };
		const doubt = slope === 0 ? 0 : Math.abs((slope - fine) / slope);
		return { slope: inLog ? slope * middle : slope, doubt };
	});
}
