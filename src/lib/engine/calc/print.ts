/** An expression back in print: as plain text for the words of a fault, as TeX for the sheet. */
import { unitText } from '../quantities/format';
import { nameTex, numberTex, unitTex } from './tex';
import { functionNamed } from './functions';
import type { Comparison, Expr } from './tree';

type Notation = {
	number(value: number): string;
	literal(number: number, unit: string): string;
	name(name: string): string;
	constant(expr: Expr & { kind: 'constant' }): string;
	power(base: string, exponent: string): string;
	minus: string;
	times(left: Expr, right: Expr): string;
	compare(op: Comparison): string;
	/** "and", "or" between two conditions; "not" before one. */
	between(word: string): string;
	not: string;
	group(inner: string): string;
	choose(condition: string, yes: string, no: string): string;
	call(expr: Expr & { kind: 'call' }, args: string[]): string;
	list(values: string[]): string;
	pick(of: string, index: string): string;
};

/** How tightly each form binds; a looser one inside a tighter one is set in parentheses. */
const LEVEL = {
	choose: 0,
	or: 1,
	and: 2,
	compare: 3,
	sum: 4,
	product: 5,
	call: 6,
	leaf: 7
};

const OPERATOR_WORDS = { '<': '<', '<=': '≤', '>': '>', '>=': '≥', '==': '==', '!=': '≠' };

const TEXT: Notation = {
	number: (value) => String(value).replace('-', '−'),
	literal: (number, unit) =>
		`${TEXT.number(number)}${unit === '°' ? '' : '\u202f'}${unitText(unit)}`,
	name: (name) => name,
	constant: ({ name }) => name,
	power: (base, exponent) => `${base}^${exponent}`,
	minus: '−',
	times: () => '·',
	compare: (op) => ` ${OPERATOR_WORDS[op]} `,
	between: (word) => ` ${word} `,
	not: 'not ',
	group: (inner) => `(${inner})`,
	choose: (condition, yes, no) => `${condition} ? ${yes} : ${no}`,
	call: ({ name }, args) => `${name}(${args.join(', ')})`,
	list: (values) => `[${values.join(', ')}]`,
	pick: (of, index) => `${of}[${index}]`
};

const OPERATOR_TEX = { '<': '<', '<=': '\\le', '>': '>', '>=': '\\ge', '==': '=', '!=': '\\ne' };

const TEX: Notation = {
	number: numberTex,
	literal: (number, unit) => `${numberTex(number)}\\,${unitTex(unit)}`,
	name: nameTex,
	constant: ({ constant }) => constant.tex,
	power: (base, exponent) => `${base}^{${exponent}}`,
	minus: '-',
	times: (left, right) =>
		edge(right, 'left').kind === 'number' ||
		edge(right, 'left').kind === 'literal' ||
		edge(left, 'right').kind === 'literal'
			? ' \\cdot '
			: '\\,',
	compare: (op) => ` ${OPERATOR_TEX[op]} `,
	between: (word) => `\\ \\text{${word}}\\ `,
	not: '\\text{not}\\ ',
	group: (inner) => `(${inner})`,
	choose: (condition, yes, no) => `${yes}\\ \\text{if}\\ ${condition},\\ \\text{otherwise}\\ ${no}`,
	call: (expr, args) => {
		if (expr.name === 'sqrt') return `\\sqrt{${args[0]}}`;
		if (expr.name === 'cbrt') return `\\sqrt[3]{${args[0]}}`;
		if (expr.name === 'abs') return `\\left|${args[0]}\\right|`;
		if (expr.name === 'log' && args[1]) return `\\log_{${args[1]}}(${args[0]})`;
		const name = functionNamed(expr.name).tex ?? `\\operatorname{${expr.name}}`;
		return `${name}(${args.join(',\\,')})`;
	},
	list: (values) => `[${values.join(',\\;')}]`,
	pick: (of, index) => `${of}[${index}]`
};

const LONGEST = 60;

export function asText(expr: Expr): string {
	const text = print(expr, TEXT);
	return text.length > LONGEST ? `${text.slice(0, LONGEST - 1)}…` : text;
}

export const asTex = (expr: Expr): string => print(expr, TEX);

/** The first or last leaf of a product, which decides how it is set beside its neighbour. */
function edge(expr: Expr, side: 'left' | 'right'): Expr {
	if (expr.kind === 'binary' && '*/^'.includes(expr.op)) {
		return edge(side === 'left' || expr.op === '^' ? expr.left : expr.right, side);
	}
	return expr;
}

function print(expr: Expr, notation: Notation): string {
	const within = (level: number, child: Expr) => {
		const text = print(child, notation);
		return levelOf(child) < level ? notation.group(text) : text;
	};
	switch (expr.kind) {
		case 'number':
			return notation.number(expr.value);
		case 'literal':
			return notation.literal(expr.number, expr.unit.text);
		case 'name':
			return notation.name(expr.name);
		case 'constant':
			return notation.constant(expr);
		case 'negate': {
			const of = within(LEVEL.product, expr.of);
			return notation.minus + (of.startsWith(notation.minus) ? notation.group(of) : of);
		}
		case 'binary':
			return binary(expr, notation, within);
		case 'compare':
			return (
				within(LEVEL.sum, expr.left) + notation.compare(expr.op) + within(LEVEL.sum, expr.right)
			);
		case 'logic': {
			const level = LEVEL[expr.op];
			return within(level, expr.left) + notation.between(expr.op) + within(level + 1, expr.right);
		}
		case 'not':
			return notation.not + within(LEVEL.leaf, expr.of);
		case 'choose':
			return notation.choose(
				within(LEVEL.or, expr.condition),
				within(LEVEL.or, expr.yes),
				within(LEVEL.choose, expr.no)
			);
		case 'call':
			return notation.call(
				expr,
				expr.args.map((arg) => print(arg, notation))
			);
		case 'list':
			return notation.list(expr.items.map((item) => print(item, notation)));
		case 'pick':
			return notation.pick(
				within(expr.of.kind === 'number' ? Infinity : LEVEL.leaf, expr.of),
				print(expr.index, notation)
			);
	}
}

function binary(
	expr: Expr & { kind: 'binary' },
	notation: Notation,
	within: (level: number, child: Expr) => string
): string {
	const { left, right } = expr;
	// A sign behind another one is set in parentheses: a − (−b).
	const unsigned = (level: number, child: Expr) => {
		const text = within(level, child);
		return text.startsWith(notation.minus) ? notation.group(text) : text;
	};
	switch (expr.op) {
		case '+':
			return `${within(LEVEL.sum, left)} + ${unsigned(LEVEL.product, right)}`;
		case '-':
			return `${within(LEVEL.sum, left)} ${notation.minus} ${unsigned(LEVEL.product, right)}`;
		case '*':
			return within(LEVEL.product, left) + notation.times(left, right) + within(LEVEL.call, right);
		case '/': {
			const over = within(LEVEL.product, left);
			// 1/2 km can be read in two ways, and is not read at all.
			const clear = right.kind === 'literal' && /\d$/.test(over) ? LEVEL.leaf : LEVEL.call;
			return `${over}/${within(clear, right)}`;
		}
		case '^': {
			// In TeX the exponent is set small and raised, which is parenthesis enough.
			const exponent = notation === TEX ? print(right, notation) : within(LEVEL.leaf, right);
			return notation.power(within(LEVEL.leaf, left), exponent);
		}
	}
}

function levelOf(expr: Expr): number {
	switch (expr.kind) {
		case 'choose':
			return LEVEL.choose;
		case 'logic':
			return LEVEL[expr.op];
		case 'compare':
			return LEVEL.compare;
		case 'negate':
		case 'not':
			return LEVEL.product;
		case 'binary':
			return {
				'+': LEVEL.sum,
				'-': LEVEL.sum,
				'*': LEVEL.product,
				'/': LEVEL.product,
				'^': LEVEL.call
			}[expr.op];
		case 'call':
			return ['sqrt', 'cbrt', 'abs'].includes(expr.name) ? LEVEL.leaf : LEVEL.call;
		case 'number':
			return expr.value < 0 ? LEVEL.sum : LEVEL.leaf;
		case 'literal':
			// 2 km², squared as a whole, needs its parentheses.
			return LEVEL.call;
		default:
			return LEVEL.leaf;
	}
}
