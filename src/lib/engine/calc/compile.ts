/** From the closed tree to a closure over plain SI floats. */
import { Refusal } from './faults';
import { functionNamed } from './functions';
import { asText } from './print';
import { fixedFigure, placeOf, type Comparison, type Expr } from './tree';

/** Reads the values of names by their place in the list given to `compile`. */
export type Program = (values: ArrayLike<number>) => number;

/** The largest figure that is told. */
export const LARGEST = 1e300;

export function compile(expr: Expr, names: readonly string[]): Program {
	const value = (child: Expr): Program => compile(child, names);
	const figure = fixedFigure(expr);
	if (figure !== null) return () => figure;
	switch (expr.kind) {
		case 'name': {
			const slot = names.indexOf(expr.name);
			return (values) => values[slot]!;
		}
		case 'negate': {
			const of = value(expr.of);
			return (values) => -of(values);
		}
		case 'binary':
			return arithmetic(expr, value(expr.left), value(expr.right));
		case 'choose': {
			const met = compileCondition(expr.condition, value);
			const [yes, no] = [value(expr.yes), value(expr.no)];
			return (values) => (met(values) ? yes(values) : no(values));
		}
		case 'call':
			return call(expr, expr.args.map(value));
		default:
			throw new Error('Neither a condition nor a list is one value.');
	}
}

/** A condition over whatever `valueOf` makes its sides read from. */
export function compileCondition<V>(
	expr: Expr,
	valueOf: (expr: Expr) => (values: V) => number
): (values: V) => boolean {
	if (expr.kind === 'not') {
		const of = compileCondition(expr.of, valueOf);
		return (values) => !of(values);
	}
	if (expr.kind === 'logic') {
		const left = compileCondition(expr.left, valueOf);
		const right = compileCondition(expr.right, valueOf);
		if (expr.op === 'and') return (values) => left(values) && right(values);
		return (values) => left(values) || right(values);
	}
	if (expr.kind !== 'compare') throw new Error('A value is no condition.');
	const [left, right] = [valueOf(expr.left), valueOf(expr.right)];
	const holds = COMPARE[expr.op];
	return (values) => holds(left(values), right(values));
}

const COMPARE: Record<Comparison, (a: number, b: number) => boolean> = {
	'<': (a, b) => a < b,
	'<=': (a, b) => a <= b,
	'>': (a, b) => a > b,
	'>=': (a, b) => a >= b,
	'==': (a, b) => a === b,
	'!=': (a, b) => a !== b
};

/** The operation with all that it checks. */
export function arithmetic(
	expr: Expr & { kind: 'binary' },
	left: Program,
	right: Program
): Program {
	switch (expr.op) {
		case '+':
			return (values) => told(left(values) + right(values), expr);
		case '-':
			return (values) => told(left(values) - right(values), expr);
		case '*':
			return (values) => told(left(values) * right(values), expr);
		case '/':
			return (values) => {
				const divisor = right(values);
				if (divisor === 0) throw divisionByZero(expr.right);
				return told(left(values) / divisor, expr);
			};
		case '^':
			return (values) => raise(left(values), right(values), expr);
	}
}

function raise(base: number, exponent: number, expr: Expr & { kind: 'binary' }): number {
	if (base === 0 && exponent < 0) throw divisionByZero(expr.left);
	if (base < 0 && !Number.isInteger(exponent)) {
		throw new Refusal(
			'domain',
			`${asText(expr.left)} is negative here: it has no real power ${asText(expr.right)}.`,
			{ place: placeOf(expr) }
		);
	}
	return told(base ** exponent, expr);
}

/** The function with all that it checks. */
export function call(expr: Expr & { kind: 'call' }, args: Program[]): Program {
	const { evaluate, domain } = functionNamed(expr.name);
	const checked = (...given: number[]) => {
		if (domain && !domain.holds(...given)) throw outOfDomain(expr, domain.words);
		return told(evaluate(...given), expr);
	};
	const [first, second] = args;
	if (args.length === 1) return (values) => checked(first!(values));
	if (args.length === 2) return (values) => checked(first!(values), second!(values));
	return (values) => checked(...args.map((arg) => arg(values)));
}

/** Passes a figure on if it can be told. */
export function told(value: number, expr: Expr): number {
	if (value <= LARGEST && value >= -LARGEST) return value;
	throw new Refusal('beyond-any-build', `${asText(expr)} is beyond any build: above 1e300.`, {
		remedy: 'Look at the exponents and the units of what goes into it.',
		place: placeOf(expr)
	});
}

const divisionByZero = (divisor: Expr) =>
	new Refusal('division-by-zero', `Division by zero: ${asText(divisor)} is 0.`, {
		place: placeOf(divisor)
	});

export const outOfDomain = (expr: Expr & { kind: 'call' }, words: string) => {
	const args = expr.args.map(asText).join(', ');
	return new Refusal('domain', `${expr.name}(${args}) has no value here: ${words}.`, {
		place: placeOf(expr)
	});
};
