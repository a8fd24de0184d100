/** The closed tree of an expression: nothing else of what mathjs parses gets past `parse`. */
import type { Constant } from '../quantities/constants';
import type { Unit } from '../quantities/units';
import type { FunctionName } from './functions';
import type { Place } from './faults';

export type Arithmetic = '+' | '-' | '*' | '/' | '^';
export type Comparison = '<' | '<=' | '>' | '>=' | '==' | '!=';

export type Expr =
	| { kind: 'number'; value: number }
	/** A number with its unit; `si` is its value in coherent SI units. */
	| { kind: 'literal'; number: number; digits: number; unit: Unit; si: number; place: Place }
	| { kind: 'name'; name: string; place: Place }
	| { kind: 'constant'; name: string; constant: Constant; place: Place }
	| { kind: 'negate'; of: Expr }
	| { kind: 'binary'; op: Arithmetic; left: Expr; right: Expr }
	| { kind: 'compare'; op: Comparison; left: Expr; right: Expr }
	| { kind: 'logic'; op: 'and' | 'or'; left: Expr; right: Expr }
	| { kind: 'not'; of: Expr }
	| { kind: 'choose'; condition: Expr; yes: Expr; no: Expr }
	| { kind: 'call'; name: FunctionName; args: Expr[]; place: Place }
	| { kind: 'list'; items: Expr[] }
	/** One value of a list, counted from 1. */
	| { kind: 'pick'; of: Expr; index: Expr };

/** The figure, in SI, of a part that names nothing; null for any other. */
export function fixedFigure(expr: Expr): number | null {
	if (expr.kind === 'number') return expr.value;
	if (expr.kind === 'literal') return expr.si;
	return expr.kind === 'constant' ? expr.constant.value : null;
}

export function children(expr: Expr): Expr[] {
	switch (expr.kind) {
		case 'negate':
		case 'not':
			return [expr.of];
		case 'binary':
		case 'compare':
		case 'logic':
			return [expr.left, expr.right];
		case 'choose':
			return [expr.condition, expr.yes, expr.no];
		case 'call':
			return expr.args;
		case 'list':
			return expr.items;
		case 'pick':
			return [expr.of, expr.index];
		default:
			return [];
	}
}

/** Names, constants, literals and numbers from left to right. */
export function* leaves(expr: Expr): Generator<Expr> {
	const parts = children(expr);
	if (parts.length === 0) yield expr;
	for (const part of parts) yield* leaves(part);
}

/** From the first to the last name or literal below; null for bare numbers, whose place is not kept. */
export function placeOf(expr: Expr): Place | null {
	const own = 'place' in expr ? expr.place : null;
	return children(expr).reduce<Place | null>((whole, child) => {
		const part = placeOf(child);
		if (!whole || !part) return whole ?? part;
		return { from: Math.min(whole.from, part.from), to: Math.max(whole.to, part.to) };
	}, own);
}
