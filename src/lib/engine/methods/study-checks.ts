/** Checks that a study holds against every sample: outputs, inputs and figures, as the note's checks compare them. */
import { marginOf, verdictOf } from '../calc/margin';
import { choice, group, list, quantity, text, variant, type ValueOf } from './parameter';
import { refuseInput } from './refused';
import { inputName, type Subject } from './study';
import type { Uncertain } from './uncertain';
import { inputPath } from './value-path';

const side = (label: string) =>
	variant({
		label,
		cases: {
			output: {
				label: 'an output',
				fields: { path: text({ label: 'its path', longest: 200 }) }
			},
			input: { label: 'an input, as it is drawn', fields: { path: inputName('its path') } },
			value: {
				label: 'a figure',
				fields: { value: quantity({ label: 'value', dimension: null, unit: '' }) }
			}
		}
	});

export const checks = list({
	label: 'checks; none where left out',
	fewest: 0,
	most: 20,
	optional: true,
	of: group({
		label: 'check',
		fields: {
			left: side('left side'),
			relation: choice({
				label: 'relation',
				options: {
					le: 'left ≤ right',
					ge: 'left ≥ right',
					within: 'left within right ± tolerance'
				}
			}),
			right: side('right side'),
			tolerance: quantity({
				label: 'tolerance',
				dimension: null,
				unit: '',
				range: { least: 0 },
				default: 0
			}),
			required: quantity({
				label: 'required margin',
				dimension: null,
				unit: '',
				default: 0,
				help: 'A ratio where both sides are positive, else a difference.'
			})
		}
	})
});

export type Check = NonNullable<ValueOf<typeof checks>>[number];

/** The outputs that checks look at, each with its place in the study's input. */
export const outputsChecked = (checks: readonly Check[]) =>
	checks.flatMap((check, i) =>
		(['left', 'right'] as const).flatMap((name) => {
			const side = check[name];
			return side.kind === 'output' ? [[side.path, `checks.${i}.${name}.path`] as const] : [];
		})
	);

/** Whether a check holds for a sample with its givens x and outputs y; `place` tells where an output stands in y. */
export function holds(
	check: Check,
	i: number,
	about: { subject: Subject; uncertain: Uncertain; place: ReadonlyMap<string, number> }
): (x: Float64Array, y: Float64Array) => boolean {
	const left = reader(check.left, `checks.${i}.left.path`, about);
	const right = reader(check.right, `checks.${i}.right.path`, about);
	const { relation, tolerance, required } = check;
	return (x, y) => {
		const sides = {
			relation,
			left: left(x, y),
			right: right(x, y),
			tolerance,
			required,
			pure: false
		};
		return verdictOf(marginOf(sides), sides, 0) !== 'fails';
	};
}

type Reader = (x: Float64Array, y: Float64Array) => number;

function reader(
	side: Check['left'],
	at: string,
	{ subject, uncertain, place }: Parameters<typeof holds>[2]
): Reader {
	if (side.kind === 'value') return () => side.value;
	if (side.kind === 'output') {
		const k = place.get(side.path)!;
		return (_, y) => y[k]!;
	}
	const i = uncertain.givens.findIndex(({ name }) => name === side.path);
	if (i >= 0) return (x) => x[i]!;
	const { value } = inputPath(subject.method.inputs, subject.values, side.path, at);
	if (value === undefined) refuseInput(at, `${side.path} is left out of the input.`);
	return () => value;
}
