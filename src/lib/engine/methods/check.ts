/** The check at the door: what came in against the description, defaults filled in. */
import { nearest } from '../calc/near';
import type { Parameter, Parameters, Range, ValuesOf } from './parameter';
import type { InputFault } from './refused';

export type Checked<F> = { ok: true; values: ValuesOf<F> } | { ok: false; faults: InputFault[] };

/** All that is wrong is told at once, each with its path. */
export function checkInputs<F extends Parameters>(fields: F, input: unknown): Checked<F> {
	const faults: InputFault[] = [];
	const values = checkFields(fields, input, '', faults);
	return faults.length > 0
		? { ok: false, faults }
		: { ok: true, values: values as unknown as ValuesOf<F> };
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

const join = (path: string, key: string | number) => (path === '' ? `${key}` : `${path}.${key}`);

function checkFields(
	fields: Parameters,
	input: unknown,
	path: string,
	faults: InputFault[],
	known: readonly string[] = []
): Record<string, unknown> | undefined {
	if (!isRecord(input)) {
		faults.push({
			path,
			message: `${path === '' ? 'The input' : path} must be an object of named values.`
		});
		return undefined;
	}
	const names = Object.keys(fields);
	for (const key of Object.keys(input)) {
		if (Object.hasOwn(fields, key) || known.includes(key)) continue;
		const [near] = nearest(key, names);
		const hint = near === undefined ? '' : ` Is it ${near}?`;
		faults.push({
			path: join(path, key),
			message: `${join(path, key)} is not an input here.${hint}`
		});
	}
	return Object.fromEntries(
		names.map((name) => {
			const given = Object.hasOwn(input, name) ? input[name] : undefined;
			return [name, checkOne(fields[name]!, given, join(path, name), faults)];
		})
	);
}

function checkOne(
	parameter: Parameter,
	given: unknown,
	path: string,
	faults: InputFault[]
): unknown {
	const fail = (message: string) => void faults.push({ path, message: `${path} ${message}` });
	if (given === undefined) {
		if ('default' in parameter && parameter.default !== undefined) return parameter.default;
		if ('optional' in parameter && parameter.optional) return undefined;
		return fail(`(${parameter.label}) is missing.`);
	}
	switch (parameter.kind) {
		case 'number':
		case 'integer': {
			if (typeof given !== 'number' || !Number.isFinite(given)) return fail('must be a number.');
			if (parameter.kind === 'integer' && !Number.isSafeInteger(given))
				return fail('must be a whole number.');
			const wanted = outOfRange(parameter.range, given);
			return wanted === null ? given : fail(`must be ${wanted}; it is ${given}.`);
		}
		case 'flag':
			return typeof given === 'boolean' ? given : fail('must be true or false.');
		case 'choice':
			return typeof given === 'string' && Object.hasOwn(parameter.options, given)
				? given
				: fail(`must be one of ${Object.keys(parameter.options).join(', ')}.`);
		case 'text':
			if (typeof given !== 'string') return fail('must be text.');
			return given.length <= parameter.longest
				? given
				: fail(`is longer than ${parameter.longest} characters.`);
		case 'list': {
			if (!Array.isArray(given)) return fail('must be a list.');
			const { fewest, most } = parameter;
			if (given.length < fewest || given.length > most)
				return fail(`must have ${fewest} to ${most} entries; it has ${given.length}.`);
			// Not Array.from or flatMap: a sparse array's holes are missing entries.
			const values: unknown[] = [];
			for (let i = 0; i < given.length; i += 1)
				values.push(checkOne(parameter.of, given[i], join(path, i), faults));
			return values;
		}
		case 'group':
			return checkFields(parameter.fields, given, path, faults);
		case 'variant': {
			const kinds = Object.keys(parameter.cases);
			const kind = isRecord(given) ? given.kind : undefined;
			if (typeof kind !== 'string' || !kinds.includes(kind))
				return fail(`needs a kind, one of ${kinds.join(', ')}.`);
			const fields = checkFields(parameter.cases[kind]!.fields, given, path, faults, ['kind']);
			return fields && { kind, ...fields };
		}
		case 'open':
			return isRecord(given) ? given : fail('must be an object of named values.');
		case 'told':
			throw new Error('Only outputs may be beyond any build.');
	}
}

export const fits = ({ above, least, below, most }: Range, value: number): boolean =>
	(above === undefined || value > above) &&
	(least === undefined || value >= least) &&
	(below === undefined || value < below) &&
	(most === undefined || value <= most);

/** What the number must be, in words; null when it is. */
export function outOfRange(range: Range, value: number): string | null {
	if (fits(range, value)) return null;
	const { above, least, below, most } = range;
	const wanted = [
		...(above !== undefined ? [`above ${above}`] : []),
		...(least !== undefined ? [`${least} or more`] : []),
		...(below !== undefined ? [`below ${below}`] : []),
		...(most !== undefined ? [`${most} or less`] : [])
	];
	return wanted.join(' and ');
}
