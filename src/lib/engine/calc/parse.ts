/** From the typed text to the closed tree. mathjs parses; only what is listed here gets through. */
import { CONSTANTS } from '../quantities/constants';
import { toSi } from '../quantities/units';
import { Refusal, type Place } from './faults';
import { functionNamed, isFunction, isKept } from './functions';
import { parseStructure, type Node } from './grammar';
import { DEEPEST, scan, type Leaf, type Scanned } from './scan';
import type { Arithmetic, Comparison, Expr } from './tree';

export type Parsed = {
	expr: Expr;
	/** Names that must be quantities of the note, in order of mention, each once. */
	names: string[];
	/** Names read as units, which must not be quantities of the note as well, with where they stand. */
	unitNames: (Place & { name: string })[];
};

export const MOST_NODES = 2000;

/** @throws Refusal in words. */
export function parse(text: string): Parsed {
	const scanned = scan(text);
	const expr = new Builder(text, scanned).build(structure(text, scanned), 0);
	const leaves = scanned.leaves;
	return {
		expr,
		names: unique(leaves.flatMap(quantityName)),
		unitNames: leaves.flatMap((leaf) => (leaf.kind === 'literal' ? leaf.unit.names : []))
	};
}

const unique = (names: string[]) => [...new Set(names)];

function quantityName(leaf: Leaf): string[] {
	if (leaf.kind !== 'name' || CONSTANTS.has(leaf.name)) return [];
	return leaf.called && isFunction(leaf.name) ? [] : [leaf.name];
}

function structure(text: string, { source, origin }: Scanned): Node {
	try {
		return parseStructure(source);
	} catch (error) {
		if (error instanceof RangeError) throw tooDeep();
		const { message, char } = error as { message: string; char?: number };
		const from = origin[Math.max(0, (char ?? 1) - 1)] ?? text.length;
		throw inOwnWords(text, message, from);
	}
}

function inOwnWords(text: string, message: string, from: number): Refusal {
	const rest = text.slice(from).trimStart();
	const start = text.length - text.slice(from).trimStart().length;
	const piece = /^([\p{L}_][\p{L}\p{Nd}_]*|[\d.]+|.)/u.exec(rest)?.[0] ?? '';
	const place = piece === '' ? null : { from: start, to: start + piece.length };
	if (/end of expression|Value expected/.test(message) && piece === '') {
		const last = /(\S)\s*$/.exec(text)?.[1] ?? '';
		return new Refusal('syntax', `Something is missing after “${last}”.`);
	}
	if (/Parenthesis/.test(message)) {
		const opened = text.split('(').length > text.split(')').length;
		if (opened) return new Refusal('syntax', 'A closing parenthesis is missing.', { place });
	}
	if (piece === ')' && text.split(')').length > text.split('(').length) {
		return new Refusal('syntax', 'A parenthesis is closed that was not opened.', { place });
	}
	const brackets = text.split('[').length - text.split(']').length;
	if (brackets > 0 && /\] expected/.test(message)) {
		return new Refusal('syntax', 'A closing bracket is missing.', { place });
	}
	if (brackets < 0 && piece === ']') {
		return new Refusal('syntax', 'A bracket is closed that was not opened.', { place });
	}
	if (/Value expected/.test(message)) {
		return new Refusal('syntax', `Something is missing before “${piece}”.`, { place });
	}
	if (/False part/.test(message)) {
		return new Refusal('syntax', 'The condition says only what holds if it is met.', {
			remedy: 'Write condition ? value : other value.'
		});
	}
	const remedy = piece === '[' ? 'To multiply, write * before it.' : '';
	return new Refusal('syntax', `“${piece}” cannot stand here.`, { remedy, place });
}

const tooDeep = () =>
	new Refusal('too-long', `The expression is nested more than ${DEEPEST} deep.`, {
		remedy: 'Split it into several calculations.'
	});

const ARITHMETIC: Record<string, Arithmetic> = {
	add: '+',
	subtract: '-',
	multiply: '*',
	divide: '/',
	pow: '^'
};
const COMPARISON: Record<string, Comparison> = {
	smaller: '<',
	smallerEq: '<=',
	larger: '>',
	largerEq: '>=',
	equal: '==',
	unequal: '!='
};

class Builder {
	private count = 0;

	constructor(
		private text: string,
		private scanned: Scanned
	) {}

	build(node: Node, depth: number): Expr {
		this.count += 1;
		if (depth > DEEPEST) throw tooDeep();
		if (this.count > MOST_NODES) {
			throw new Refusal('too-long', `The expression has more than ${MOST_NODES} parts.`, {
				remedy: 'Split it into several calculations.'
			});
		}
		const sub = (child: Node) => this.build(child, depth + 1);
		switch (node.type) {
			case 'ConstantNode':
				if (typeof node.value === 'number' && Number.isFinite(node.value)) {
					return { kind: 'number', value: node.value };
				}
				throw notAllowed();
			case 'ParenthesisNode':
				return sub(node.content!);
			case 'SymbolNode':
				return this.leaf(node.name!);
			case 'FunctionNode':
				return this.call(node, sub);
			case 'OperatorNode':
				return operation(node, sub);
			case 'RelationalNode':
				return chain(node, sub);
			case 'ConditionalNode':
				return {
					kind: 'choose',
					condition: sub(node.condition!),
					yes: sub(node.trueExpr!),
					no: sub(node.falseExpr!)
				};
			case 'ArrayNode':
				return list(node, sub);
			case 'AccessorNode':
				return pick(node, sub);
			default:
				throw notAllowed();
		}
	}

	private leafAt(placeholder: string): Leaf {
		const leaf = /^\$\d+$/.test(placeholder)
			? this.scanned.leaves[Number(placeholder.slice(1))]
			: undefined;
		if (!leaf) throw notAllowed();
		return leaf;
	}

	private leaf(placeholder: string): Expr {
		const leaf = this.leafAt(placeholder);
		const place: Place = { from: leaf.from, to: leaf.to };
		if (leaf.kind === 'literal') {
			const { number, digits, unit, si } = leaf;
			return { kind: 'literal', number, digits, unit, si, place };
		}
		const { name } = leaf;
		const constant = CONSTANTS.get(name);
		if (constant) return { kind: 'constant', name, constant, place };
		if (isKept(name)) {
			throw new Refusal('syntax', `${name} is a function and needs its argument.`, {
				remedy: `Write ${name}(…).`,
				place
			});
		}
		return { kind: 'name', name, place };
	}

	private call(node: Node, sub: (child: Node) => Expr): Expr {
		const leaf = this.leafAt((node.fn as Node).name ?? '');
		const place: Place = { from: leaf.from, to: leaf.to };
		if (leaf.kind === 'literal') {
			const written = this.text.slice(leaf.from, leaf.to);
			throw new Refusal('syntax', `“${written}” stands directly before a parenthesis.`, {
				remedy: `Write ${written} * (…).`,
				place
			});
		}
		const { name } = leaf;
		if (!isFunction(name)) {
			throw new Refusal('unknown-function', `${name} is not a function known here.`, {
				remedy: `To multiply, write ${name} * (…).`,
				place,
				near: []
			});
		}
		const args = node.args!.map(sub);
		const [fewest, most] = functionNamed(name).takes;
		if (args.length < fewest || args.length > most) {
			const wanted = fewest === most ? `${fewest}` : `${fewest} to ${most}`;
			const noun = wanted === '1' ? 'argument' : 'arguments';
			throw new Refusal('syntax', `${name} takes ${wanted} ${noun}, not ${args.length}.`, {
				place
			});
		}
		return { kind: 'call', name, args, place };
	}
}

/** The sign of a temperature on a scale with its own zero belongs to the figure: -20 °C lies below 0 °C. */
function negative(of: Expr): Expr {
	if (of.kind !== 'literal' || of.unit.offset === 0) return { kind: 'negate', of };
	return { ...of, number: -of.number, si: toSi(-of.number, of.unit) };
}

function operation(node: Node, sub: (child: Node) => Expr): Expr {
	const fn = String(node.fn);
	const [first, second] = node.args!;
	if (fn === 'unaryMinus') return negative(sub(first!));
	if (fn === 'unaryPlus') return sub(first!);
	if (fn === 'not') return { kind: 'not', of: sub(first!) };
	if (Object.hasOwn(ARITHMETIC, fn)) {
		return { kind: 'binary', op: ARITHMETIC[fn]!, left: sub(first!), right: sub(second!) };
	}
	if (Object.hasOwn(COMPARISON, fn)) {
		return { kind: 'compare', op: COMPARISON[fn]!, left: sub(first!), right: sub(second!) };
	}
	if (fn === 'and' || fn === 'or') {
		return { kind: 'logic', op: fn, left: sub(first!), right: sub(second!) };
	}
	throw notAllowed();
}

function list(node: Node, sub: (child: Node) => Expr): Expr {
	if (node.items!.length > 0) return { kind: 'list', items: node.items!.map(sub) };
	throw new Refusal('syntax', 'A list has at least one value.', { remedy: 'Write [1 km, 2 km].' });
}

function pick(node: Node, sub: (child: Node) => Expr): Expr {
	const [index, ...more] = node.index!.dimensions!;
	if (index && more.length === 0) return { kind: 'pick', of: sub(node.object!), index: sub(index) };
	throw new Refusal('syntax', 'A value of a list is named by one number.', {
		remedy: 'The first value of x is x[1].'
	});
}

/** a < b < c is a < b and b < c. */
function chain(node: Node, sub: (child: Node) => Expr): Expr {
	const parts = node.params!.map(sub);
	return node
		.conditionals!.map((fn, i): Expr => ({
			kind: 'compare',
			op: COMPARISON[fn]!,
			left: parts[i]!,
			right: parts[i + 1]!
		}))
		.reduce((left, right): Expr => ({ kind: 'logic', op: 'and', left, right }));
}

const notAllowed = () =>
	new Refusal('not-allowed', 'This is no expression of numbers, units, symbols and functions.', {
		remedy:
			'Use + − * / ^, parentheses, comparisons, lists [1, 2] and the functions offered while typing.'
	});
