/** A verification in plain lines, for the terminal. */
import type { Tally } from './tally';
import type { Verification } from './verify';

export function verificationLines(name: string, found: Verification): string[] {
	const { quantities, text, evidence, titleBlock, digest, engine, milliseconds } = found;
	const tallies: [string, Tally][] = [
		['Quantities', quantities],
		['Text', text],
		['Evidence', evidence],
		['Title block', titleBlock]
	];
	return [
		`${name}: ${found.holds ? 'holds' : 'DOES NOT HOLD'}`,
		...tallies.map(([what, { agree, of, differ }]) =>
			[
				`  ${what.padEnd(12)}${agree} of ${of} agree`,
				...(differ.length > 0 ? [`differ: ${differ.join(', ')}`] : [])
			].join('; ')
		),
		`  ${'SHA-256'.padEnd(12)}${digest.agrees ? 'agrees' : 'differs'}`,
		`    stored    ${digest.stored}`,
		`    computed  ${digest.computed}`,
		`  ${'Engine'.padEnd(12)}frozen with version ${engine.frozenWith}, verified with version ${engine.now}`,
		`  ${'Took'.padEnd(12)}${milliseconds} ms`
	];
}
