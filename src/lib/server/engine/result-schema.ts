/** JSON schema of what a note evaluates to, as `$lib/engine/calc/results` has it in types. */
import type { JsonSchema } from '$lib/engine/methods/json-schema';

const text = { type: 'string' };
const figure = { type: 'number' };
const whole = { type: 'integer' };
const some = (items: JsonSchema, description?: string): JsonSchema => ({
	type: 'array',
	items,
	...(description && { description })
});
const orNull = (schema: JsonSchema): JsonSchema => ({ anyOf: [schema, { type: 'null' }] });

/** Every property is there, unless it is named as one that may be missing. */
const object = (properties: Record<string, JsonSchema>, missing: string[] = []): JsonSchema => ({
	type: 'object',
	properties,
	required: Object.keys(properties).filter((name) => !missing.includes(name))
});

const ref = (name: string): JsonSchema => ({ $ref: `#/components/schemas/${name}` });

const dimension = some(
	figure,
	'Exponents of mass, length, time, temperature, current, amount of substance, luminous intensity.'
);
const uncertainty = orNull({ ...figure, description: 'Standard uncertainty, in the unit.' });

const quantity = object({
	si: { ...figure, description: 'In coherent SI units.' },
	dimension,
	value: { ...figure, description: 'In the unit.' },
	unit: { ...text, description: 'Empty for a pure number.' },
	uncertainty,
	digits: { ...whole, description: 'Significant digits to show.' }
});

const listed = object({
	si: some(figure, 'The first 1 000 values in coherent SI units.'),
	dimension,
	unit: text,
	digits: whole,
	count: whole,
	values: some(figure, 'The same in the unit.'),
	uncertainties: orNull(some(uncertainty)),
	least: figure,
	greatest: figure,
	mean: figure
});

const fault = object({
	code: text,
	message: { ...text, description: 'A sentence for the person.' },
	remedy: { ...text, description: 'What to change; may be empty.' },
	span: orNull(object({ field: text, from: whole, to: whole })),
	near: some(text, 'Names near an unknown one.'),
	items: some(text, 'Ids of other items that it is about.')
});

const outcome: JsonSchema = {
	oneOf: [
		object({ state: { const: 'value' }, quantity: ref('Quantity') }),
		object({ state: { const: 'list' }, list: ref('Listed') }),
		object({ state: { const: 'blank' } }),
		object({
			state: { const: 'waits' },
			for: some(text, 'Symbols waited for, nearest first.'),
			rootIds: some(text, 'Where it starts.')
		}),
		object({ state: { const: 'fault' }, faults: some(ref('Fault')) })
	]
};

const common = {
	id: text,
	uses: some(text, 'Ids of the items that it names.'),
	usedIn: some(text, 'Ids of the items that name it.')
};

const itemResult: JsonSchema = {
	oneOf: [
		object({
			...common,
			kind: { enum: ['given', 'calculation'] },
			symbol: text,
			outcome: ref('Outcome'),
			tex: text,
			symbolTex: text
		}),
		object({
			...common,
			kind: { const: 'check' },
			state: { enum: ['holds', 'thin', 'fails', 'waits'] },
			left: ref('Outcome'),
			right: ref('Outcome'),
			tolerance: orNull(ref('Outcome')),
			required: { ...figure, description: 'Required margin.' },
			margin: orNull(
				object(
					{
						kind: { enum: ['ratio', 'difference'] },
						value: figure,
						unit: text,
						uncertainty,
						relative: { ...figure, description: 'The margin as a pure number.' }
					},
					['uncertainty']
				)
			),
			shortBy: orNull(object({ value: figure, unit: text })),
			faults: some(ref('Fault')),
			tex: text
		}),
		object({
			...common,
			kind: { const: 'lineModel' },
			symbol: text,
			faults: some(object({ field: text, fault: ref('Fault') })),
			waitsFor: some(text),
			inputs: some(object({ field: text, outcome: ref('Outcome'), tex: text })),
			outputs: some(
				object({ name: text, symbolTex: text, description: text, outcome: ref('Outcome') })
			),
			profile: orNull(
				object({
					height: some(figure, 'Above the surface, m.'),
					area: some(figure, 'm².'),
					stress: some(figure, 'Pa.'),
					tension: some(figure, 'N.'),
					synchronous: { ...figure, description: 'Height of the balance radius, m.' }
				})
			),
			warnings: some(text)
		})
	]
};

/** By the names under which they refer to each other. */
export const RESULT_SCHEMAS = {
	Quantity: quantity,
	Listed: listed,
	Fault: fault,
	Outcome: outcome,
	ItemResult: itemResult
};
