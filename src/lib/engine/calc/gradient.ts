/**
 * The slopes of an expression by the names in it, exact, by reverse accumulation over the closed tree:
 * one way up for the figures of all parts, one way down for what each part does to the whole.
 *
 * Of a choice the branch taken counts. A slope that is not finite comes out as such. Corners and steps: see `slopes`.
 */
import { functionNamed } from './functions';
import { SLOPES } from './slopes';
import { compile, compileCondition } from './compile';
import { fixedFigure, type Expr } from './tree';

/** Writes the slope by each name, in the order of the list given to `compileGradient`. */
export type Gradient = (values: ArrayLike<number>, slopes: Float64Array) => void;

/** A part that remembers its figure from the way up; `share` is the slope of the whole by this part. */
type Part = {
	rise(values: ArrayLike<number>): number;
	fall(share: number, slopes: Float64Array): void;
};

/** For an expression that has a value where it is asked: no figure is checked on the way. */
export function compileGradient(expr: Expr, names: readonly string[]): Gradient {
	const whole = part(expr, names);
	return (values, slopes) => {
		slopes.fill(0);
		whole.rise(values);
		whole.fall(1, slopes);
	};
}

function part(expr: Expr, names: readonly string[]): Part {
	const figure = fixedFigure(expr);
	if (figure !== null) return { rise: () => figure, fall: () => {} };
	switch (expr.kind) {
		case 'name': {
			const at = names.indexOf(expr.name);
			return {
				rise: (values) => values[at]!,
				fall: (share, slopes) => {
					slopes[at]! += share;
				}
			};
		}
		case 'negate': {
			const of = part(expr.of, names);
			return {
				rise: (values) => -of.rise(values),
				fall: (share, slopes) => of.fall(-share, slopes)
			};
		}
		case 'binary':
			return joined(
				[part(expr.left, names), part(expr.right, names)],
				([left, right]) => ARITHMETIC[expr.op](left!, right!),
				(args, value) => ARITHMETIC_SLOPES[expr.op](args[0]!, args[1]!, value)
			);
		case 'choose': {
			const met = compileCondition(expr.condition, (side) => compile(side, names));
			const [yes, no] = [part(expr.yes, names), part(expr.no, names)];
			let taken = yes;
			return {
				rise: (values) => (taken = met(values) ? yes : no).rise(values),
				fall: (share, slopes) => taken.fall(share, slopes)
			};
		}
		case 'call': {
			const { evaluate } = functionNamed(expr.name);
			const args = expr.args.map((arg) => part(arg, names));
			return joined(args, (figures) => evaluate(...figures), SLOPES[expr.name]);
		}
		default:
			throw new Error('A condition has no slope.');
	}
}

function joined(
	parts: readonly Part[],
	evaluate: (args: readonly number[]) => number,
	slopesOf: (args: readonly number[], value: number) => readonly number[]
): Part {
	const args: number[] = parts.map(() => 0);
	let value = 0;
	return {
		rise(values) {
			for (let i = 0; i < parts.length; i += 1) args[i] = parts[i]!.rise(values);
			return (value = evaluate(args));
		},
		fall(share, slopes) {
			const own = slopesOf(args, value);
			for (let i = 0; i < parts.length; i += 1) {
				// What does nothing to the whole does nothing, however steep what lies below.
				if (own[i] !== 0) parts[i]!.fall(share * own[i]!, slopes);
			}
		}
	};
}

type Operator = (Expr & { kind: 'binary' })['op'];

const ARITHMETIC: Record<Operator, (a: number, b: number) => number> = {
	'+': (a, b) => a + b,
	'-': (a, b) => a - b,
	'*': (a, b) => a * b,
	'/': (a, b) => a / b,
	'^': (a, b) => a ** b
};

export const ARITHMETIC_SLOPES: Record<
	Operator,
	(a: number, b: number, value: number) => number[]
> = {
	'+': () => [1, 1],
	'-': () => [1, -1],
	'*': (a, b) => [b, a],
	'/': (_, b, value) => [1 / b, -value / b],
	'^': (a, b, value) => [
		b === 0 ? 0 : b * a ** (b - 1),
		// 0 to a power is 0 for every power above 0; a negative base has integer powers only.
		a === 0 ? 0 : a < 0 ? NaN : value * Math.log(a)
	]
};
