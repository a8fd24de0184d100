/** JSON schemas (draft 2020-12) of a method's inputs and outputs, from their descriptions. Values are in SI. */
import { dimensionText } from '../quantities/dimension';
import type { Parameter, Parameters, Range } from './parameter';

export type JsonSchema = { readonly [key: string]: unknown };

export const DIALECT = 'https://json-schema.org/draft/2020-12/schema';

/** The schema of named values; what it does not name is refused. */
export const schemaOf = (fields: Parameters): JsonSchema => ({
	$schema: DIALECT,
	...objectOf(fields)
});

function objectOf(fields: Parameters, more: Record<string, JsonSchema> = {}): JsonSchema {
	const names = Object.keys(fields);
	return {
		type: 'object',
		properties: { ...more, ...Object.fromEntries(names.map((name) => [name, one(fields[name]!)])) },
		required: [...Object.keys(more), ...names.filter((name) => isRequired(fields[name]!))],
		additionalProperties: false
	};
}

const isRequired = (parameter: Parameter): boolean =>
	!('optional' in parameter && parameter.optional) &&
	!('default' in parameter && parameter.default !== undefined);

function one(parameter: Parameter): JsonSchema {
	const { label, help } = parameter;
	const about = { title: label, ...(help && { description: help }) };
	switch (parameter.kind) {
		case 'number':
			return {
				...about,
				type: 'number',
				...bounds(parameter.range),
				...measure(parameter),
				...preset(parameter)
			};
		case 'integer':
			return {
				...about,
				type: 'integer',
				...bounds({
					...parameter.range,
					// What a double holds to the last digit.
					...(parameter.range.most === undefined && { most: Number.MAX_SAFE_INTEGER })
				}),
				...preset(parameter)
			};
		case 'flag':
			return { ...about, type: 'boolean', ...preset(parameter) };
		case 'choice':
			return {
				...about,
				oneOf: Object.entries(parameter.options).map(([value, title]) => ({ const: value, title })),
				...preset(parameter)
			};
		case 'text':
			return { ...about, type: 'string', maxLength: parameter.longest };
		case 'list':
			return {
				...about,
				type: 'array',
				items: one(parameter.of),
				minItems: parameter.fewest,
				maxItems: parameter.most
			};
		case 'group':
			return { ...about, ...objectOf(parameter.fields) };
		case 'variant':
			return {
				...about,
				oneOf: Object.entries(parameter.cases).map(([kind, { label, fields }]) => ({
					title: label,
					...objectOf(fields, { kind: { const: kind } })
				}))
			};
		case 'open':
			return { ...about, type: 'object' };
		case 'told':
			return {
				...about,
				...measure(parameter),
				oneOf: [
					{ type: 'number' },
					{
						title: 'above 1e300: its decimal logarithm',
						...objectOf({}, { log10: { type: 'number' } })
					}
				]
			};
	}
}

const preset = (parameter: { default?: unknown }): JsonSchema =>
	parameter.default === undefined ? {} : { default: parameter.default };

/** Keywords of our own beside the standard's: which quantity it is, and the unit that is usual for it. */
const measure = ({ dimension, unit, symbol }: Measured): JsonSchema => ({
	...(symbol && { 'x-symbol': symbol }),
	...(dimension && { 'x-dimension': dimensionText(dimension) }),
	'x-usual-unit': unit
});

type Measured = { dimension: readonly number[] | null; unit: string; symbol?: string };

const bounds = ({ above, least, below, most }: Range): JsonSchema => ({
	...(above !== undefined && { exclusiveMinimum: above }),
	...(least !== undefined && { minimum: least }),
	...(below !== undefined && { exclusiveMaximum: below }),
	...(most !== undefined && { maximum: most })
});
