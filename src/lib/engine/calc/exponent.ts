/** The dimension of a power: only a pure number may have an exponent that is not written out. */
import { PURE, isPure, toPower } from '../quantities/dimension';
import { crookedExponent, notPureExponent, variableExponent } from './dimension-refusals';
import type { Expr } from './tree';
import { valueType, type ValueType } from './value-type';

/** @throws Refusal where the base has no such power. */
export function power(
	expr: Expr & { kind: 'binary' },
	base: ValueType,
	exponent: ValueType
): ValueType {
	if (!isPure(exponent.dimension)) throw notPureExponent(expr.right, exponent);
	const list = base.list || exponent.list;
	if (isPure(base.dimension)) return valueType(PURE, 'plain', list);
	const value = constantValue(expr.right);
	if (value === null) throw variableExponent(expr, base);
	if (!rational(value)) throw crookedExponent(expr, base);
	return valueType(toPower(base.dimension, value), 'plain', list);
}

const rational = (value: number) =>
	Math.abs(value) <= 20 &&
	[1, 2, 3, 4, 5, 6, 7, 8, 9, 10].some((n) => Math.abs(value * n - Math.round(value * n)) < 1e-9);

/** The value of an exponent made of plain numbers only, else null. */
function constantValue(expr: Expr): number | null {
	if (expr.kind === 'number') return expr.value;
	if (expr.kind === 'negate') {
		const value = constantValue(expr.of);
		return value === null ? null : -value;
	}
	if (expr.kind !== 'binary') return null;
	const left = constantValue(expr.left);
	const right = constantValue(expr.right);
	if (left === null || right === null) return null;
	switch (expr.op) {
		case '+':
			return left + right;
		case '-':
			return left - right;
		case '*':
			return left * right;
		case '/':
			return right === 0 ? null : left / right;
		case '^':
			return left ** right;
	}
}
