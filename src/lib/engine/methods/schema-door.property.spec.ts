/** The schema that a method publishes and the check at its door let in the same inputs: held by ajv, draft 2020-12. */
import { Ajv2020 } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { METHODS } from './catalogue';
import { checkInputs } from './check';
import { schemaOf } from './json-schema';
import type { Parameter, Parameters, Range } from './parameter';

const ajv = new Ajv2020({ strict: false, logger: false });

const WRONG: fc.Arbitrary<unknown> = fc.constantFrom<unknown[]>(
	...[null, '', '5', 'earth', true, [], {}, [1], { kind: 'body' }],
	...[0, -1, 0.5, 1e308, 2 ** 53, -0]
);

function inRange({ above, least, below, most }: Range): fc.Arbitrary<number> {
	const low = above ?? least ?? -1e6;
	const high = below ?? most ?? Math.max(low, 1) * 1e6;
	return fc.double({ min: low, max: high, noNaN: true });
}

/** Mostly what fits, now and then what does not. */
const mixed = (fitting: fc.Arbitrary<unknown>) =>
	fc.oneof({ weight: 30, arbitrary: fitting }, { weight: 1, arbitrary: WRONG });

function valueOf(parameter: Parameter): fc.Arbitrary<unknown> {
	switch (parameter.kind) {
		case 'number':
			return mixed(inRange(parameter.range));
		case 'integer':
			return mixed(inRange(parameter.range).map(Math.round));
		case 'flag':
			return mixed(fc.boolean());
		case 'choice':
			return mixed(fc.constantFrom(...Object.keys(parameter.options)));
		case 'text':
			return mixed(fc.string({ maxLength: Math.min(parameter.longest, 12) }));
		case 'list':
			return mixed(fc.array(valueOf(parameter.of), { maxLength: Math.max(3, parameter.fewest) }));
		case 'group':
			return mixed(fieldsOf(parameter.fields));
		case 'variant':
			return mixed(
				fc.oneof(
					...Object.entries(parameter.cases).map(([kind, { fields }]) =>
						fieldsOf(fields).map((values) => ({ kind, ...values }))
					)
				)
			);
		case 'open':
			return mixed(fc.constant({}));
		case 'told':
			throw new Error('Only outputs are told.');
	}
}

/** Some are left out, and now and then there is one that nobody knows. */
function fieldsOf(fields: Parameters): fc.Arbitrary<Record<string, unknown>> {
	const given = Object.entries(fields).map(([name, parameter]) =>
		fc
			.tuple(valueOf(parameter), fc.integer({ min: 0, max: 19 }))
			.map(([value, chance]) => (chance === 0 ? {} : { [name]: value }))
	);
	return fc
		.tuple(fc.tuple(...given), fc.integer({ min: 0, max: 39 }))
		.map(([parts, chance]) => Object.assign({}, ...parts, chance === 0 ? { stranger: 1 } : {}));
}

describe.each([...METHODS.values()].map((method) => [method.name, method] as const))(
	'the schema of %s',
	(_, { inputs }) => {
		it('lets in what the door lets in, and nothing else', () => {
			const valid = ajv.compile(schemaOf(inputs));
			let entered = 0;
			fc.assert(
				fc.property(fieldsOf(inputs), (input) => {
					const checked = checkInputs(inputs, input);
					if (checked.ok) entered += 1;
					const words = checked.ok
						? JSON.stringify(ajv.errorsText(valid.errors))
						: checked.faults.map(({ message }) => message).join(' ');
					expect(valid(input), `${JSON.stringify(input)}: ${words}`).toBe(checked.ok);
				}),
				{ numRuns: 150 }
			);
			expect(entered).toBeGreaterThan(0);
		});
	}
);
