/** Why an expression has no dimension, in words that name both sides. */
import { inWords, type Dimension } from '../quantities/dimension';
import { Refusal } from './faults';
import type { ValueType } from './value-type';
import { asText } from './print';
import { placeOf, type Expr } from './tree';

type Binary = Expr & { kind: 'binary' };

const refusal = (message: string, at: Expr, remedy = '') =>
	new Refusal('dimension', message, { remedy, place: placeOf(at) });

export const noValue = (expr: Expr) =>
	refusal(
		`${asText(expr)} is true or false, not a value.`,
		expr,
		'Use it as a condition: condition ? value : other value.'
	);

export const noCondition = (expr: Expr) =>
	refusal(
		`${asText(expr)} is a value, where a condition is wanted.`,
		expr,
		'Compare it with something, e.g. x > 0.'
	);

export const mismatch = (a: Expr, left: ValueType, b: Expr, right: ValueType, done: string) =>
	new Refusal(
		'dimension',
		`${asText(b)} cannot be ${done}: it is ${inWords(right.dimension)}; ` +
			`${asText(a)} before it is ${inWords(left.dimension)}.`,
		{ place: placeOf(b) ?? placeOf(a) }
	);

/** @param wanted what takes a pure number, e.g. "sin takes a pure number" */
export const notPure = (wanted: string, expr: Expr, dimension: Dimension) =>
	refusal(`${wanted}; ${asText(expr)} is ${inWords(dimension)}.`, expr);

// Powers ------------------------------------------------------------------------------------------

export const notPureExponent = (exponent: Expr, { dimension }: ValueType) =>
	refusal(
		`The exponent ${asText(exponent)} must be a pure number; it is ${inWords(dimension)}.`,
		exponent
	);

export const variableExponent = ({ left, right }: Binary, { dimension }: ValueType) =>
	refusal(
		`${asText(left)} is ${inWords(dimension)}: its exponent must be a number written out, not ${asText(right)}.`,
		right,
		'Only a pure number may have a variable exponent.'
	);

export const crookedExponent = ({ left, right }: Binary, { dimension }: ValueType) =>
	refusal(
		`${asText(left)} is ${inWords(dimension)}: its exponent must be a simple fraction, not ${asText(right)}.`,
		left
	);

// Temperatures ------------------------------------------------------------------------------------

export const noMultiple = (expr: Expr) =>
	refusal(
		`${asText(expr)} has no meaning: a temperature on a scale with its own zero has no multiples.`,
		expr,
		'Give the temperature in K, or multiply a difference of two.'
	);

export const noSumOf = (added: Expr) =>
	refusal(
		`${asText(added)} cannot be added: two temperatures on a scale with its own zero have no sum.`,
		added,
		'Write the difference in K.'
	);

export const noTotal = (expr: Expr) =>
	refusal(
		`${asText(expr)} has no value: temperatures on a scale with its own zero have no sum.`,
		expr,
		'Take their mean.'
	);

export const fromDifference = (left: Expr, right: Expr) =>
	refusal(
		`${asText(right)} cannot be subtracted: it is a temperature; ${asText(left)} before it is a difference of temperatures.`,
		right
	);

export const whichZero = (zero: Expr) =>
	refusal('0 beside a temperature may be that of any scale.', zero, 'Write 0 degC or 0 K.');

export const unlikeScales = (expr: Expr, done: string) =>
	refusal(
		`${asText(expr)} cannot be ${done}: one of the two is a temperature, the other a difference of temperatures.`,
		expr
	);

// Lists -------------------------------------------------------------------------------------------

const PICK_ONE = 'Take one of its values, e.g. x[1], or its min, max, sum or mean.';

/** @param place what takes one value, e.g. "A comparison" */
export const listFor = (place: string, expr: Expr) =>
	refusal(`${place} takes one value; ${asText(expr)} is a list.`, expr, PICK_ONE);

export const notSingle = (expr: Expr) =>
	refusal(`${asText(expr)} is a list, where one value is wanted.`, expr, PICK_ONE);

export const nothingToPick = (expr: Expr) =>
	refusal(`${asText(expr)} is one value: it has no others to pick from.`, expr);

export const unlikeBranches = (yes: Expr, no: Expr) =>
	new Refusal(
		'dimension',
		`${asText(yes)} and ${asText(no)} cannot be taken for each other: one is a list, the other one value.`,
		{ place: placeOf(no) ?? placeOf(yes) }
	);

export const noColumn = ({ name }: Expr & { kind: 'call' }, column: Expr) =>
	refusal(
		`${name} reads from two lists; ${asText(column)} is one value.`,
		column,
		'Write interpolate(x, list of x, list of y).'
	);
