/** Swings of another method's outputs at ± the standard uncertainty of each input. */
import { swingsOf, type End } from '../studies/swings';
import { valuesAt } from '../studies/slopes';
import { defineMethod } from './method';
import { group, list, quantity, text } from './parameter';
import { modelOf, outputNames, outputsNamed, studyInputs, subjectOf, type Studied } from './study';
import { uncertainInputs, uncertainOf } from './uncertain';

const figure = (label: string) => quantity({ label, dimension: null, unit: '' });
const named = (label: string) => text({ label, longest: 200 });

const end = (label: string) =>
	group({
		label,
		fields: {
			input: figure('value of the input'),
			output: { ...figure('the output there'), optional: true },
			refusal: text({ label: 'why there is none', longest: 2000, optional: true })
		}
	});

export const tornado = (methods: Studied) =>
	defineMethod({
		name: 'tornado',
		title: 'Swings of a method at ± u',
		summary:
			'How far each output of another method goes when one input after the other stands at its mean less and plus its standard uncertainty, the widest swing first.',
		subject: 'studies',
		inputs: {
			...studyInputs,
			uncertain: uncertainInputs.uncertain,
			outputs: outputNames
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
						value: figure('at the means of all inputs'),
						swings: list({
							label: 'swings, the widest first; those without a result at an end before all',
							fewest: 1,
							most: 50,
							of: group({
								label: 'swing',
								fields: {
									path: named('input'),
									low: end('at the mean less u'),
									high: end('at the mean plus u'),
									swing: { ...figure('distance between the two'), optional: true }
								}
							})
						})
					}
				})
			})
		},
		sources: ['One input at a time at ± one standard uncertainty: common practice'],
		validity:
			'One input at a time, the others at their means. An end that would pass a bound of the distribution stands at the bound.',
		leftOut: ['what inputs do together, and their correlations'],
		refuses: ['a method or path that is not there', 'no result at the means'],
		caution: '',
		run({ outputs: paths, ...about }) {
			const subject = subjectOf(methods, about);
			const { inputs, reaches } = uncertainOf(subject, about.uncertain);
			const model = modelOf(subject, inputs, outputsNamed(subject, paths, 'outputs'));
			const values = valuesAt(model, reaches, paths.length);
			const swings = swingsOf(model, reaches, paths.length);
			const rows = (k: number) =>
				swings
					.map(({ low, high }, i) => {
						const [from, to] = [endOf(low, k), endOf(high, k)];
						const known = from.output !== undefined && to.output !== undefined;
						const swing = known ? Math.abs(to.output! - from.output!) : undefined;
						return { path: reaches[i]!.name, low: from, high: to, swing };
					})
					.sort((a, b) => (b.swing ?? Infinity) - (a.swing ?? Infinity) || 0);
			return {
				outputs: {
					outputs: paths.map((path, k) => ({ path, value: values[k]!, swings: rows(k) }))
				}
			};
		}
	});

const endOf = (end: End, k: number) => ({
	input: end.at,
	output: 'outputs' in end ? end.outputs[k]! : undefined,
	refusal: 'refusal' in end ? end.refusal : undefined
});
