/** Numbers as people type them into a field: "110", "1.2e-3", "100 000", "−4.5". */

export type TypedNumber =
	{ ok: true; value: number; digits: number } | { ok: false; message: string; remedy: string };

const SPACES = /[\s\u00a0\u2009\u202f]/g;
const PLAIN = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const GROUPED = /^[+-]?\d{1,3}([\s\u00a0\u2009\u202f]\d{3})+(\.\d*)?([eE][+-]?\d+)?$/;

export function parseNumber(text: string): TypedNumber {
	const typed = text.trim().replace(/[\u2212\u2013]/g, '-');
	if (GROUPED.test(typed) || PLAIN.test(typed)) {
		const plain = typed.replace(SPACES, '');
		const value = Number(plain);
		if (Math.abs(value) <= 1e300) return { ok: true, value: value + 0, digits: significant(plain) };
		return refuse(`${text.trim()} is larger than any figure used here (1e300).`, '');
	}
	const power = /^(.+?)\s*[×x·*]\s*10\^?([-+]?\d+)$/.exec(typed);
	if (power) {
		return refuse(`“${text.trim()}” is not read as a number.`, `Write ${power[1]}e${power[2]}.`);
	}
	if (typed.includes(',')) return refuse(...aboutComma(typed));
	return refuse(`“${text.trim()}” is not a number.`, 'Write a number such as 110 or 1.2e-3.');
}

const refuse = (message: string, remedy: string): TypedNumber => ({ ok: false, message, remedy });

function aboutComma(typed: string): [string, string] {
	const thousands = /^[+-]?\d{1,3}(,\d{3})+(\.\d*)?$/.test(typed) && /\.|,.*,/.test(typed);
	return [
		`“${typed}” has a comma, which is read neither as a decimal sign nor between thousands.`,
		`Write ${thousands ? typed.replaceAll(',', '') : typed.replace(',', '.')}.`
	];
}

/** Significant digits as typed: "20.0" has three, "0.0110" three, "100000" six. */
export function significant(plain: string): number {
	const mantissa = plain
		.replace(/[eE].*$/, '')
		.replace(/[^\d]/g, '')
		.replace(/^0+/, '');
	return Math.min(15, Math.max(1, mantissa.length));
}
