/**
 * The API in OpenAPI 3.1, made from the descriptions that its routes work by: the catalogue of methods, the
 * schema of a note, the titles of problems.
 */
import { METHODS } from '$lib/engine/methods/catalogue';
import { schemaOf, type JsonSchema } from '$lib/engine/methods/json-schema';
import { ENGINE_VERSION } from '$lib/engine/version';
import { noteJsonSchema } from '$lib/note/json-schema';
import { TITLES, type ProblemStatus } from '../problems';
import { METHOD_DESCRIPTION, operations, type Operation } from './operations';
import { RESULT_SCHEMAS } from './result-schema';

const text = { type: 'string' };
const ref = (name: string): JsonSchema => ({ $ref: `#/components/schemas/${name}` });
const json = (schema: JsonSchema) => ({ 'application/json': { schema } });

/** What any question may be answered with instead of a result. */
const REFUSALS: readonly ProblemStatus[] = [401, 403, 429, 500, 503];
/** And a question that brings a body. */
const BODY_REFUSALS: readonly ProblemStatus[] = [400, 413, 415, 422];

function written({ operationId, summary, scope, takes, answers, contentType }: Operation) {
	const refusals = [...(takes ? BODY_REFUSALS : []), ...REFUSALS].sort();
	return {
		operationId,
		summary,
		description: `Needs a token of the scope “${scope}”.`,
		security: [{ token: [] }],
		...(takes && { requestBody: { required: true, content: json(takes) } }),
		responses: {
			200: {
				description: 'The answer.',
				content: contentType ? { [contentType]: { schema: answers } } : json(answers)
			},
			...Object.fromEntries(
				refusals.map((status) => [status, { $ref: `#/components/responses/${status}` }])
			)
		}
	};
}

const PROBLEM: JsonSchema = {
	type: 'object',
	description: 'RFC 9457. Which further members there are depends on the problem.',
	properties: {
		type: { const: 'about:blank' },
		title: text,
		status: { type: 'integer' },
		detail: { ...text, description: 'What is wrong, in words for a person.' },
		code: { enum: ['input', 'refused', 'beyond-any-build', 'not-converged'] },
		remedy: { ...text, description: 'What to change.' },
		faults: {
			type: 'array',
			description: 'The inputs of a method that are wrong, by path.',
			items: { type: 'object', properties: { path: text, message: text } }
		},
		errors: {
			type: 'array',
			description: 'The places of a note that are wrong.',
			items: { type: 'object', properties: { field: text, message: text } }
		},
		near: { type: 'array', items: text, description: 'Names like the one that was not found.' },
		reference: { ...text, description: 'Under which the operator finds it in the log.' }
	},
	required: ['type', 'title', 'status', 'detail']
};

const problemAnswer = (status: ProblemStatus) => ({
	description: TITLES[status],
	...((status === 429 || status === 503) && {
		headers: { 'retry-after': { description: 'Seconds to wait.', schema: { type: 'string' } } }
	}),
	content: { 'application/problem+json': { schema: ref('Problem') } }
});

/** The note's schema, with its inner definitions as components of the whole. */
function noteSchemas(): Record<string, JsonSchema> {
	const moved = JSON.stringify(noteJsonSchema()).replaceAll(
		'"#/$defs/',
		'"#/components/schemas/Note.'
	);
	const { $defs, ...note } = JSON.parse(moved) as JsonSchema & {
		$defs: Record<string, JsonSchema>;
	};
	const inner = Object.entries($defs).map(([name, schema]) => [`Note.${name}`, schema]);
	return { Note: note, ...Object.fromEntries(inner) };
}

export function openApi() {
	const schemas = [...METHODS.values()].flatMap(({ name, inputs, outputs }) => [
		[`${name}.inputs`, schemaOf(inputs)],
		[`${name}.outputs`, schemaOf(outputs)]
	]);
	return {
		openapi: '3.1.0',
		info: {
			title: 'Holdfast, the engine',
			version: ENGINE_VERSION,
			description:
				'Numbers are in SI units, in and out. Preliminary design data, not for construction or operation: ' +
				'verify against the governing standards and local codes, under the responsibility of licensed engineers.'
		},
		paths: Object.fromEntries(
			Object.entries(operations()).map(([path, verbs]) => [
				path,
				Object.fromEntries(Object.entries(verbs).map(([verb, one]) => [verb, written(one)]))
			])
		),
		components: {
			securitySchemes: {
				token: {
					type: 'http',
					scheme: 'bearer',
					description:
						'A token from the account page. Scope “read” describes, “evaluate” also computes.'
				}
			},
			responses: Object.fromEntries(
				[...BODY_REFUSALS, ...REFUSALS].map((status) => [status, problemAnswer(status)])
			),
			schemas: {
				Problem: PROBLEM,
				Method: METHOD_DESCRIPTION,
				...RESULT_SCHEMAS,
				...noteSchemas(),
				...Object.fromEntries(schemas)
			}
		}
	};
}
