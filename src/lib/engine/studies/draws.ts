/** The givens of one sample: draws that follow from the seed and the sample's number alone. */
import { normalQuantile } from '../numerics/normal';
import { uniformDraws } from '../numerics/philox';
import { correlationMatrix, scoresFactor, type Correlation } from './correlation';
import { drawFrom, type Distribution } from './distribution';

export type UncertainGiven = { name: string; distribution: Distribution };

/**
 * Writes the givens of a sample to x. The same seed and sample give the same givens to the last digits of
 * exp and log, in which platforms differ.
 * @throws Refused where a distribution or the correlations cannot be.
 */
export function sampler(
	givens: readonly UncertainGiven[],
	correlations: readonly Correlation[],
	seed: number
): (sample: number, x: Float64Array) => void {
	const names = givens.map(({ name }) => name);
	const draws = givens.map(({ name, distribution }) => drawFrom(name, distribution));
	const factor = scoresFactor(names, correlationMatrix(names, correlations));
	const correlated = givens.map((_, i) =>
		correlations.some(({ first, second }) => first === i || second === i)
	);
	const probabilities = new Float64Array(givens.length);
	const scores = new Float64Array(givens.length);
	return (sample, x) => {
		uniformDraws(seed, sample, probabilities);
		for (let i = 0; i < draws.length; i += 1) {
			if (!correlated[i]) {
				x[i] = draws[i]!.ofProbability(probabilities[i]!);
				continue;
			}
			scores[i] = normalQuantile(probabilities[i]!);
			let score = 0;
			for (let j = 0; j <= i; j += 1) score += factor[i]![j]! * scores[j]!;
			x[i] = draws[i]!.ofScore(score);
		}
	};
}
