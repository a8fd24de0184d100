/** Law of propagation on another method: standard uncertainties of its outputs, first order or second. */
import { PURE } from '../quantities/dimension';
import { correlationMatrix, scoresFactor } from '../studies/correlation';
import { outputCorrelation, propagate, type Propagated } from '../studies/propagation';
import { secondOrderTerms } from '../studies/second-order';
import { slopesOf, valuesAt } from '../studies/slopes';
import { defineMethod } from './method';
import { flag, group, list, quantity, text } from './parameter';
import { Refused, refuseInput } from './refused';
import { modelOf, outputNames, outputsNamed, studyInputs, subjectOf, type Studied } from './study';
import { uncertainInputs, uncertainOf, type Uncertain } from './uncertain';

const figure = (label: string, symbol?: string) =>
	quantity({ label, ...(symbol && { symbol }), dimension: null, unit: '' });
const share = (label: string) => quantity({ label, dimension: PURE, unit: '%' });
const named = (label: string) => text({ label, longest: 200 });

export const firstOrder = (methods: Studied) =>
	defineMethod({
		name: 'first-order',
		title: 'Law of propagation on a method',
		summary:
			'Standard uncertainties of another method’s outputs from those of its inputs, with what each input contributes and how the outputs are correlated; with second-order terms where asked for.',
		subject: 'studies',
		inputs: {
			...studyInputs,
			...uncertainInputs,
			outputs: outputNames,
			secondOrder: flag({
				label: 'with second-order terms',
				default: false,
				help: 'For independent inputs. Costs four evaluations for every pair of inputs, twice.'
			})
		},
		outputs: {
			outputs: list({
				label: 'outputs',
				fewest: 1,
				most: 20,
				of: group({
					label: 'output',
					fields: {
						path: named('output'),
						value: figure('at the means of the inputs'),
						u: figure('standard uncertainty', 'u'),
						uFirstOrder: figure('standard uncertainty, first order'),
						meanShift: {
							...figure('shift of the mean by the curvature'),
							optional: true,
							help: '½ Σ f_ii u_i²; with second-order terms only.'
						},
						inputs: list({
							label: 'by input',
							fewest: 1,
							most: 50,
							of: group({
								label: 'input',
								fields: {
									path: named('input'),
									mean: figure('mean'),
									u: figure('standard uncertainty', 'u_i'),
									slope: figure('sensitivity', 'c_i'),
									contribution: figure('contribution', 'c_i u_i'),
									share: share('share of the first-order variance, of its own')
								}
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
						})
					}
				})
			}),
			correlations: list({
				label: 'correlations of the outputs, first order',
				fewest: 0,
				most: 190,
				of: group({
					label: 'correlation',
					fields: {
						first: named('one output'),
						second: named('the other'),
						r: quantity({ label: 'correlation', symbol: 'r', dimension: PURE, unit: '' })
					}
				})
			})
		},
		sources: [
			'JCGM 100:2008 (GUM), 5.1 and 5.2, second-order terms by the note to 5.1.2',
			'Slopes: C. J. F. Ridders, Adv. Eng. Software 4 (1982) 75'
		],
		validity:
			'Where the outputs are near to linear within the uncertainties of the inputs. Slopes are central differences extrapolated to a step of zero; the first step is u, or a thousandth of the value where that is more. Bounded distributions count with the mean and the standard deviation that the bounds leave.',
		leftOut: [
			'the shape of the output’s distribution: see Monte Carlo',
			'degrees of freedom and coverage factors',
			'skewness and excess of inputs that are not normal, in second-order terms'
		],
		refuses: [
			'a method or path that is not there',
			'correlations that cannot hold together',
			'second-order terms with correlated inputs',
			'means at the edge of what the method answers'
		],
		caution: '',
		run({ outputs: paths, secondOrder, ...about }) {
			const subject = subjectOf(methods, about);
			const uncertain = uncertainOf(subject, about.uncertain, about.correlations);
			const { reaches, correlations } = uncertain;
			if (secondOrder && correlations.some(({ r }) => r !== 0))
				refuseInput('secondOrder', 'Second-order terms are for independent inputs only.');
			const names = reaches.map(({ name }) => name);
			const r = correlationMatrix(names, correlations);
			scoresFactor(names, r);
			const model = modelOf(subject, uncertain.inputs, outputsNamed(subject, paths, 'outputs'));
			const values = valuesAt(model, reaches, paths.length);
			const slopes = slopesOf(model, reaches, paths.length);
			const u = Float64Array.from(reaches, (reach) => reach.u);
			const propagated = paths.map((_, k) =>
				propagate(
					slopes.map((row) => row[k]!),
					u,
					r
				)
			);
			const second = secondOrder
				? secondOrderTerms(model, reaches, slopes, paths.length)
				: undefined;
			return {
				outputs: {
					outputs: paths.map((path, k) => ({
						path,
						value: values[k]!,
						u: withTerms(path, propagated[k]!.u, second?.variance[k] ?? 0),
						uFirstOrder: propagated[k]!.u,
						meanShift: second?.meanShift[k],
						...rowsOf(
							propagated[k]!,
							slopes.map((row) => row[k]!),
							uncertain
						)
					})),
					correlations: paths.flatMap((first, i) =>
						paths.slice(i + 1).map((second, j) => ({
							first,
							second,
							r: outputCorrelation(propagated[i]!, propagated[i + 1 + j]!, r)
						}))
					)
				},
				warnings: []
			};
		}
	});

function withTerms(path: string, u: number, variance: number): number {
	const whole = u * u + variance;
	if (whole >= 0) return Math.sqrt(whole);
	throw new Refused(`The second-order terms of ${path} outweigh the first order.`, {
		remedy: 'The uncertainties are too large for a series: use Monte Carlo.'
	});
}

function rowsOf(
	{ contributions, shares, covariances }: Propagated,
	slopes: readonly number[],
	{ reaches }: Uncertain
) {
	return {
		inputs: reaches.map(({ name, value, u }, i) => ({
			path: name,
			mean: value,
			u,
			slope: slopes[i]!,
			contribution: contributions[i]!,
			share: shares[i]!
		})),
		covariances: covariances.map(({ first, second, share }) => ({
			first: reaches[first]!.name,
			second: reaches[second]!.name,
			share
		}))
	};
}
