/**
 * The inputs of a line model in a note: those of the method "taper", by which they are checked and named,
 * but for the top, which a note gives as a height.
 */
import { sizingInputs } from '../line/sizing';
import { site } from '../line/site';
import { quantity, type NumberParameter } from '../methods/parameter';
import { LENGTH } from '../quantities/dimension';

const { own, moon } = site.cases;
const { density, allowable, factorOfSafety, base, reserve } = sizingInputs;

export const MODEL_INPUTS = {
	gm: { ...own.fields.gm, help: '' },
	radius: own.fields.radius,
	period: { ...own.fields.period, help: 'Sidereal.' },
	oblateness: { ...own.fields.j2, help: 'J2; empty is 0.' },
	primaryGm: moon.fields.primaryGm,
	distance: moon.fields.distance,
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
		help: 'Above the surface, beyond the balance point.'
	})
} as const satisfies Record<string, NumberParameter>;

/** What each kind of place reads of these; the rest stands for places that are known. */
export const PLACE_FIELDS = {
	own: ['gm', 'radius', 'period', 'oblateness'],
	moon: ['gm', 'radius', 'primaryGm', 'distance']
} as const;

export type ModelField = keyof typeof MODEL_INPUTS;

/** In SI, null for what is blank. */
export type ModelValues = Partial<Record<ModelField, number | null>>;

export const MODEL_FIELDS = Object.keys(MODEL_INPUTS) as ModelField[];
