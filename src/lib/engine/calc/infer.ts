/** The dimension of every node, checked once per edit; after it the numbers are plain SI floats. */
import {
	PURE,
	equal,
	inWords,
	isPure,
	over,
	times,
	toPower,
	type Dimension
} from '../quantities/dimension';
import { Refusal } from './faults';
import { functionNamed } from './functions';
import { asText } from './print';
import { placeOf, type Expr } from './tree';

/**
 * Temperatures on a scale with a zero of its own (20 °C) are points; what lies between two of them is
 * a difference. A kelvin may be either ("plain"), as may everything that is no temperature.
 */
export type Scale = 'plain' | 'point' | 'difference';

export type ValueType = { kind: 'value'; dimension: Dimension; scale: Scale };
export type Type = ValueType | { kind: 'truth' };

export type TypeOf = (name: string) => ValueType;

const PURE_VALUE: ValueType = { kind: 'value', dimension: PURE, scale: 'plain' };
const TRUTH: Type = { kind: 'truth' };

export const valueType = (dimension: Dimension, scale: Scale = 'plain'): ValueType => ({
	kind: 'value',
	dimension,
	scale
});

/** @throws Refusal naming both dimensions where they do not fit. */
export function inferValue(expr: Expr, typeOf: TypeOf): ValueType {
	const type = infer(expr, typeOf);
	if (type.kind === 'value') return type;
	throw new Refusal('dimension', `${asText(expr)} is true or false, not a value.`, {
		remedy: 'Use it as a condition: condition ? value : other value.',
		place: placeOf(expr)
	});
}

function infer(expr: Expr, typeOf: TypeOf): Type {
	switch (expr.kind) {
		case 'number':
			return PURE_VALUE;
		case 'literal':
			return valueType(expr.unit.dimension, expr.unit.offset === 0 ? 'plain' : 'point');
		case 'constant':
			return valueType(expr.constant.dimension);
		case 'name':
			return typeOf(expr.name);
		case 'negate': {
			const { dimension, scale } = inferValue(expr.of, typeOf);
			return valueType(dimension, scale === 'difference' ? scale : 'plain');
		}
		case 'binary':
			return binary(expr, typeOf);
		case 'compare':
			alike(expr.left, expr.right, 'compared', typeOf);
			return TRUTH;
		case 'logic':
			condition(expr.left, typeOf);
			condition(expr.right, typeOf);
			return TRUTH;
		case 'not':
			condition(expr.of, typeOf);
			return TRUTH;
		case 'choose':
			condition(expr.condition, typeOf);
			return alike(expr.yes, expr.no, 'taken for each other', typeOf);
		case 'call':
			return call(expr, typeOf);
	}
}

function condition(expr: Expr, typeOf: TypeOf): void {
	if (infer(expr, typeOf).kind === 'truth') return;
	throw new Refusal('dimension', `${asText(expr)} is a value, where a condition is wanted.`, {
		remedy: 'Compare it with something, e.g. x > 0.',
		place: placeOf(expr)
	});
}

function binary(expr: Expr & { kind: 'binary' }, typeOf: TypeOf): ValueType {
	if (expr.op === '+' || expr.op === '-') return sum(expr, typeOf);
	const left = inferValue(expr.left, typeOf);
	const right = inferValue(expr.right, typeOf);
	if (expr.op === '*') return valueType(times(left.dimension, right.dimension));
	if (expr.op === '/') return valueType(over(left.dimension, right.dimension));
	return power(expr, left, right);
}

function sum(expr: Expr & { kind: 'binary' }, typeOf: TypeOf): ValueType {
	const left = inferValue(expr.left, typeOf);
	const right = inferValue(expr.right, typeOf);
	const added = expr.op === '+';
	const fits = fit(expr.left, left, expr.right, right);
	if (!fits) {
		throw mismatch(expr.left, left, expr.right, right, added ? 'added' : 'subtracted');
	}
	if (left.scale === 'point' && right.scale === 'point') {
		if (!added) return valueType(fits.dimension, 'difference');
		throw new Refusal(
			'dimension',
			`${asText(expr.right)} cannot be added: two temperatures on a scale with its own zero have no sum.`,
			{ remedy: 'Write the difference in K.', place: placeOf(expr.right) }
		);
	}
	if (!added && right.scale === 'point') return valueType(fits.dimension, 'difference');
	const scales = [left.scale, right.scale];
	if (scales.includes('point')) return valueType(fits.dimension, 'point');
	return valueType(
		fits.dimension,
		scales.every((scale) => scale === 'difference') ? 'difference' : 'plain'
	);
}

/** A bare 0 has whatever dimension stands beside it. */
const isZero = (expr: Expr) => expr.kind === 'number' && expr.value === 0;

function fit(a: Expr, left: ValueType, b: Expr, right: ValueType): ValueType | null {
	if (equal(left.dimension, right.dimension)) return left;
	if (isZero(a)) return right;
	if (isZero(b)) return left;
	return null;
}

function mismatch(a: Expr, left: ValueType, b: Expr, right: ValueType, done: string): Refusal {
	const what = asText(b);
	return new Refusal(
		'dimension',
		`${what} cannot be ${done}: it is ${inWords(right.dimension)}; ` +
			`${asText(a)} before it is ${inWords(left.dimension)}.`,
		{ place: placeOf(b) ?? placeOf(a) }
	);
}

function alike(a: Expr, b: Expr, done: string, typeOf: TypeOf): ValueType {
	const left = inferValue(a, typeOf);
	const right = inferValue(b, typeOf);
	const fits = fit(a, left, b, right);
	if (!fits) throw mismatch(a, left, b, right, done);
	if ([left.scale, right.scale].sort().join() === 'difference,point') {
		throw new Refusal(
			'dimension',
			`${asText(b)} cannot be ${done}: one of the two is a temperature, the other a difference of temperatures.`,
			{ place: placeOf(b) }
		);
	}
	return valueType(fits.dimension, left.scale === right.scale ? left.scale : 'plain');
}

function power(expr: Expr & { kind: 'binary' }, base: ValueType, exponent: ValueType): ValueType {
	const shown = asText(expr.right);
	if (!isPure(exponent.dimension)) {
		throw new Refusal(
			'dimension',
			`The exponent ${shown} must be a pure number; it is ${inWords(exponent.dimension)}.`,
			{ place: placeOf(expr.right) }
		);
	}
	if (isPure(base.dimension)) return PURE_VALUE;
	const value = constantValue(expr.right);
	if (value === null) {
		throw new Refusal(
			'dimension',
			`${asText(expr.left)} is ${inWords(base.dimension)}: its exponent must be a number written out, not ${shown}.`,
			{ remedy: 'Only a pure number may have a variable exponent.', place: placeOf(expr.right) }
		);
	}
	if (!rational(value)) {
		throw new Refusal(
			'dimension',
			`${asText(expr.left)} is ${inWords(base.dimension)}: its exponent must be a simple fraction, not ${shown}.`,
			{ place: placeOf(expr.left) }
		);
	}
	return valueType(toPower(base.dimension, value));
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

function call(expr: Expr & { kind: 'call' }, typeOf: TypeOf): ValueType {
	const { rule } = functionNamed(expr.name);
	const [first, ...others] = expr.args;
	if (rule === 'pure') {
		for (const arg of expr.args) {
			const { dimension } = inferValue(arg, typeOf);
			if (isPure(dimension)) continue;
			throw new Refusal(
				'dimension',
				`${expr.name} takes a pure number; ${asText(arg)} is ${inWords(dimension)}.`,
				{ place: placeOf(arg) }
			);
		}
		return PURE_VALUE;
	}
	if (typeof rule === 'object') {
		const { dimension, scale } = inferValue(first!, typeOf);
		return valueType(
			toPower(dimension, rule.power),
			rule.power === 1 && scale === 'difference' ? scale : 'plain'
		);
	}
	// A bare 0 takes the dimension beside it, so the others are held against one that has its own.
	const measure = expr.args.find((arg) => !isZero(arg)) ?? first!;
	const type = others.reduce(
		(soFar, arg) => {
			const { scale } = alike(measure, arg, 'set beside it', typeOf);
			return valueType(soFar.dimension, scale === soFar.scale ? scale : 'plain');
		},
		inferValue(measure, typeOf)
	);
	return rule === 'alike' ? type : PURE_VALUE;
}
