/** A method: one named computation with its description, and the door through which it is called. */
import { ENGINE_VERSION } from '../version';
import { checkInputs } from './check';
import type { Parameters, ValuesOf } from './parameter';
import { Refused, type Refusal } from './refused';

export type Description = {
	/** As it is called, in lower case with hyphens, e.g. "stepped-line". */
	name: string;
	title: string;
	/** What it answers, in a sentence or two. */
	summary: string;
	subject: 'line' | 'motion' | 'release' | 'materials' | 'studies' | 'budgets';
	inputs: Parameters;
	outputs: Parameters;
	/** The published methods, laws and standards behind it. */
	sources: readonly string[];
	/** Under which conditions the result holds: frame, idealisations, range. */
	validity: string;
	leftOut: readonly string[];
	/** What it refuses, so that a caller can know beforehand. */
	refuses: readonly string[];
	/** What must stand beside a result that could hurt somebody; empty where there is nothing. */
	caution: string;
};

export type Method<I extends Parameters = Parameters, O extends Parameters = Parameters> = Omit<
	Description,
	'inputs' | 'outputs'
> & {
	inputs: I;
	outputs: O;
	/**
	 * Outputs that cost much may be getters, for a study reads only some.
	 * @throws Refused
	 */
	run(input: ValuesOf<I>): { outputs: ValuesOf<O>; warnings?: string[] };
	/**
	 * The outputs of `run` for many inputs that are as this one but for what `varies`, which tells of each
	 * input by its name: what does not hang on those is found once and kept. Null where nothing can be kept.
	 */
	prepare?(
		input: ValuesOf<I>,
		varies: (name: string) => boolean
	): ((input: ValuesOf<I>) => ValuesOf<O>) | null;
};

export type AnyMethod = Description & {
	run(input: never): { outputs: object; warnings?: string[] };
	prepare?(input: never, varies: (name: string) => boolean): ((input: never) => object) | null;
};

export type Answer<O = Record<string, unknown>> =
	| { ok: true; method: string; engine: string; outputs: O; warnings: string[] }
	| { ok: false; method: string; engine: string; refusal: Refusal };

export const defineMethod = <const I extends Parameters, const O extends Parameters>(
	method: Method<I, O>
): Method<I, O> => method;

/**
 * Calls a method on what came in from outside: checks it, fills in defaults, and turns every reason for
 * which there is no result into a typed refusal. Values are in SI, inputs and outputs alike.
 */
export function answer<M extends AnyMethod>(
	method: M,
	input: unknown
): Answer<ReturnType<M['run']>['outputs']> {
	const about = { method: method.name, engine: ENGINE_VERSION };
	const refuse = (refusal: Refusal) => ({ ok: false as const, ...about, refusal });
	const checked = checkInputs(method.inputs, input);
	if (!checked.ok) {
		const message = checked.faults.map((fault) => fault.message).join(' ');
		return refuse({ code: 'input', message, remedy: '', faults: checked.faults });
	}
	try {
		const found = method.run(checked.values as never);
		// Plain figures, also of outputs that are computed when they are read.
		const read = found.outputs as Record<string, unknown>;
		const outputs = Object.fromEntries(
			Object.keys(method.outputs).flatMap((name) =>
				read[name] === undefined ? [] : [[name, read[name]]]
			)
		);
		const { warnings = [] } = found;
		const lost = notFinite(outputs);
		if (lost !== null)
			return refuse({
				code: 'not-converged',
				message: `${method.title}: ${lost} did not come to a number for these inputs.`,
				remedy: 'Look at the inputs for values far out of the ordinary.',
				faults: []
			});
		return { ok: true, ...about, outputs: outputs as typeof found.outputs, warnings };
	} catch (error) {
		if (error instanceof Refused) return refuse(error.refusal);
		throw error;
	}
}

/** The path of the first number that is none; null when all are. It is put together only when there is one. */
function notFinite(outputs: object): string | null {
	for (const key in outputs) {
		const part = (outputs as Record<string, unknown>)[key];
		if (typeof part === 'number' && !Number.isFinite(part)) return key;
		if (typeof part !== 'object' || part === null) continue;
		const lost = notFinite(part);
		if (lost !== null) return `${key}.${lost}`;
	}
	return null;
}
