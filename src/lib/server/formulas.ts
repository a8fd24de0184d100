import katex from 'katex';
import { KATEX, type SetFormulas } from '$lib/typeset';

/**
 * Sets every formula in what a page is given, so that a page which is only read goes without KaTeX in
 * the browser. A formula stands under `tex` or `symbolTex`, among `symbols`, or as the text of a
 * "formula" token.
 */
export function setFormulas(given: unknown): SetFormulas {
	const formulas: Record<string, string> = {};
	for (const tex of texIn(given)) formulas[tex] ??= katex.renderToString(tex, KATEX);
	return formulas;
}

function* texIn(given: unknown): Generator<string> {
	if (typeof given !== 'object' || given === null) return;
	const entries = given instanceof Map ? [...given] : Object.entries(given);
	const { kind, text } = given as { kind?: unknown; text?: unknown };
	if (kind === 'formula' && typeof text === 'string') yield text;
	for (const [name, value] of entries) {
		if ((name === 'tex' || name === 'symbolTex') && typeof value === 'string') yield value;
		else if (name === 'symbols') yield* Object.values(value as Record<string, string>);
		else yield* texIn(value);
	}
}
