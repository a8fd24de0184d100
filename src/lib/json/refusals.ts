/** Why a body of JSON is not taken, in words: shared by the API and the command line. */
import type { core } from 'zod';

/** Levels of lists and objects within each other: a note's prose and the inputs of studies need a tenth. */
export const DEEPEST = 200;

/** Whether it is nested more deeply than anything asked for. Attack stopped here: exhausting the call stack. */
export function isTooDeep(json: unknown): boolean {
	let level = [json];
	for (let depth = 0; level.length > 0; depth += 1) {
		if (depth > DEEPEST) return true;
		level = level.flatMap((part) =>
			typeof part === 'object' && part !== null ? Object.values(part) : []
		);
	}
	return false;
}

export type Misfit = { field: string; message: string };

/** All that does not fit a schema, each with its place. */
export const misfitsOf = ({ issues }: { issues: readonly core.$ZodIssue[] }): Misfit[] =>
	issues.map(({ path, message }) => ({ field: path.join('.'), message }));

/** As sentences. A message that is one already says what it is about. */
export const inSentences = (misfits: readonly Misfit[]): string =>
	misfits
		.map(({ field, message }) =>
			/[.?!]$/.test(message) ? message : `${field || 'The whole'}: ${message}.`
		)
		.join(' ');
