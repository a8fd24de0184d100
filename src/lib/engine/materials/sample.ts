/** What a set of coupon results comes to: mean, spread, single results far from the rest. */
import { studentUpper } from '../numerics/gamma';
import { root } from '../numerics/root';
import { meanAndDeviation } from '../numerics/sample';

export type Summary = {
	n: number;
	mean: number;
	deviation: number;
	least: number;
	greatest: number;
};

export function summarise(values: readonly number[]): Summary {
	const { mean, s } = meanAndDeviation(Float64Array.from(values));
	return {
		n: values.length,
		mean,
		deviation: s,
		least: Math.min(...values),
		greatest: Math.max(...values)
	};
}

export type Residual = {
	/** Which of the values, from 0. */
	index: number;
	/** |x − x̄|/s */
	residual: number;
	/** Above it the value is an outlier at the level asked for. */
	critical: number;
};

/**
 * Outliers by the maximum normed residual: the farthest value is held against
 * C = (n − 1)/√n · √(t²/(n − 2 + t²)), t the upper α/(2n) point of Student's t with n − 2 degrees of freedom;
 * where it lies beyond, it is set aside and the rest is looked at again. They are told, not taken out.
 */
export function outliers(values: readonly number[], alpha = 0.05): Residual[] {
	const found: Residual[] = [];
	const left = new Set(values.keys());
	while (left.size >= 3) {
		const kept = [...left];
		const { n, mean, deviation } = summarise(kept.map((i) => values[i]!));
		if (!(deviation > 0)) break;
		const index = kept.reduce((far, i) =>
			Math.abs(values[i]! - mean) > Math.abs(values[far]! - mean) ? i : far
		);
		const residual = Math.abs(values[index]! - mean) / deviation;
		const critical = criticalResidual(n, alpha);
		if (residual <= critical) break;
		found.push({ index, residual, critical });
		left.delete(index);
	}
	return found;
}

export function criticalResidual(n: number, alpha: number): number {
	const level = alpha / (2 * n);
	let high = 1;
	while (studentUpper(high, n - 2) > level) high *= 2;
	const t = root((x) => studentUpper(x, n - 2) - level, 0, high);
	return ((n - 1) / Math.sqrt(n)) * Math.sqrt((t * t) / (n - 2 + t * t));
}
