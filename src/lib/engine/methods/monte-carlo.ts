/** Monte Carlo on another method: the distributions of its outputs for uncertain inputs. */
import { PURE } from '../quantities/dimension';
import { startMonteCarlo, type MonteCarloRun } from '../studies/monte-carlo';
import { defineMethod } from './method';
import { group, integer, list, quantity, text } from './parameter';
import { refuseInput } from './refused';
import { modelOf, outputNames, studyInputs, subjectOf, type Studied } from './study';
import { checks, holds, outputsChecked } from './study-checks';
import { uncertainInputs, uncertainOf, type Uncertain } from './uncertain';
import { outputPath } from './value-path';

const figure = (label: string, symbol?: string) =>
	quantity({ label, ...(symbol && { symbol }), dimension: null, unit: '' });
const share = (label: string) => quantity({ label, dimension: PURE, unit: '%' });
const named = (label: string) => text({ label, longest: 200 });

/** Samples times figures kept, 40 MB. */
const MOST_KEPT = 5e6;

export const monteCarlo = (methods: Studied) =>
	defineMethod({
		name: 'monte-carlo',
		title: 'Monte Carlo on a method',
		summary:
			'Draws the uncertain inputs of another method again and again and tells how its outputs are distributed, how likely checks hold, and which input the spread comes from. The same seed gives the same figures.',
		subject: 'studies',
		inputs: {
			...studyInputs,
			...uncertainInputs,
			outputs: outputNames,
			checks,
			samples: integer({
				label: 'samples',
				symbol: 'n',
				range: { least: 100, most: 1_000_000 },
				default: 10_000
			}),
			seed: integer({ label: 'seed', range: { least: 0 }, default: 1 }),
			bins: integer({
				label: 'bins of the histograms',
				range: { least: 1, most: 500 },
				default: 40
			})
		},
		outputs: {
			resulted: integer({ label: 'samples with a result' }),
			outputs: list({
				label: 'outputs',
				fewest: 1,
				most: 20,
				of: group({
					label: 'output',
					fields: {
						path: named('output'),
						mean: figure('mean'),
						u: figure('standard uncertainty, the standard deviation of the sample', 'u'),
						meanError: figure('standard error of the mean'),
						least: figure('least'),
						p5: figure('5 % quantile', 'P5'),
						p50: figure('median', 'P50'),
						p95: figure('95 % quantile', 'P95'),
						greatest: figure('greatest'),
						shares: list({
							label: 'shares of the variance, by linear regression on the inputs',
							fewest: 1,
							most: 50,
							of: group({
								label: 'share',
								fields: { path: named('input'), share: share('share of its own') }
							})
						}),
						covariances: list({
							label: 'shares of the covariances; may be negative',
							fewest: 0,
							most: 1225,
							of: group({
								label: 'share',
								fields: {
									first: named('one input'),
									second: named('the other'),
									share: share('share')
								}
							})
						}),
						rest: share('what is not linear in the inputs, and chance: 100 % less all shares'),
						histogram: group({
							label: 'histogram',
							fields: {
								edges: list({ label: 'edges', fewest: 2, most: 501, of: figure('edge') }),
								counts: list({
									label: 'counts',
									fewest: 1,
									most: 500,
									of: integer({ label: 'samples' })
								})
							}
						})
					}
				})
			}),
			checks: list({
				label: 'checks, in their order',
				fewest: 0,
				most: 20,
				of: group({
					label: 'check',
					fields: {
						held: integer({ label: 'samples in which it holds' }),
						probability: share('probability that it holds'),
						standardError: share('standard error of that')
					}
				})
			}),
			correlations: list({
				label: 'correlations',
				fewest: 0,
				most: 1225,
				of: group({
					label: 'correlation',
					fields: {
						first: named('one input'),
						second: named('the other'),
						asked: quantity({ label: 'between the normal scores', dimension: PURE, unit: '' }),
						drawn: quantity({ label: 'linear, as drawn', dimension: PURE, unit: '' })
					}
				})
			}),
			refused: list({
				label: 'samples without a result, by kind',
				fewest: 0,
				most: 4,
				of: group({
					label: 'kind',
					fields: {
						code: text({ label: 'kind of refusal', longest: 40 }),
						count: integer({ label: 'samples' }),
						first: integer({ label: 'number of the first, from 0' }),
						message: text({ label: 'why, for the first', longest: 2000 })
					}
				})
			})
		},
		sources: [
			'JCGM 101:2008, propagation of distributions by a Monte Carlo method',
			'Philox 4×32-10: J. K. Salmon and others, SC’11',
			'Quantiles of type 7: R. J. Hyndman and Y. Fan, Am. Stat. 50 (1996) 361'
		],
		validity:
			'As good as the distributions given and the method itself. Figures carry chance: the mean by its standard error, a probability by its own. The same seed gives the same figures to 12 digits.',
		leftOut: [
			'dependence other than a Gaussian copula',
			'the error of the method itself',
			'samples without a result stand in no statistic of the outputs; in a check they do not hold'
		],
		refuses: [
			'a method or path that is not there',
			'correlations that cannot hold together',
			'bounds that leave nothing of a distribution',
			'a study in which hardly a sample has a result',
			'samples times figures above 5 million'
		],
		caution:
			'A probability from here is not a probability of failure for use: it knows only the uncertainties that were given.',
		run({ outputs: paths, checks = [], samples, seed, bins, ...about }) {
			const subject = subjectOf(methods, about);
			const uncertain = uncertainOf(subject, about.uncertain, about.correlations);
			const watched = new Map([
				...outputsChecked(checks),
				...paths.map((path, i) => [path, `outputs.${i}`] as const)
			]);
			if (samples * watched.size > MOST_KEPT)
				refuseInput('samples', `${samples} samples of ${watched.size} figures are too many.`);
			const place = new Map([...watched.keys()].map((path, i) => [path, i]));
			const study = startMonteCarlo({
				givens: uncertain.givens,
				correlations: uncertain.correlations,
				model: modelOf(
					subject,
					uncertain.inputs,
					[...watched].map(([path, at]) => outputPath(subject.method.outputs, path, at))
				),
				outputs: watched.size,
				checks: checks.map((check, i) => holds(check, i, { subject, uncertain, place })),
				samples,
				seed
			});
			study.run(samples);
			return {
				outputs: {
					resulted: study.resulted,
					outputs: paths.map((path) => outputOf(path, place.get(path)!, study, uncertain, bins)),
					checks: checks.map((_, i) => study.check(i)),
					correlations: uncertain.correlations.map(({ first, second, r }) => ({
						first: uncertain.givens[first]!.name,
						second: uncertain.givens[second]!.name,
						asked: r,
						drawn: study.drawnCorrelation(first, second)
					})),
					refused: [...study.refused]
				},
				warnings: warningsOf(study, checks.length)
			};
		}
	});

function outputOf(
	path: string,
	k: number,
	study: MonteCarloRun,
	uncertain: Uncertain,
	bins: number
) {
	const { regression, ...statistics } = study.statistics(k);
	const name = (i: number) => uncertain.givens[i]!.name;
	return {
		path,
		...statistics,
		shares: regression.shares.map((share, i) => ({ path: name(i), share })),
		covariances: regression.covariances.map((share, i) => {
			const { first, second } = uncertain.correlations[i]!;
			return { first: name(first), second: name(second), share };
		}),
		rest: regression.rest,
		histogram: study.histogram(k, bins)
	};
}

function warningsOf(study: MonteCarloRun, checks: number): string[] {
	const { drawn, resulted } = study;
	const without = drawn - resulted;
	const warnings =
		without === 0
			? []
			: [
					`${without} of ${drawn} samples have no result and stand in no statistic: the figures hold for the others only.`
				];
	const alike = Array.from({ length: checks }, (_, i) => study.check(i).probability);
	if (alike.includes(1) || alike.includes(0))
		// (1 − p)ⁿ = 0.05
		warnings.push(
			`Where all samples agree the other outcome is not excluded: at 95 % confidence its probability is below ${(1 - 0.05 ** (1 / drawn)).toPrecision(2)}.`
		);
	return warnings;
}
