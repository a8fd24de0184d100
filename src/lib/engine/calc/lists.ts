/**
 * Expressions in which lists stand. Operators and functions work value by value, one value goes with each
 * of a list, and two lists go together that have as many values. Values and what is uncertain in them come
 * from one walk, by the chain rule along the way.
 */
import { arithmetic, call, compileCondition, type Program } from './compile';
import type { Figures, Inputs } from './figures';
import { functionNamed } from './functions';
import { ARITHMETIC_SLOPES } from './gradient';
import { interpolated } from './interpolation';
import { each, fixed, gathered, listed, picked, type Part } from './list-parts';
import { SLOPES } from './slopes';
import { children, fixedFigure, type Expr } from './tree';

export type ListProgram = (inputs: Inputs) => Figures;

/** Whether a list stands in the expression, written out or by its name. */
export function hasList(expr: Expr, isList: (name: string) => boolean): boolean {
	if (expr.kind === 'name') return isList(expr.name);
	return expr.kind === 'list' || children(expr).some((child) => hasList(child, isList));
}

/** For an expression whose types fit; `isList` tells which of the names stand for lists. */
export function compileLists(
	expr: Expr,
	names: readonly string[],
	isList: (name: string) => boolean
): ListProgram {
	const valueOf = (side: Expr) => {
		const { run } = part(side);
		return (inputs: Inputs) => run(inputs).values[0]!;
	};
	function part(expr: Expr): Part {
		const figure = fixedFigure(expr);
		if (figure !== null) return fixed(figure);
		switch (expr.kind) {
			case 'name': {
				const at = names.indexOf(expr.name);
				return { list: isList(expr.name), run: ({ named }) => named[at]! };
			}
			case 'negate':
				return each(
					[part(expr.of)],
					[expr.of],
					(values) => -values[0]!,
					() => [-1]
				);
			case 'binary': {
				const slopes = ARITHMETIC_SLOPES[expr.op];
				const sides = [expr.left, expr.right];
				return each(
					sides.map(part),
					sides,
					arithmetic(expr, ARGUMENT(0), ARGUMENT(1)),
					([a, b], value) => slopes(a!, b!, value)
				);
			}
			case 'choose': {
				const met = compileCondition(expr.condition, valueOf);
				const [yes, no] = [part(expr.yes), part(expr.no)];
				return { list: yes.list, run: (inputs) => (met(inputs) ? yes : no).run(inputs) };
			}
			case 'call': {
				const { gathers, rule, domain } = functionNamed(expr.name);
				const parts = expr.args.map(part);
				if (rule === 'interpolation') return interpolated(expr, parts);
				if (gathers) return gathered(parts, expr, gathers, domain?.words ?? '');
				return each(
					parts,
					expr.args,
					call(
						expr,
						expr.args.map((_, i) => ARGUMENT(i))
					),
					SLOPES[expr.name]
				);
			}
			case 'list':
				return listed(expr.items.map(part));
			case 'pick':
				return picked(expr, part(expr.of), part(expr.index));
			default:
				throw new Error('A condition has no value.');
		}
	}
	return part(expr).run;
}

/** Reads the arguments of one operation from the row in which they stand. */
const ARGUMENT =
	(at: number): Program =>
	(values) =>
		values[at]!;
