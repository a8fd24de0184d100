/** Outputs of another method over a range of one of its inputs, or a grid of two. */
import { defineMethod } from './method';
import { choice, group, integer, list, quantity, text, told, type Told } from './parameter';
import { Refused, refuseInput } from './refused';
import {
	inputName,
	outputNames,
	outputsNamed,
	outputsWith,
	studyInputs,
	subjectOf,
	type Studied
} from './study';
import { inputPath, outputAt } from './value-path';
import { spaced } from '../studies/spacing';

const MOST_POINTS = 10_000;

const figure = (label: string) => quantity({ label, dimension: null, unit: '' });

export const sweep = (methods: Studied) =>
	defineMethod({
		name: 'sweep',
		title: 'Sweep of a method',
		summary:
			'Calls another method at every step of one input’s range, or at every pair of steps of two, and tells the outputs asked for.',
		subject: 'studies',
		inputs: {
			...studyInputs,
			along: list({
				label: 'inputs that are stepped, one or two',
				fewest: 1,
				most: 2,
				of: group({
					label: 'range',
					fields: {
						path: inputName('input'),
						from: figure('first value'),
						to: figure('last value'),
						count: integer({
							label: 'number of values, ends included',
							range: { least: 1, most: MOST_POINTS },
							default: 11
						}),
						spacing: choice({
							label: 'spacing',
							options: { linear: 'equal steps', logarithmic: 'equal ratios' },
							default: 'linear'
						})
					}
				})
			}),
			outputs: outputNames
		},
		outputs: {
			points: list({
				label: 'points, the last input running fastest',
				fewest: 1,
				most: MOST_POINTS,
				of: group({
					label: 'point',
					fields: {
						at: list({ label: 'values of the inputs', fewest: 1, most: 2, of: figure('value') }),
						outputs: list({
							label: 'outputs, in the order asked for; empty where there is no result',
							fewest: 0,
							most: 20,
							of: told({ label: 'output', dimension: null, unit: '' })
						}),
						refusal: text({ label: 'why there is no result', longest: 2000, optional: true })
					}
				})
			})
		},
		sources: ['The method that is swept'],
		validity: 'That of the method at each point.',
		leftOut: ['what lies between the points'],
		refuses: [
			'a method or path that is not there',
			`more than ${MOST_POINTS} points`,
			'equal ratios from, to or across zero',
			'steps of a whole number that are none'
		],
		caution: '',
		run({ along, outputs: paths, ...about }) {
			const subject = subjectOf(methods, about);
			const inputs = along.map(({ path }, i) =>
				inputPath(subject.method.inputs, subject.values, path, `along.${i}.path`)
			);
			if (along.length === 2 && along[0]!.path === along[1]!.path)
				refuseInput('along.1.path', `${along[1]!.path} is named twice.`);
			const size = along.reduce((product, { count }) => product * count, 1);
			if (size > MOST_POINTS) refuseInput('along', `${size} points are more than ${MOST_POINTS}.`);
			const [first = [], second] = along.map((range, i) => spaced(range, `along.${i}`));
			const grid = second ? first.flatMap((a) => second.map((b) => [a, b])) : first.map((a) => [a]);
			const outputs = outputsNamed(subject, paths, 'outputs');
			const outputsAt = outputsWith(subject, inputs);
			const results = (at: number[]): { outputs: Told[]; refusal: string | undefined } => {
				try {
					const found = outputsAt(at);
					return { outputs: outputs.map((path) => outputAt(found, path)), refusal: undefined };
				} catch (error) {
					if (!(error instanceof Refused)) throw error;
					return { outputs: [], refusal: error.message };
				}
			};
			const points = grid.map((at) => ({ at, ...results(at) }));
			const without = points.filter(({ refusal }) => refusal !== undefined).length;
			return {
				outputs: { points },
				warnings: without > 0 ? [`${without} of ${points.length} points have no result.`] : []
			};
		}
	});
