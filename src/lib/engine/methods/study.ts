/** What all studies of a method share: which method, its input, and the figures that are looked at. */
import type { Model } from '../studies/model';
import { nearest } from '../calc/near';
import { checkInputs, fits, outOfRange } from './check';
import type { AnyMethod } from './method';
import { list, open, text } from './parameter';
import { Refused, refuseInput } from './refused';
import {
	inputPath,
	outputAt,
	outputPath,
	withPlaces,
	type InputPath,
	type OutputPath
} from './value-path';

/** Methods that a study may act on: all but the studies. */
export type Studied = ReadonlyMap<string, AnyMethod>;

export const studyInputs = {
	method: text({ label: 'method', longest: 100, help: 'Its name; any method but the studies.' }),
	input: open({ label: 'its input', help: 'As the method takes it when called alone, in SI.' })
} as const;

export const inputName = (label: string) =>
	text({ label, longest: 200, help: 'Its path in the input, e.g. masses.0.mass.' });

export const outputNames = list({
	label: 'outputs looked at',
	fewest: 1,
	most: 20,
	of: text({
		label: 'output',
		longest: 200,
		help: 'Its path, e.g. counterweight or rows.0.stress.'
	})
});

export type Subject = {
	method: AnyMethod;
	/** The input, checked, defaults filled in. */
	values: Readonly<Record<string, unknown>>;
};

/** @throws Refused where there is no such method, or its input is at fault. */
export function subjectOf(
	methods: Studied,
	{ method: name, input }: { method: string; input: unknown }
): Subject {
	const method = methods.get(name);
	if (!method) {
		const [near] = nearest(name, methods.keys());
		const hint = near === undefined ? '' : ` Is it ${near}?`;
		refuseInput('method', `There is no method “${name}” that a study can act on.${hint}`);
	}
	const checked = checkInputs(method.inputs, input);
	if (checked.ok) return { method, values: checked.values };
	const faults = checked.faults.map(({ path, message }) => ({
		path: path === '' ? 'input' : `input.${path}`,
		message
	}));
	throw new Refused(faults.map(({ message }) => message).join(' '), { code: 'input', faults });
}

export const inputsNamed = ({ method, values }: Subject, paths: readonly string[], at: string) =>
	paths.map((path, i) => inputPath(method.inputs, values, path, `${at}.${i}`));

export const outputsNamed = ({ method }: Subject, paths: readonly string[], at: string) =>
	paths.map((path, i) => outputPath(method.outputs, path, `${at}.${i}`));

/**
 * What the method answers with some inputs replaced. Outputs are to be read before the next are asked for: the
 * input is one object, written anew each time.
 * @throws Refused also where an input is out of its range.
 */
export function outputsWith(
	{ method, values }: Subject,
	inputs: readonly InputPath[]
): (x: ArrayLike<number>) => object {
	const { input, places } = withPlaces(values, inputs);
	const varying = new Set(inputs.map(({ keys }) => keys[0]!));
	const prepared = method.prepare?.(input as never, (name) => varying.has(name));
	const run = prepared ?? ((input: never) => method.run(input).outputs);
	return (x) => {
		for (let i = 0; i < inputs.length; i += 1) {
			const value = x[i]!;
			const { range, whole } = inputs[i]!;
			if (!fits(range, value) || (whole && !Number.isSafeInteger(value))) refuse(inputs[i]!, value);
			const { holder, key } = places[i]!;
			holder[key] = value;
		}
		return run(input as never);
	};
}

function refuse({ path, range }: InputPath, value: number): never {
	refuseInput(
		path,
		`${path} must be ${outOfRange(range, value) ?? 'a whole number'}; it is ${value}.`
	);
}

/** The method as a model of a study. A figure above 1e300 is refused, for there are no statistics of it. */
export function modelOf(
	subject: Subject,
	inputs: readonly InputPath[],
	outputs: readonly OutputPath[]
): Model {
	const outputsAt = outputsWith(subject, inputs);
	return (x, y) => {
		const found = outputsAt(x);
		for (let k = 0; k < outputs.length; k += 1) {
			const figure = outputAt(found, outputs[k]!);
			if (typeof figure !== 'number')
				throw new Refused(`${outputs[k]!.path} is above 1e300.`, { code: 'beyond-any-build' });
			y[k] = figure;
		}
	};
}
