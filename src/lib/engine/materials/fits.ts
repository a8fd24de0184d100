/**
 * How well a distribution fits coupon results: the Anderson–Darling statistic, its small-sample form and the
 * observed significance level of the handbooks (CMH-17; common practice).
 */
import { normalProbability } from '../numerics/normal';
import { summarise } from './sample';
import { fitWeibull } from './weibull';

export type Fit = {
	/** A², from the parameters that the sample itself gives. */
	statistic: number;
	/** A*, corrected for the size of the sample. */
	corrected: number;
	/** Observed significance level; the distribution is rejected where it is 0.05 or less. */
	significance: number;
	/** Mean and standard deviation (of the logarithms for the lognormal), or scale and shape. */
	parameters: [number, number];
};

/** The small-sample form 1 + 4/n − 25/n² is below zero for three. */
export const FEWEST_FITTED = 4;

/** F(x) and 1 − F(x), each with its digits. */
type Both = (x: number) => [below: number, above: number];

function andersonDarling(values: readonly number[], both: Both): number {
	const n = values.length;
	const sorted = [...values].sort((a, b) => a - b).map(both);
	let sum = 0;
	for (let i = 0; i < n; i += 1)
		sum += (2 * i + 1) * (Math.log(sorted[i]![0]) + Math.log(sorted[n - 1 - i]![1]));
	return -n - sum / n;
}

function fitNormalTo(values: readonly number[]): Fit {
	const { n, mean, deviation } = summarise(values);
	const statistic = andersonDarling(values, (x) => {
		const z = (x - mean) / deviation;
		return [normalProbability(z), normalProbability(-z)];
	});
	const corrected = statistic * (1 + 4 / n - 25 / (n * n));
	const significance = 1 / (1 + Math.exp(-0.48 + 0.78 * Math.log(corrected) + 4.58 * corrected));
	return { statistic, corrected, significance, parameters: [mean, deviation] };
}

export const fitNormal = fitNormalTo;

export const fitLognormal = (values: readonly number[]): Fit => fitNormalTo(values.map(Math.log));

export function testWeibull(values: readonly number[]): Fit {
	const { scale, shape } = fitWeibull(values);
	const statistic = andersonDarling(values, (x) => {
		const power = Math.exp(shape * Math.log(x / scale));
		return [-Math.expm1(-power), Math.exp(-power)];
	});
	const corrected = statistic * (1 + 0.2 / Math.sqrt(values.length));
	const significance = 1 / (1 + Math.exp(-0.1 + 1.24 * Math.log(corrected) + 4.48 * corrected));
	return { statistic, corrected, significance, parameters: [scale, shape] };
}
