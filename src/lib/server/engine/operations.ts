/** What the API can be asked, by path and verb, with the schemas of what goes in and comes out. */
import { METHODS } from '$lib/engine/methods/catalogue';
import type { JsonSchema } from '$lib/engine/methods/json-schema';
import type { AnyMethod } from '$lib/engine/methods/method';
import type { TokenScope } from '../auth/permissions';

const text = { type: 'string' };
const ref = (name: string): JsonSchema => ({ $ref: `#/components/schemas/${name}` });

export type Operation = {
	operationId: string;
	summary: string;
	/** The least scope of a token that includes it. */
	scope: TokenScope;
	/** Schema of what goes in; null where nothing does. */
	takes: JsonSchema | null;
	answers: JsonSchema;
	/** Kind of what comes out, where it is not plain JSON. */
	contentType?: string;
};

const described = (schema: JsonSchema): JsonSchema => ({
	type: 'object',
	properties: { engine: text, ...(schema.properties as object) },
	required: ['engine', ...(schema.required as string[])]
});

/** What the catalogue tells of one method. */
export const METHOD_DESCRIPTION: JsonSchema = {
	type: 'object',
	properties: {
		...{ engine: text, name: text, title: text, summary: text, subject: text },
		inputs: { type: 'object', description: 'JSON schema of what goes in.' },
		outputs: { type: 'object', description: 'JSON schema of what comes out.' },
		sources: { type: 'array', items: text },
		validity: text,
		leftOut: { type: 'array', items: text },
		refuses: { type: 'array', items: text },
		caution: text
	},
	required: ['engine', 'name', 'title', 'summary', 'subject', 'inputs', 'outputs', 'caution']
};

const runOf = (method: AnyMethod): Operation => ({
	operationId: `run-${method.name}`,
	summary: method.summary,
	scope: 'evaluate',
	takes: ref(`${method.name}.inputs`),
	answers: described({
		properties: {
			method: { const: method.name },
			outputs: ref(`${method.name}.outputs`),
			warnings: { type: 'array', items: text }
		},
		required: ['method', 'outputs', 'warnings']
	})
});

/** By path and verb. */
export const operations = (): Record<string, Record<string, Operation>> => ({
	'/api/v1/methods': {
		get: {
			operationId: 'list-methods',
			summary: 'All methods, each with the JSON schemas of what goes in and comes out.',
			scope: 'read',
			takes: null,
			answers: described({
				properties: { methods: { type: 'array', items: ref('Method') } },
				required: ['methods']
			})
		}
	},
	...Object.fromEntries(
		[...METHODS.values()].map((method) => [
			`/api/v1/methods/${method.name}`,
			{
				get: {
					operationId: `describe-${method.name}`,
					summary: `What “${method.title}” takes and answers.`,
					scope: 'read',
					takes: null,
					answers: ref('Method')
				},
				post: runOf(method)
			}
		])
	),
	'/api/v1/evaluate': {
		post: {
			operationId: 'evaluate',
			summary: 'The result or the fault of each item of a note in interchange.',
			scope: 'evaluate',
			takes: ref('Note'),
			answers: described({
				properties: { results: { type: 'array', items: ref('ItemResult') } },
				required: ['results']
			})
		}
	},
	'/api/v1/schemas/note': {
		get: {
			operationId: 'note-schema',
			summary: 'The JSON schema of a note in interchange.',
			scope: 'read',
			takes: null,
			answers: { type: 'object' },
			contentType: 'application/schema+json'
		}
	}
});
