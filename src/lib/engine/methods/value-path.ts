/** Figures inside the inputs and outputs of a method by their path, e.g. "masses.0.mass". */
import { nearest } from '../calc/near';
import type { Parameter, Parameters, Range, Told } from './parameter';
import { Refused, refuseInput } from './refused';

type Values = Readonly<Record<string, unknown>>;

const isRecord = (value: unknown): value is Values =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

export type InputPath = {
	path: string;
	keys: readonly string[];
	range: Range;
	whole: boolean;
	/** Undefined where it is left out. */
	value: number | undefined;
};

/**
 * A number among checked input values.
 * @throws Refused, about the place `at` in the study's own input, where there is no number of that name.
 */
export function inputPath(fields: Parameters, values: Values, path: string, at: string): InputPath {
	const keys = path.split('.');
	let parameter: Parameter = { kind: 'group', label: 'input', fields };
	let value: unknown = values;
	for (const [i, key] of keys.entries()) {
		const name = keys.slice(0, i + 1).join('.');
		const fields = fieldsOf(parameter, value);
		if (fields) parameter = fieldOf(fields, key, name, at);
		else if (parameter.kind === 'list' && Array.isArray(value) && /^\d+$/.test(key)) {
			if (Number(key) >= value.length)
				refuseInput(at, `${name}: the list has ${value.length} entries, counted from 0.`);
			parameter = parameter.of;
		} else refuseInput(at, `${name} is not an input of the method.`);
		value = Array.isArray(value) ? value[Number(key)] : isRecord(value) ? value[key] : undefined;
	}
	if (parameter.kind !== 'number' && parameter.kind !== 'integer')
		refuseInput(at, `${path} is not a number.`);
	const { range, kind } = parameter;
	return { path, keys, range, whole: kind === 'integer', value: value as number | undefined };
}

function fieldsOf(parameter: Parameter, value: unknown): Parameters | null {
	if (parameter.kind === 'group') return parameter.fields;
	if (parameter.kind !== 'variant' || !isRecord(value)) return null;
	return parameter.cases[value.kind as string]!.fields;
}

function fieldOf(fields: Parameters, key: string, name: string, at: string): Parameter {
	if (Object.hasOwn(fields, key)) return fields[key]!;
	const [near] = nearest(key, Object.keys(fields));
	refuseInput(at, `${name} is not there.${near === undefined ? '' : ` Is it ${near}?`}`);
}

/** Where in an input a number stands: in this group or list, under this name. */
export type Place = { holder: Record<string, unknown>; key: string };

/** A copy of the values in which these numbers can be written; what is left out on the way to one is made. */
export function withPlaces(
	values: Values,
	inputs: readonly InputPath[]
): { input: Values; places: Place[] } {
	const input = copied(values) as Record<string, unknown>;
	const places = inputs.map(({ keys }) => {
		let holder = input;
		for (const key of keys.slice(0, -1)) holder = (holder[key] ??= {}) as Record<string, unknown>;
		return { holder, key: keys.at(-1)! };
	});
	return { input, places };
}

function copied(part: unknown): unknown {
	if (Array.isArray(part)) return part.map(copied);
	if (!isRecord(part)) return part;
	return Object.fromEntries(Object.entries(part).map(([key, value]) => [key, copied(value)]));
}

export type OutputPath = { path: string; keys: readonly string[] };

/** A figure among a method's outputs; entries of lists are counted from 0. @throws Refused as `inputPath`. */
export function outputPath(fields: Parameters, path: string, at: string): OutputPath {
	const keys = path.split('.');
	let parameter: Parameter = { kind: 'group', label: 'outputs', fields };
	for (const [i, key] of keys.entries()) {
		const name = keys.slice(0, i + 1).join('.');
		if (parameter.kind === 'group') parameter = fieldOf(parameter.fields, key, name, at);
		else if (parameter.kind === 'list' && /^\d+$/.test(key)) parameter = parameter.of;
		else refuseInput(at, `${name} is not an output of the method.`);
	}
	if (!['number', 'integer', 'told'].includes(parameter.kind))
		refuseInput(at, `${path} is not a figure.`);
	return { path, keys };
}

/** @throws Refused where the outputs have no figure there, as some have only in some cases. */
export function outputAt(outputs: object, { path, keys }: OutputPath): Told {
	let part: unknown = outputs;
	for (const key of keys)
		part = typeof part === 'object' && part !== null ? (part as Values)[key] : undefined;
	if (part === undefined) throw new Refused(`There is no ${path} here.`);
	if (typeof part === 'number' && !Number.isFinite(part))
		throw new Refused(`${path} did not come to a number.`, { code: 'not-converged' });
	return part as Told;
}
