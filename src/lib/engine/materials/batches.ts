/**
 * Whether batches come from one population: the k-sample Anderson–Darling test with ties (F. W. Scholz and
 * M. A. Stephens, J. Am. Stat. Assoc. 82 (1987) 918, equations 6 and 7, standardised; table 1).
 */

export type BatchTest = {
	/** A²_akN less its mean k − 1, over its standard deviation. */
	statistic: number;
	/** At 2.5 %: above it the batches differ. */
	critical: number;
	differ: boolean;
};

/** b₀ + b₁/√m + b₂/m at 2.5 %, m = k − 1. */
const CRITICAL = [1.96, 1.149, -0.391] as const;

export function testBatches(batches: readonly (readonly number[])[]): BatchTest {
	const k = batches.length;
	const all = batches.flat().sort((a, b) => a - b);
	const total = all.length;
	const distinct = [...new Set(all)];
	let sum = 0;
	for (const batch of batches) {
		const sorted = [...batch].sort((a, b) => a - b);
		let inner = 0;
		for (const z of distinct) {
			const ties = count(all, z);
			const below = firstNotBelow(all, z) + ties / 2;
			const mine = firstNotBelow(sorted, z) + count(sorted, z) / 2;
			const width = below * (total - below) - (total * ties) / 4;
			if (width > 0) inner += (ties * (total * mine - below * batch.length) ** 2) / width;
		}
		sum += inner / batch.length;
	}
	const squared = (sum * (total - 1)) / (total * total);
	const statistic = (squared - (k - 1)) / Math.sqrt(variance(batches, total));
	const m = k - 1;
	const critical = CRITICAL[0] + CRITICAL[1] / Math.sqrt(m) + CRITICAL[2] / m;
	return { statistic, critical, differ: statistic > critical };
}

function variance(batches: readonly (readonly number[])[], total: number): number {
	const k = batches.length;
	const H = batches.reduce((sum, { length }) => sum + 1 / length, 0);
	let h = 0;
	for (let i = 1; i < total; i += 1) h += 1 / i;
	// g = Σ_i Σ_{j>i} 1/((N − i) j), by the sums of the inner one.
	let [g, tail] = [0, 0];
	for (let i = total - 2; i >= 1; i -= 1) {
		tail += 1 / (i + 1);
		g += tail / (total - i);
	}
	const a = (4 * g - 6) * (k - 1) + (10 - 6 * g) * H;
	const b = (2 * g - 4) * k * k + 8 * h * k + (2 * g - 14 * h - 4) * H - 8 * h + 4 * g - 6;
	const c = (6 * h + 2 * g - 2) * k * k + (4 * h - 4 * g + 6) * k + (2 * h - 6) * H + 4 * h;
	const d = (2 * h + 6) * k * k - 4 * h * k;
	return (((a * total + b) * total + c) * total + d) / ((total - 1) * (total - 2) * (total - 3));
}

/** Index of the first value not below z in a sorted list. */
function firstNotBelow(sorted: readonly number[], z: number): number {
	let [low, high] = [0, sorted.length];
	while (low < high) {
		const middle = (low + high) >> 1;
		if (sorted[middle]! < z) low = middle + 1;
		else high = middle;
	}
	return low;
}

function count(sorted: readonly number[], z: number): number {
	let n = 0;
	for (let i = firstNotBelow(sorted, z); sorted[i] === z; i += 1) n += 1;
	return n;
}
