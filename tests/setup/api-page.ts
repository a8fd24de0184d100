/** The part of docs/api.md that follows from the OpenAPI description: what can be asked, and every method. */
import { METHODS } from '$lib/engine/methods/catalogue';
import { schemaOf, type JsonSchema } from '$lib/engine/methods/json-schema';
import { operations } from '$lib/server/engine/operations';
import { TITLES } from '$lib/server/problems';

type Schema = JsonSchema & {
	title?: string;
	description?: string;
	type?: string;
	properties?: Record<string, Schema>;
	required?: string[];
	items?: Schema;
	oneOf?: (Schema & { const?: string })[];
};

type Row = { path: string; schema: Schema; isRequired: boolean };

/** Named values, those of groups, lists and variants below them. */
function rowsOf({ properties = {}, required = [] }: Schema, before = ''): Row[] {
	return Object.entries(properties).flatMap(([name, schema]) => {
		const path = before + name;
		const row = { path, schema, isRequired: required.includes(name) };
		const inner = schema.type === 'array' ? schema.items! : schema;
		const below = schema.type === 'array' ? `${path}[].` : `${path}.`;
		const cases = (inner.oneOf ?? []).filter((one) => one.properties);
		return [row, ...rowsOf(inner, below), ...cases.flatMap((one) => rowsOf(one, below))];
	});
}

const BOUNDS = [
	['exclusiveMinimum', 'above'],
	['minimum', 'at least'],
	['exclusiveMaximum', 'below'],
	['maximum', 'at most'],
	['minItems', 'at least'],
	['maxItems', 'at most'],
	['maxLength', 'length at most']
] as const;

function kindOf(schema: Schema): string {
	const dimension = schema['x-dimension'];
	const words = [
		schema.const === undefined ? '' : `\`${schema.const}\``,
		schema.type ?? '',
		dimension === undefined || dimension === '1' ? '' : `${dimension}`,
		...(schema.oneOf ?? []).flatMap((one) => (one.const === undefined ? [] : [`\`${one.const}\``])),
		...BOUNDS.flatMap(([key, word]) => (key in schema ? [`${word} ${schema[key]}`] : [])),
		'default' in schema ? `default ${schema.default}` : ''
	];
	return words.filter((word) => word !== '').join(', ');
}

function table(fields: Schema, outer: 'needed' | ''): string {
	const rows = rowsOf(fields).map(({ path, schema, isRequired }) => {
		const symbol = schema['x-symbol'] ? `, ${schema['x-symbol']}` : '';
		const what = `${schema.title ?? ''}${symbol}`;
		const need = outer && isRequired ? 'yes' : '';
		const cells = [`\`${path}\``, what, kindOf(schema), ...(outer ? [need] : [])];
		return `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
	});
	const heads = ['name', 'what it is', 'kind', ...(outer ? [outer] : [])];
	return [`| ${heads.join(' | ')} |`, `|${' --- |'.repeat(heads.length)}`, ...rows].join('\n');
}

const asked = () =>
	Object.entries(operations()).flatMap(([path, verbs]) =>
		Object.entries(verbs).map(
			([verb, { scope, summary }]) =>
				`| \`${verb.toUpperCase()} ${path}\` | ${scope} | ${summary.replaceAll('|', '\\|')} |`
		)
	);

const problems = () =>
	[400, 401, 403, 404, 405, 413, 415, 422, 429, 500, 503].map(
		(status) => `| ${status} | ${TITLES[status as keyof typeof TITLES]} |`
	);

export function apiTables(): string {
	const methods = [...METHODS.values()].map(
		({ name, title, summary, inputs, outputs, caution }) => `### ${title}: \`${name}\`

${summary}${caution ? `\n\n> **Caution.** ${caution}` : ''}

In:

${table(schemaOf(inputs), 'needed')}

Out:

${table(schemaOf(outputs), '')}`
	);
	return [
		'## Problems',
		['| status | title |', '| --- | --- |', ...problems()].join('\n'),
		'## What can be asked',
		['| address | scope | what it answers |', '| --- | --- | --- |', ...asked()].join('\n'),
		'## Methods',
		'Dimensions are written in M (mass), L (length), T (time), Θ (temperature); a figure is in the coherent SI unit of its dimension. A name with `[]` is that of each entry of a list.',
		...methods
	].join('\n\n');
}
