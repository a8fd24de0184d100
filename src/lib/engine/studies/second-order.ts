/**
 * Second-order terms of the law of propagation for independent givens (JCGM 100, 5.1.2 note):
 * Σ_i Σ_j [½ f_ij² + f_i f_ijj] u_i² u_j², and the shift of the mean ½ Σ f_ii u_i². The terms with i = j hold
 * for normal givens.
 *
 * Derivatives by central differences with a quarter of u (or a thousandth of the value where that is more) and half
 * of that, extrapolated: to about six digits.
 */
import type { Model } from './model';
import type { Estimate } from './slopes';

export type SecondOrder = {
	/** What they add to the variance; may be negative. */
	variance: Float64Array;
	meanShift: Float64Array;
};

/** Of every output, from its slopes. @throws Refused where the model refuses near the estimates. */
export function secondOrderTerms(
	model: Model,
	givens: readonly Estimate[],
	slopes: readonly Float64Array[],
	outputs: number
): SecondOrder {
	const coarse = differences(model, givens, outputs, 1);
	const fine = differences(model, givens, outputs, 0.5);
	const variance = new Float64Array(outputs);
	const meanShift = new Float64Array(outputs);
	const n = givens.length;
	for (let i = 0; i < n; i += 1) {
		for (let j = 0; j < n; j += 1) {
			const [a, b] = [coarse[i * n + j]!, fine[i * n + j]!];
			for (let k = 0; k < outputs; k += 1) {
				const mixed = (4 * b.mixed[k]! - a.mixed[k]!) / 3;
				const third = (4 * b.third[k]! - a.third[k]!) / 3;
				variance[k]! += mixed ** 2 / 2 + slopes[i]![k]! * givens[i]!.u * third;
				if (i === j) meanShift[k]! += mixed / 2;
			}
		}
	}
	return { variance, meanShift };
}

/** f_ij u_i u_j and f_ijj u_i u_j² of each output. */
type Differences = { mixed: Float64Array; third: Float64Array };

/** For every pair of givens, row by row. */
function differences(
	model: Model,
	givens: readonly Estimate[],
	outputs: number,
	share: number
): Differences[] {
	const steps = givens.map(({ value, u }) => share * Math.max(u / 4, 1e-3 * Math.abs(value)));
	const scale = givens.map(({ u }, i) => u / steps[i]!);
	const x = Float64Array.from(givens, ({ value }) => value);
	/** The outputs some steps away along one given, or two. */
	const at = (i: number, along: number, j = i, across = 0) => {
		const y = new Float64Array(outputs);
		const [xi, xj] = [x[i]!, x[j]!];
		x[i]! += along * steps[i]!;
		x[j]! += across * steps[j]!;
		try {
			model(x, y);
		} finally {
			x[i] = xi;
			x[j] = xj;
		}
		return y;
	};
	const centre = at(0, 0);
	const ahead = givens.map((_, i) => at(i, 1));
	const behind = givens.map((_, i) => at(i, -1));

	const alone = (i: number): Differences => {
		const [two, minusTwo] = [at(i, 2), at(i, -2)];
		const s = scale[i]!;
		const [one, minusOne] = [ahead[i]!, behind[i]!];
		return {
			mixed: centre.map((y, k) => (one[k]! - 2 * y + minusOne[k]!) * s ** 2),
			third: centre.map(
				(_, k) => ((two[k]! - 2 * one[k]! + 2 * minusOne[k]! - minusTwo[k]!) / 2) * s ** 3
			)
		};
	};
	const together = (i: number, j: number): Differences => {
		const [pp, pm] = [at(i, 1, j, 1), at(i, 1, j, -1)];
		const [mp, mm] = [at(i, -1, j, 1), at(i, -1, j, -1)];
		const [si, sj] = [scale[i]!, scale[j]!];
		const bend = (k: number, up: Float64Array, along: Float64Array, down: Float64Array) =>
			up[k]! - 2 * along[k]! + down[k]!;
		return {
			mixed: centre.map((_, k) => ((pp[k]! - pm[k]! - mp[k]! + mm[k]!) / 4) * si * sj),
			third: centre.map(
				(_, k) => ((bend(k, pp, ahead[i]!, pm) - bend(k, mp, behind[i]!, mm)) / 2) * si * sj ** 2
			)
		};
	};
	return givens.flatMap((_, i) => givens.map((_, j) => (i === j ? alone(i) : together(i, j))));
}
