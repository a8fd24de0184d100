/** The margin of a check, as the note's checks have it. */
import { marginKind, marginOf, verdictOf } from '../calc/margin';
import { PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { choice, flag, quantity } from './parameter';
import { refuseInput } from './refused';

const side = (label: string) => quantity({ label, dimension: null, unit: '' });

export const margin = defineMethod({
	name: 'margin',
	title: 'Margin of a check',
	summary:
		'Whether left ≤ right, left ≥ right or left within right ± tolerance, and by how much: with both sides positive the larger allowed over the actual less one, so that for a stress it is the margin of safety.',
	subject: 'budgets',
	inputs: {
		relation: choice({
			label: 'relation',
			options: { le: 'left ≤ right', ge: 'left ≥ right', within: 'left within right ± tolerance' }
		}),
		left: side('left side'),
		right: side('right side'),
		tolerance: quantity({
			label: 'tolerance',
			dimension: null,
			unit: '',
			range: { least: 0 },
			default: 0,
			help: 'For “within”; in the same SI unit as the sides.'
		}),
		required: quantity({
			label: 'required margin',
			dimension: null,
			unit: '',
			default: 0,
			help: 'A ratio where the margin is one, else a difference in the unit of the sides.'
		}),
		thinLimit: quantity({
			label: 'thin limit',
			dimension: PURE,
			unit: '%',
			range: { least: 0 },
			default: 0.1,
			help: 'A margin that holds and lies below it is thin.'
		}),
		pure: flag({
			label: 'the sides are pure numbers',
			default: false,
			help: 'A difference of pure numbers is held against the thin limit as it is; any other as a share of the larger side.'
		})
	},
	outputs: {
		kind: choice({
			label: 'kind of margin',
			options: { ratio: 'a ratio less one', difference: 'a difference' }
		}),
		margin: quantity({ label: 'margin', dimension: null, unit: '' }),
		relative: quantity({ label: 'margin as a pure number', dimension: PURE, unit: '%' }),
		shortBy: quantity({
			label: 'missing to the required margin',
			dimension: null,
			unit: '',
			help: 'In the unit of the sides; negative where it is met.'
		}),
		state: choice({
			label: 'state',
			options: { holds: 'holds', thin: 'holds, but is thin', fails: 'fails' }
		})
	},
	sources: [
		'Margin of safety, allowable over factored actual less one: NASA-STD-5001, ECSS-E-ST-32-10'
	],
	validity:
		'Both sides in the same SI unit. Where one is not positive the margin is their difference. Within a tolerance it is the share of the tolerance not used up. Figures equal to twelve digits are equal.',
	leftOut: [
		'factors of safety: the user applies those of the governing standard to one of the sides'
	],
	refuses: ['a required ratio of −1 or less', 'sides whose difference is above 1e300'],
	caution:
		'A margin is as good as its two sides: factors of safety, allowables and load cases follow the governing standard and licensed practice.',
	run({ thinLimit, ...sides }) {
		if (marginKind(sides) === 'ratio' && sides.required <= -1)
			refuseInput('required', 'A required margin of −1 or less asks for nothing.');
		const found = marginOf(sides);
		const { kind, size, relative, shortBy } = found;
		const state = verdictOf(found, sides, thinLimit);
		return { outputs: { kind, margin: size, relative, shortBy, state } };
	}
});
