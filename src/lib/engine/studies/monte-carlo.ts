/**
 * Propagation of distributions by Monte Carlo (JCGM 101, clause 7), seeded: the same seed gives the same
 * figures everywhere. A run goes on as many samples at a time as its caller likes, so that progress can be
 * shown and the run left; what it came to so far can be read at any time.
 *
 * A sample that the model refuses is counted with its reason, and stands in no statistic of the outputs.
 */
import { histogram, meanAndDeviation, quantile7, type Histogram } from '../numerics/sample';
import { Refused, type RefusalCode } from '../methods/refused';
import { comovement, type Regression } from './comovement';
import type { Correlation } from './correlation';
import { sampler, type UncertainGiven } from './draws';
import type { Model } from './model';
import { momentsOf } from './moments';

export type MonteCarloPlan = {
	givens: readonly UncertainGiven[];
	correlations: readonly Correlation[];
	model: Model;
	outputs: number;
	/** Whether each check holds for a sample. */
	checks: readonly ((x: Float64Array, y: Float64Array) => boolean)[];
	samples: number;
	/** A whole number from 0. */
	seed: number;
};

export type OutputStatistics = {
	mean: number;
	/** Standard uncertainty: standard deviation of the sample (n − 1). */
	u: number;
	/** Standard error of the mean, u/√n. */
	meanError: number;
	least: number;
	p5: number;
	p50: number;
	p95: number;
	greatest: number;
	regression: Regression;
};

/** A sample that is refused does not hold. */
export type CheckStatistics = { held: number; probability: number; standardError: number };

/** Refusals of one kind, with the first one's words. */
export type RefusedSamples = {
	code: RefusalCode;
	count: number;
	/** Number of the first sample, from 0. */
	first: number;
	message: string;
};

export type MonteCarloRun = {
	/** How many samples are drawn so far. */
	readonly drawn: number;
	/** Draws so many more, up to the plan's number. */
	run: (samples: number) => void;
	/** Those with a result, of the samples drawn. */
	readonly resulted: number;
	readonly refused: readonly RefusedSamples[];
	/** @throws Refused where fewer samples have a result than a regression on the givens takes. */
	statistics: (output: number) => OutputStatistics;
	histogram: (output: number, bins: number) => Histogram;
	check: (check: number) => CheckStatistics;
	/** The linear correlation of two givens as drawn. */
	drawnCorrelation: (first: number, second: number) => number;
};

/** @throws Refused where a distribution or the correlations cannot be. */
export function startMonteCarlo(plan: MonteCarloPlan): MonteCarloRun {
	const { givens, correlations, model, checks, samples } = plan;
	const draw = sampler(givens, correlations, plan.seed);
	const x = new Float64Array(givens.length);
	const y = new Float64Array(plan.outputs);
	const figures = Array.from(y, () => new Float64Array(samples));
	const sorted: (Float64Array | undefined)[] = [];
	const held = new Float64Array(checks.length);
	const refusals = new Map<RefusalCode, RefusedSamples>();
	const moved = comovement(
		givens.map(({ name, distribution }) => momentsOf(name, distribution)),
		plan.outputs
	);
	let drawn = 0;
	let resulted = 0;

	function one(sample: number): void {
		draw(sample, x);
		try {
			model(x, y);
			for (let k = 0; k < y.length; k += 1)
				if (!Number.isFinite(y[k]!))
					throw new Refused('An output did not come to a number.', { code: 'not-converged' });
		} catch (error) {
			if (!(error instanceof Refused)) throw error;
			const { code, message } = error;
			const known = refusals.get(code);
			if (known) known.count += 1;
			else refusals.set(code, { code, count: 1, first: sample, message });
			return;
		}
		for (let k = 0; k < y.length; k += 1) figures[k]![resulted] = y[k]!;
		for (let c = 0; c < checks.length; c += 1) if (checks[c]!(x, y)) held[c]! += 1;
		moved.add(x, y);
		resulted += 1;
	}

	function ascending(output: number): Float64Array {
		const least = givens.length + 2;
		if (resulted < least) {
			const [first] = refusals.values();
			throw new Refused(
				`Only ${resulted} of ${drawn} samples came to a result; at least ${least} are needed. ${first?.message ?? ''}`.trim()
			);
		}
		return (sorted[output] ??= figures[output]!.slice(0, resulted).sort());
	}

	return {
		get drawn() {
			return drawn;
		},
		get resulted() {
			return resulted;
		},
		get refused() {
			return [...refusals.values()];
		},
		run(more) {
			sorted.length = 0;
			for (const end = Math.min(samples, drawn + more); drawn < end; drawn += 1) one(drawn);
		},
		statistics(output) {
			const figures = ascending(output);
			const { mean, s } = meanAndDeviation(figures);
			return {
				mean,
				u: s,
				meanError: s / Math.sqrt(figures.length),
				least: figures[0]!,
				p5: quantile7(figures, 0.05),
				p50: quantile7(figures, 0.5),
				p95: quantile7(figures, 0.95),
				greatest: figures.at(-1)!,
				regression: moved.regression(
					output,
					correlations.map(({ first, second }) => [first, second])
				)
			};
		},
		histogram: (output, bins) => histogram(ascending(output), bins),
		check(check) {
			const probability = held[check]! / drawn;
			return {
				held: held[check]!,
				probability,
				standardError: Math.sqrt((probability * (1 - probability)) / drawn)
			};
		},
		drawnCorrelation: moved.correlation
	};
}
