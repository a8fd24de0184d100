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

/** A list has many values, all of one dimension. */
export type ValueType = { kind: 'value'; dimension: Dimension; scale: Scale; list: boolean };
export type Type = ValueType | { kind: 'truth' };

export type TypeOf = (name: string) => ValueType;

const TRUTH: Type = { kind: 'truth' };

export const valueType = (
	dimension: Dimension,
	scale: Scale = 'plain',
	list = false
): ValueType => ({ kind: 'value', dimension, scale, list });

/** What is known while one expression is looked through: each part is, once, however often it is asked for. */
type Known = { typeOf: TypeOf; types: Map<Expr, Type> };

/** @throws Refusal naming both dimensions where they do not fit. */
export const inferType = (expr: Expr, typeOf: TypeOf): ValueType =>
	inferValue(expr, { typeOf, types: new Map() });

function inferValue(expr: Expr, known: Known): ValueType {
	const type = infer(expr, known);
	if (type.kind === 'value') return type;
	throw new Refusal('dimension', `${asText(expr)} is true or false, not a value.`, {
		remedy: 'Use it as a condition: condition ? value : other value.',
		place: placeOf(expr)
	});
}

function infer(expr: Expr, known: Known): Type {
	const found = known.types.get(expr) ?? inferred(expr, known);
	known.types.set(expr, found);
	return found;
}

function inferred(expr: Expr, known: Known): Type {
	switch (expr.kind) {
		case 'number':
			return valueType(PURE);
		case 'literal':
			return valueType(expr.unit.dimension, expr.unit.offset === 0 ? 'plain' : 'point');
		case 'constant':
			return valueType(expr.constant.dimension);
		case 'name':
			return known.typeOf(expr.name);
		case 'negate': {
			const { dimension, scale, list } = inferValue(expr.of, known);
			if (scale === 'point') throw noMultiple(expr);
			return valueType(dimension, scale, list);
		}
		case 'binary':
			return binary(expr, known);
		case 'compare':
			alike(expr.left, expr.right, 'compared', known);
			single(expr.left, known, 'A comparison');
			single(expr.right, known, 'A comparison');
			return TRUTH;
		case 'logic':
			condition(expr.left, known);
			condition(expr.right, known);
			return TRUTH;
		case 'not':
			condition(expr.of, known);
			return TRUTH;
		case 'choose':
			condition(expr.condition, known);
			return branches(expr, known);
		case 'call':
			return call(expr, known);
		case 'list':
			expr.items.forEach((item) => single(item, known, 'A place in a list'));
			return { ...allAlike(expr.items, known), list: true };
		case 'pick':
			return pick(expr, known);
	}
}

/** What to do with a list where one value is wanted. */
export const PICK_ONE = 'Take one of its values, e.g. x[1], or its min, max, sum or mean.';

/** @throws Refusal where a list stands in the place of one value. */
function single(expr: Expr, known: Known, place: string): void {
	if (!inferValue(expr, known).list) return;
	throw new Refusal('dimension', `${place} takes one value; ${asText(expr)} is a list.`, {
		remedy: PICK_ONE,
		place: placeOf(expr)
	});
}

function branches({ yes, no }: Expr & { kind: 'choose' }, known: Known): ValueType {
	const type = alike(yes, no, 'taken for each other', known);
	const [first, second] = [yes, no].map((branch) => inferValue(branch, known).list);
	if (first === second) return type;
	throw new Refusal(
		'dimension',
		`${asText(yes)} and ${asText(no)} cannot be taken for each other: one is a list, the other one value.`,
		{ place: placeOf(no) ?? placeOf(yes) }
	);
}

function pick({ of, index }: Expr & { kind: 'pick' }, known: Known): ValueType {
	const type = inferValue(of, known);
	if (!type.list) {
		throw new Refusal('dimension', `${asText(of)} is one value: it has no others to pick from.`, {
			place: placeOf(of)
		});
	}
	single(index, known, 'The number of a value');
	const { dimension } = inferValue(index, known);
	if (isPure(dimension)) return { ...type, list: false };
	throw new Refusal(
		'dimension',
		`The number of a value is a pure number; ${asText(index)} is ${inWords(dimension)}.`,
		{ place: placeOf(index) }
	);
}

function condition(expr: Expr, known: Known): void {
	if (infer(expr, known).kind === 'truth') return;
	throw new Refusal('dimension', `${asText(expr)} is a value, where a condition is wanted.`, {
		remedy: 'Compare it with something, e.g. x > 0.',
		place: placeOf(expr)
	});
}

function binary(expr: Expr & { kind: 'binary' }, known: Known): ValueType {
	if (expr.op === '+' || expr.op === '-') return sum(expr, known);
	const left = inferValue(expr.left, known);
	const right = inferValue(expr.right, known);
	const list = left.list || right.list;
	if (expr.op === '*' || expr.op === '/') refuseScaled(expr, left, right);
	if (expr.op === '*') return valueType(times(left.dimension, right.dimension), 'plain', list);
	if (expr.op === '/') return valueType(over(left.dimension, right.dimension), 'plain', list);
	return power(expr, left, right);
}

/**
 * @throws Refusal where a temperature on a scale with its own zero is multiplied by a number. In a product
 * that is no temperature any more, as in k T or T₁/T₂, it stands for its kelvins.
 */
function refuseScaled(expr: Expr & { kind: 'binary' }, left: ValueType, right: ValueType): void {
	const isScaled =
		(left.scale === 'point' && isPure(right.dimension)) ||
		(right.scale === 'point' && isPure(left.dimension) && expr.op === '*');
	if (isScaled) throw noMultiple(expr);
}

const noMultiple = (expr: Expr) =>
	new Refusal(
		'dimension',
		`${asText(expr)} has no meaning: a temperature on a scale with its own zero has no multiples.`,
		{
			remedy: 'Give the temperature in K, or multiply a difference of two.',
			place: placeOf(expr)
		}
	);

function sum(expr: Expr & { kind: 'binary' }, known: Known): ValueType {
	const left = inferValue(expr.left, known);
	const right = inferValue(expr.right, known);
	const added = expr.op === '+';
	const list = left.list || right.list;
	const fits = fit(expr.left, left, expr.right, right);
	if (!fits) {
		throw mismatch(expr.left, left, expr.right, right, added ? 'added' : 'subtracted');
	}
	if (left.scale === 'point' && right.scale === 'point') {
		if (!added) return valueType(fits.dimension, 'difference', list);
		throw new Refusal(
			'dimension',
			`${asText(expr.right)} cannot be added: two temperatures on a scale with its own zero have no sum.`,
			{ remedy: 'Write the difference in K.', place: placeOf(expr.right) }
		);
	}
	if (!added && right.scale === 'point' && left.scale === 'difference') {
		throw new Refusal(
			'dimension',
			`${asText(expr.right)} cannot be subtracted: it is a temperature; ${asText(expr.left)} before it is a difference of temperatures.`,
			{ place: placeOf(expr.right) }
		);
	}
	if (!added && right.scale === 'point') return valueType(fits.dimension, 'difference', list);
	const scales = [left.scale, right.scale];
	if (scales.includes('point')) return valueType(fits.dimension, 'point', list);
	return valueType(
		fits.dimension,
		scales.every((scale) => scale === 'difference') ? 'difference' : 'plain',
		list
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

function alike(a: Expr, b: Expr, done: string, known: Known): ValueType {
	const left = inferValue(a, known);
	const right = inferValue(b, known);
	const fits = fit(a, left, b, right);
	if (!fits) throw mismatch(a, left, b, right, done);
	const zero = isZero(a) ? a : b;
	if (isZero(zero) && (left.scale === 'point' || right.scale === 'point')) {
		throw new Refusal('dimension', '0 beside a temperature may be that of any scale.', {
			remedy: 'Write 0 degC or 0 K.',
			place: placeOf(zero)
		});
	}
	if ([left.scale, right.scale].sort().join() === 'difference,point') {
		throw new Refusal(
			'dimension',
			`${asText(b)} cannot be ${done}: one of the two is a temperature, the other a difference of temperatures.`,
			{ place: placeOf(b) }
		);
	}
	const scale = left.scale === right.scale ? left.scale : 'plain';
	return valueType(fits.dimension, scale, left.list || right.list);
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
	const list = base.list || exponent.list;
	if (isPure(base.dimension)) return valueType(PURE, 'plain', list);
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

function call(expr: Expr & { kind: 'call' }, known: Known): ValueType {
	const { rule, gathers } = functionNamed(expr.name);
	const [first] = expr.args;
	if (rule === 'pure') {
		let anyList = false;
		for (const arg of expr.args) {
			const { dimension, list } = inferValue(arg, known);
			anyList ||= list;
			if (isPure(dimension)) continue;
			throw new Refusal(
				'dimension',
				`${expr.name} takes a pure number; ${asText(arg)} is ${inWords(dimension)}.`,
				{ place: placeOf(arg) }
			);
		}
		return valueType(PURE, 'plain', anyList);
	}
	if (typeof rule === 'object') {
		const { dimension, scale, list } = inferValue(first!, known);
		return valueType(
			toPower(dimension, rule.power),
			rule.power === 1 && scale === 'difference' ? scale : 'plain',
			list
		);
	}
	if (rule === 'interpolation') return interpolation(expr, known);
	const found = allAlike(expr.args, known);
	const type = gathers ? { ...found, list: false } : found;
	if (rule === 'total' && type.scale === 'point') {
		throw new Refusal(
			'dimension',
			`${asText(expr)} has no value: temperatures on a scale with its own zero have no sum.`,
			{ remedy: 'Take their mean.', place: placeOf(expr) }
		);
	}
	if (rule === 'spread' && type.scale === 'point') return { ...type, scale: 'difference' };
	return rule === 'alike to pure' ? valueType(PURE, 'plain', type.list) : type;
}

/** Of values that must be alike; a list where one of them is. */
function allAlike(exprs: readonly Expr[], known: Known): ValueType {
	// A bare 0 takes the dimension beside it, so the others are held against one that has its own.
	const measure = exprs.find((expr) => !isZero(expr)) ?? exprs[0]!;
	return exprs
		.filter((expr) => expr !== measure)
		.reduce(
			(soFar, expr) => {
				const { scale, list } = alike(measure, expr, 'set beside it', known);
				return valueType(
					soFar.dimension,
					scale === soFar.scale ? scale : 'plain',
					soFar.list || list
				);
			},
			inferValue(measure, known)
		);
}

function interpolation(expr: Expr & { kind: 'call' }, known: Known): ValueType {
	const [x, xs, ys] = expr.args as [Expr, Expr, Expr];
	for (const column of [xs, ys]) {
		if (inferValue(column, known).list) continue;
		throw new Refusal(
			'dimension',
			`${expr.name} reads from two lists; ${asText(column)} is one value.`,
			{ remedy: 'Write interpolate(x, list of x, list of y).', place: placeOf(column) }
		);
	}
	alike(xs, x, 'looked up in it', known);
	return { ...inferValue(ys, known), list: inferValue(x, known).list };
}
