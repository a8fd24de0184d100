/** The dimension of every node, checked once per edit; after it the numbers are plain SI floats. */
import { PURE, equal, isPure, over, times, toPower } from '../quantities/dimension';
import {
	fromDifference,
	listFor,
	mismatch,
	noColumn,
	noCondition,
	noMultiple,
	noSumOf,
	noTotal,
	noValue,
	notPure,
	nothingToPick,
	unlikeBranches,
	unlikeScales,
	whichZero
} from './dimension-refusals';
import { power } from './exponent';
import { functionNamed } from './functions';
import type { Expr } from './tree';
import { valueType, type Type, type ValueType } from './value-type';

export type TypeOf = (name: string) => ValueType;

const TRUTH: Type = { kind: 'truth' };

/** What is known while one expression is looked through: each part is, once, however often it is asked for. */
type Known = { typeOf: TypeOf; types: Map<Expr, Type> };

/** @throws Refusal naming both dimensions where they do not fit. */
export const inferType = (expr: Expr, typeOf: TypeOf): ValueType =>
	inferValue(expr, { typeOf, types: new Map() });

function inferValue(expr: Expr, known: Known): ValueType {
	const type = infer(expr, known);
	if (type.kind === 'value') return type;
	throw noValue(expr);
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

/** @throws Refusal where a list stands in the place of one value. */
function single(expr: Expr, known: Known, place: string): void {
	if (!inferValue(expr, known).list) return;
	throw listFor(place, expr);
}

function branches({ yes, no }: Expr & { kind: 'choose' }, known: Known): ValueType {
	const type = alike(yes, no, 'taken for each other', known);
	const [first, second] = [yes, no].map((branch) => inferValue(branch, known).list);
	if (first === second) return type;
	throw unlikeBranches(yes, no);
}

function pick({ of, index }: Expr & { kind: 'pick' }, known: Known): ValueType {
	const type = inferValue(of, known);
	if (!type.list) throw nothingToPick(of);
	single(index, known, 'The number of a value');
	const { dimension } = inferValue(index, known);
	if (isPure(dimension)) return { ...type, list: false };
	throw notPure('The number of a value is a pure number', index, dimension);
}

function condition(expr: Expr, known: Known): void {
	if (infer(expr, known).kind === 'truth') return;
	throw noCondition(expr);
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
		throw noSumOf(expr.right);
	}
	if (!added && right.scale === 'point' && left.scale === 'difference') {
		throw fromDifference(expr.left, expr.right);
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

function alike(a: Expr, b: Expr, done: string, known: Known): ValueType {
	const left = inferValue(a, known);
	const right = inferValue(b, known);
	const fits = fit(a, left, b, right);
	if (!fits) throw mismatch(a, left, b, right, done);
	const zero = isZero(a) ? a : b;
	if (isZero(zero) && (left.scale === 'point' || right.scale === 'point')) {
		throw whichZero(zero);
	}
	if ([left.scale, right.scale].sort().join() === 'difference,point') {
		throw unlikeScales(b, done);
	}
	const scale = left.scale === right.scale ? left.scale : 'plain';
	return valueType(fits.dimension, scale, left.list || right.list);
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
			throw notPure(`${expr.name} takes a pure number`, arg, dimension);
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
		throw noTotal(expr);
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
		throw noColumn(expr, column);
	}
	alike(xs, x, 'looked up in it', known);
	return { ...inferValue(ys, known), list: inferValue(x, known).list };
}
