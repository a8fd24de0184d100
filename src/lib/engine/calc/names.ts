/** What may be a symbol, and what a name already means. */
import { CONSTANTS } from '../quantities/constants';
import { BODIES } from '../line/bodies';
import { isKept } from './functions';

/** Letters, digits and _; a dot is only written by line models. */
export const NAME = /\p{L}[\p{L}\p{Nd}_]*(?:\.\p{L}[\p{L}\p{Nd}_]*)*/uy;
const SYMBOL = /^\p{L}[\p{L}\p{Nd}_]*$/u;

export const OPERATOR_WORDS = ['and', 'or', 'not'];
const KEPT_WORDS = [...OPERATOR_WORDS, 'to', 'in', 'mod', 'xor', 'true', 'false', 'null'];

const LONGEST = 40;

/** Two ways to write one letter are one name: the micro sign is mu, the ohm sign omega. */
export const canonical = (name: string) => name.normalize('NFC').replaceAll('\u00b5', '\u03bc');

/** Why a text cannot name a quantity; null when it can. */
export function symbolTrouble(symbol: string): { message: string; remedy: string } | null {
	if (symbol.length > LONGEST) {
		return { message: `A symbol has at most ${LONGEST} characters.`, remedy: '' };
	}
	if (!SYMBOL.test(symbol)) {
		return {
			message: `“${symbol}” cannot be a symbol: a symbol is letters, digits and _, and begins with a letter.`,
			remedy: suggestion(symbol)
		};
	}
	if (CONSTANTS.has(symbol)) return taken(symbol, 'a constant');
	if (isKept(symbol)) return taken(symbol, 'a function');
	if (Object.hasOwn(BODIES, symbol) || symbol === 'sun') return taken(symbol, 'a body');
	if (KEPT_WORDS.includes(symbol)) return taken(symbol, 'a word of the expressions');
	return null;
}

const taken = (symbol: string, what: string) => ({
	message: `${symbol} is ${what} here and cannot name a quantity.`,
	remedy: `Add an index, e.g. ${symbol}_1.`
});

function suggestion(symbol: string): string {
	const fixed = symbol
		.trim()
		.replace(/[\s.\-−,]+/g, '_')
		.replace(/[^\p{L}\p{Nd}_]/gu, '');
	return SYMBOL.test(fixed) ? `Write ${fixed}.` : '';
}
