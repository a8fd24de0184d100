/** Reads the JSON that a command is given, and tells in one way why a command has no answer. */
import { readFileSync } from 'node:fs';
import { DEEPEST, isTooDeep } from '../../src/lib/json/refusals';

/** Ends a command with 2: words for the person, the problem for a program. */
export class CommandRefused extends Error {
	constructor(
		message: string,
		readonly details: Record<string, unknown> = {}
	) {
		super(message);
	}
}

/** @param file a path, or "-" for what is piped in */
export function readJson(file: string | undefined): unknown {
	if (file === undefined) throw new CommandRefused('Name a JSON file, or - to read from the pipe.');
	let text: string;
	try {
		text = readFileSync(file === '-' ? 0 : file, 'utf8');
	} catch (error) {
		throw new CommandRefused(`${file} cannot be read: ${(error as Error).message}.`);
	}
	const what = file === '-' ? 'What was piped in' : file;
	let json: unknown;
	try {
		json = JSON.parse(text.replace(/^\uFEFF/, ''));
	} catch {
		throw new CommandRefused(`${what} is not JSON.`);
	}
	if (isTooDeep(json))
		throw new CommandRefused(`${what} is nested more than ${DEEPEST} levels deep.`);
	return json;
}

/** Prints the answer as JSON and ends with 0; a refusal in words on the error output, ending with 2. */
export function answerOnStdout(work: () => unknown): void {
	try {
		console.log(JSON.stringify(work(), null, '\t'));
	} catch (error) {
		if (!(error instanceof CommandRefused)) throw error;
		const { message, details } = error;
		const problem = { type: 'about:blank', title: 'No answer', status: 422, detail: message };
		console.log(JSON.stringify({ ...problem, ...details }, null, '\t'));
		console.error(message);
		process.exitCode = 2;
	}
}
