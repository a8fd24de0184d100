import { expect, it } from 'vitest';
import { PRESSURE } from '../quantities/dimension';
import { METHODS } from './catalogue';
import { schemaOf } from './json-schema';
import { choice, group, list, quantity, told, variant } from './parameter';

it('says kind, bounds, default and dimension of a quantity', () => {
	const stress = quantity({
		label: 'stress',
		symbol: 'σ',
		dimension: PRESSURE,
		unit: 'GPa',
		range: { above: 0, most: 1e12 },
		default: 5e9
	});
	expect(schemaOf({ stress })).toEqual({
		$schema: 'https://json-schema.org/draft/2020-12/schema',
		type: 'object',
		properties: {
			stress: {
				title: 'stress',
				type: 'number',
				exclusiveMinimum: 0,
				maximum: 1e12,
				default: 5e9,
				'x-symbol': 'σ',
				'x-dimension': 'M L⁻¹ T⁻²',
				'x-usual-unit': 'GPa'
			}
		},
		required: [],
		additionalProperties: false
	});
});

it('asks for the kind of a variant and for what that kind needs', () => {
	const size = quantity({ label: 'size', dimension: PRESSURE, unit: 'Pa' });
	const one = variant({ label: 'way', cases: { by: { label: 'by size', fields: { size } } } });
	expect(schemaOf({ one })).toMatchObject({
		required: ['one'],
		properties: {
			one: { oneOf: [{ properties: { kind: { const: 'by' } }, required: ['kind', 'size'] }] }
		}
	});
});

it('describes lists, groups, choices and figures beyond any build', () => {
	const schema = schemaOf({
		rows: list({
			label: 'rows',
			fewest: 1,
			most: 3,
			of: group({ label: 'row', fields: { side: choice({ label: 'side', options: { a: 'A' } }) } })
		}),
		mass: told({ label: 'mass', dimension: PRESSURE, unit: 't' })
	});
	expect(schema).toMatchObject({
		properties: {
			rows: {
				type: 'array',
				minItems: 1,
				maxItems: 3,
				items: { properties: { side: { oneOf: [{ const: 'a', title: 'A' }] } } }
			},
			mass: { oneOf: [{ type: 'number' }, { required: ['log10'] }] }
		}
	});
});

it('is made of plain JSON for every method', () => {
	for (const { inputs, outputs } of METHODS.values())
		for (const fields of [inputs, outputs]) {
			const schema = schemaOf(fields);
			expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
		}
});
