/**
 * Correlations between givens. They are held between the normal scores of the givens (a Gaussian copula):
 * for normal givens that is the linear correlation itself, for others the linear correlation of what is
 * drawn is somewhat nearer to zero, for two uniform ones (6/π) asin(r/2).
 */
import { Refused } from '../methods/refused';

export type Correlation = {
	/** Of two givens, by their place. */
	first: number;
	second: number;
	/** −1 to 1 */
	r: number;
};

/** Square, row by row. */
export type Matrix = Float64Array[];

/** @throws Refused where a pair is named twice, or a given with itself. */
export function correlationMatrix(names: readonly string[], pairs: readonly Correlation[]): Matrix {
	const matrix = names.map((_, i) => Float64Array.from(names, (_, j) => (i === j ? 1 : 0)));
	const seen = new Set<string>();
	for (const { first, second, r } of pairs) {
		if (first === second)
			throw new Refused(`${names[first]} is correlated with itself wholly; leave that out.`);
		const pair = `${Math.min(first, second)} ${Math.max(first, second)}`;
		if (seen.has(pair))
			throw new Refused(`The correlation of ${names[first]} and ${names[second]} is given twice.`);
		seen.add(pair);
		matrix[first]![second] = r;
		matrix[second]![first] = r;
	}
	return matrix;
}

/**
 * Lower triangle L with L Lᵀ = the matrix, which turns independent scores into correlated ones.
 * @throws Refused where no givens can be correlated so: a matrix that is not positive semi-definite.
 */
export function scoresFactor(names: readonly string[], matrix: Matrix): Matrix {
	const { factor, failed } = cholesky(matrix, 1);
	if (failed < 0) return factor;
	const related = names.slice(0, failed).filter((_, j) => matrix[failed]![j] !== 0);
	throw new Refused(
		`These correlations cannot hold together: that of ${names[failed]} with ${related.join(', ')} ` +
			'contradicts those between the others (the matrix is not positive semi-definite).',
		{
			remedy: `They can when each is multiplied by ${reachable(matrix)} or less; or look for a wrong sign.`
		}
	);
}

/** A pivot may be zero: a given may follow wholly from others. */
const ROUNDING = 1e-12;

/** Of the matrix with all correlations multiplied by `share`; `failed` is the first given that does not fit, or −1. */
function cholesky(matrix: Matrix, share: number): { factor: Matrix; failed: number } {
	const factor = matrix.map(({ length }) => new Float64Array(length));
	for (let i = 0; i < matrix.length; i += 1) {
		for (let j = 0; j <= i; j += 1) {
			let rest = i === j ? 1 : share * matrix[i]![j]!;
			for (let k = 0; k < j; k += 1) rest -= factor[i]![k]! * factor[j]![k]!;
			if (i === j) {
				if (rest < -ROUNDING) return { factor, failed: i };
				factor[i]![i] = rest > ROUNDING ? Math.sqrt(rest) : 0;
			} else if (factor[j]![j]! > 0) factor[i]![j] = rest / factor[j]![j]!;
			else if (Math.abs(rest) > Math.sqrt(ROUNDING)) return { factor, failed: i };
		}
	}
	return { factor, failed: -1 };
}

/** The share of all correlations that can hold together, in hundredths, rounded down. */
function reachable(matrix: Matrix): number {
	let share = 99;
	while (share > 0 && cholesky(matrix, share / 100).failed >= 0) share -= 1;
	return share / 100;
}
