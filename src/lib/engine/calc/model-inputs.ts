/**
 * The inputs of a line model in a note: those of the method "taper", by which they are checked and named,
 * but for the top, which a note gives as a height.
 */
import { sizingInputs } from '../line/sizing';
import { quantity, type NumberParameter } from '../methods/parameter';
import { LENGTH } from '../quantities/dimension';

const { density, allowable, factorOfSafety, base, reserve } = sizingInputs;

export const MODEL_INPUTS = {
	density,
	allowable,
	factorOfSafety,
	lift: base.cases.lift.fields.lift,
	area: base.cases.area.fields.area,
	reserve,
	top: quantity({
		label: 'height of the top',
		symbol: 'h_t',
		dimension: LENGTH,
		unit: 'km',
		range: { above: 0 },
		help: 'Above the surface, beyond synchronous height.'
	})
} as const satisfies Record<string, NumberParameter>;

export type ModelField = keyof typeof MODEL_INPUTS;

export const MODEL_FIELDS = Object.keys(MODEL_INPUTS) as ModelField[];
