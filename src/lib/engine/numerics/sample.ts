/** What is told of a sample of figures: mean, standard deviation, quantiles, histogram. */

/**
 * Mean and standard deviation (n − 1) of at least two figures, in two passes: the deviations are taken from
 * the mean, and by their largest, so that neither a large mean nor large figures cost digits.
 */
export function meanAndDeviation(figures: Float64Array): { mean: number; s: number } {
	const n = figures.length;
	let rough = 0;
	for (let i = 0; i < n; i += 1) rough += figures[i]! / n;
	let rest = 0;
	for (let i = 0; i < n; i += 1) rest += (figures[i]! - rough) / n;
	const mean = rough + rest;
	let largest = 0;
	for (let i = 0; i < n; i += 1) largest = Math.max(largest, Math.abs(figures[i]! - mean));
	if (largest === 0) return { mean, s: 0 };
	let squares = 0;
	for (let i = 0; i < n; i += 1) squares += ((figures[i]! - mean) / largest) ** 2;
	return { mean, s: largest * Math.sqrt(squares / (n - 1)) };
}

/**
 * The quantile at probability p of ascending figures by linear interpolation between order statistics:
 * type 7 of Hyndman and Fan (Am. Stat. 50 (1996) 361), h = (n − 1) p.
 */
export function quantile7(ascending: ArrayLike<number>, p: number): number {
	const last = ascending.length - 1;
	const h = last * p;
	const low = Math.min(Math.floor(h), last);
	const start = ascending[low]!;
	return start + (h - low) * (ascending[Math.min(low + 1, last)]! - start);
}

export type Histogram = {
	/** One more than there are bins. */
	edges: number[];
	counts: number[];
};

/** Bins of equal width from the least to the greatest of ascending figures; one bin where all are equal. */
export function histogram(ascending: ArrayLike<number>, bins: number): Histogram {
	const least = ascending[0]!;
	const greatest = ascending[ascending.length - 1]!;
	const width = (greatest - least) / bins;
	if (!(width > 0)) return { edges: [least, greatest], counts: [ascending.length] };
	const counts = new Array<number>(bins).fill(0);
	for (let i = 0; i < ascending.length; i += 1) {
		const bin = Math.floor((ascending[i]! - least) / width);
		counts[Math.min(bin, bins - 1)]! += 1;
	}
	const edges = counts.map((_, i) => least + i * width);
	return { edges: [...edges, greatest], counts };
}
