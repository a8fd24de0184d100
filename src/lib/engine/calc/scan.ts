/**
 * Reads the marks of an expression before mathjs parses its structure. Names, and numbers with their
 * units, become numbered leaves ($0, $1 …), so that every leaf knows where it stands in the text, a
 * unit is only ever read directly after a number, and no name of the user's reaches mathjs.
 *
 * A number and its unit are one thing: `100 km / 200 km/h` is a time. In mathjs's own reading the last
 * division would fall on the whole.
 */
import { scanUnit, type Unit } from '../quantities/unit-reader';
import { toSi } from '../quantities/units';
import { significant } from '../quantities/number';
import { Refusal, type Place } from './faults';
import { NAME, OPERATOR_WORDS, canonical } from './names';

export type Leaf = Place &
	(
		| { kind: 'name'; name: string; called: boolean }
		| { kind: 'literal'; number: number; digits: number; unit: Unit; si: number }
	);

export type Scanned = {
	/** What mathjs parses. */
	source: string;
	leaves: Leaf[];
	/** Where each character of the source came from. */
	origin: number[];
};

export const LONGEST_TEXT = 4000;
export const DEEPEST = 100;

const SPACE = /[\s\u00a0\u2009\u202f]/;
const GAP = /[\s\u00a0\u2009\u202f]*/y;
const NUMBER =
	/(?:\d{1,3}(?:[ \u00a0\u2009\u202f]\d{3})+(?!\d)|\d+)(?:\.\d*)?(?:[eE][+\-\u2212]?\d+)?|\.\d+(?:[eE][+\-\u2212]?\d+)?/y;
const RAISED = /⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/y;
const SIGNS: Record<string, string> = {
	'·': '*',
	'⋅': '*',
	'×': '*',
	'−': '-',
	'–': '-',
	'÷': '/',
	'≤': '<=',
	'≥': '>=',
	'≠': '!='
};
const TWO = ['<=', '>=', '==', '!='];
const ONE = '+-*/^()[]<>?:';

/** What an open parenthesis or bracket holds; commas part the last two. */
type Opened = 'group' | 'arguments' | 'list';

export function scan(text: string): Scanned {
	if (text.length > LONGEST_TEXT) {
		throw new Refusal('too-long', `The expression has more than ${LONGEST_TEXT} characters.`, {
			remedy: 'Split it into several calculations.'
		});
	}
	const scanner = new Scanner(text);
	scanner.run();
	return scanner;
}

class Scanner implements Scanned {
	source = '';
	leaves: Leaf[] = [];
	origin: number[] = [];
	private at = 0;
	private open: Opened[] = [];
	/** A bare number followed by "/" stands directly before. */
	private ratio = '';

	constructor(private text: string) {}

	run() {
		while (this.at < this.text.length) {
			const sign = this.text[this.at]!;
			if (SPACE.test(sign)) this.put(' ', 1);
			else if (this.number()) continue;
			else {
				if (sign !== '/') this.ratio = '';
				if (this.name() || this.raised()) continue;
				if (sign === ',') this.comma();
				else this.operator(sign);
			}
		}
	}

	private put(written: string, length: number) {
		for (let i = 0; i < written.length; i += 1) this.origin.push(this.at);
		this.source += written;
		this.at += length;
	}

	private leaf(leaf: Leaf) {
		this.put(`$${this.leaves.length}`, leaf.to - leaf.from);
		this.leaves.push(leaf);
	}

	private number(): boolean {
		const found = this.match(NUMBER, this.at);
		if (found === null) return false;
		const plain = found.replace(/[ \u00a0\u2009\u202f]/g, '').replace('\u2212', '-');
		const from = this.at;
		const end = from + found.length;
		const number = Number(plain);
		if (!(number <= 1e300)) {
			throw new Refusal('beyond-any-build', `${plain} is larger than any figure used here.`, {
				place: { from, to: end }
			});
		}
		const literal = this.unitAfter(end);
		if (!literal) {
			this.put(plain, found.length);
			const after = end + this.match(GAP, end)!.length;
			this.ratio = this.text[after] === '/' ? plain : '';
			return true;
		}
		const { unit, to } = literal;
		const place = { from, to };
		if (this.ratio !== '') {
			const written = this.text.slice(from, to);
			throw new Refusal('ambiguous-name', `${this.ratio}/${written} can be read in two ways.`, {
				remedy: `Write (${this.ratio}/${found}) ${unit.text} or ${this.ratio}/(${written}).`,
				place
			});
		}
		if (this.text[to] === '^') {
			throw new Refusal('syntax', `It is not clear what the power after ${unit.text} belongs to.`, {
				remedy: 'A power of a unit is a plain number; otherwise set parentheses.',
				place
			});
		}
		const digits = significant(plain);
		this.ratio = '';
		this.leaf({ kind: 'literal', number, digits, unit, si: toSi(number, unit), ...place });
		return true;
	}

	private unitAfter(end: number) {
		const from = end + this.match(GAP, end)!.length;
		const scanned = scanUnit(this.text, from, { tight: true });
		if (!scanned) return null;
		const after = scanned.to + this.match(GAP, scanned.to)!.length;
		const word = this.match(NAME, after) ?? '';
		const goesOn = /[\p{L}\d(]/u.test(this.text[after] ?? '') && !OPERATOR_WORDS.includes(word);
		if (scanned.unit.text.endsWith('%') && goesOn) {
			throw new Refusal('syntax', '“%” is the percent sign and stands behind its number.', {
				remedy: 'Write “*” after it to multiply.',
				place: { from: from, to: scanned.to }
			});
		}
		return scanned;
	}

	private name(): boolean {
		const found = this.match(NAME, this.at);
		if (found === null) return false;
		if (OPERATOR_WORDS.includes(found)) {
			this.put(` ${found} `, found.length);
			return true;
		}
		const to = this.at + found.length;
		const called = this.text[to] === '(';
		this.leaf({ kind: 'name', name: canonical(found), called, from: this.at, to });
		if (called) {
			this.enter('(', 'arguments');
		}
		return true;
	}

	private raised(): boolean {
		const found = this.match(RAISED, this.at);
		if (found === null) return false;
		const power = [...found].map((sign) => (sign === '⁻' ? '-' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign)));
		this.put(`^(${power.join('')})`, found.length);
		return true;
	}

	private comma() {
		const before = /\d+$/.exec(this.text.slice(0, this.at))?.[0];
		const after = /^\d+/.exec(this.text.slice(this.at + 1))?.[0];
		const place = { from: this.at, to: this.at + 1 };
		const parted = this.open.at(-1) ?? 'group';
		if (parted !== 'group') return this.put(',', 1);
		if (before && after) {
			throw new Refusal(
				'bad-number',
				`“${before},${after}”: a comma only parts the arguments of a function and the values of a list.`,
				{ remedy: `Write ${before}.${after} or ${before}${after}, as it is meant.`, place }
			);
		}
		throw new Refusal(
			'syntax',
			'A comma only parts the arguments of a function and the values of a list.',
			{ place }
		);
	}

	private operator(sign: string) {
		const pair = this.text.slice(this.at, this.at + 2);
		if (TWO.includes(pair)) return this.put(pair, 2);
		const written = SIGNS[sign] ?? sign;
		if (written !== sign) return this.put(written, 1);
		if (sign === '(') return this.enter('(', 'group');
		if (sign === '[') return this.enter('[', 'list');
		if (sign === ')' || sign === ']') this.open.pop();
		if (ONE.includes(sign)) return this.put(sign, 1);
		const place = { from: this.at, to: this.at + 1 };
		if (sign === '=') {
			throw new Refusal('not-allowed', '“=” does not belong in an expression.', {
				remedy: 'Write only what stands on the right of it; to compare, write ==.',
				place
			});
		}
		if (sign === '%') {
			throw new Refusal('syntax', '“%” is the percent sign and stands behind its number.', {
				place
			});
		}
		const shown = String.fromCodePoint(this.text.codePointAt(this.at)!);
		throw new Refusal('not-allowed', `“${shown}” has no place in an expression.`, { place });
	}

	private enter(sign: '(' | '[', opened: Opened) {
		this.open.push(opened);
		if (this.open.length > DEEPEST) {
			throw new Refusal(
				'too-long',
				`Parentheses and brackets are nested more than ${DEEPEST} deep.`,
				{
					remedy: 'Split it into several calculations.'
				}
			);
		}
		this.put(sign, 1);
	}

	private match(pattern: RegExp, from: number): string | null {
		pattern.lastIndex = from;
		return pattern.exec(this.text)?.[0] ?? null;
	}
}
