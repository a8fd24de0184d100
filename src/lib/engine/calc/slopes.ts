/**
 * Slopes of the functions of `functions`, exact.
 *
 * Where there is none, the one that serves a standard uncertainty is taken. A corner: |x| at 0 and
 * hypot at the origin have slope 1, which gives the root mean square of what comes out; among equal
 * arguments of min and max each has the same share. A step (sign, floor, ceil, round) has slope 0
 * wherever it has a value: what jumps there is not seen to first order. An upright tangent (sqrt and cbrt at 0,
 * asin and acos at ±1) is infinite, and the uncertainty of what follows is not known.
 */
import type { FunctionName } from './functions';

/** By each argument, from the arguments and the value. */
type Slopes = (args: readonly number[], value: number) => number[];

const one =
	(slope: (x: number, value: number) => number): Slopes =>
	([x], value) => [slope(x!, value)];

const step = one(() => 0);

/** Equal shares among the arguments that are the value. */
const shared: Slopes = (args, value) => {
	const ties = args.filter((arg) => arg === value).length;
	return args.map((arg) => (arg === value ? 1 / ties : 0));
};

const bell = (x: number) => (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x);

/** 1 − x² without loss near ±1. */
const underRoot = (x: number) => Math.sqrt((1 - x) * (1 + x));

export const SLOPES: Record<FunctionName, Slopes> = {
	sqrt: one((_, value) => 0.5 / value),
	cbrt: one((_, value) => 1 / (3 * value * value)),
	exp: one((_, value) => value),
	expm1: one((x) => Math.exp(x)),
	ln: one((x) => 1 / x),
	log: ([x, base]) => {
		if (base === undefined) return [1 / x!];
		const lnBase = Math.log(base);
		return [1 / (x! * lnBase), -Math.log(x!) / (base * lnBase * lnBase)];
	},
	log1p: one((x) => 1 / (1 + x)),
	log2: one((x) => Math.LOG2E / x),
	log10: one((x) => Math.LOG10E / x),
	sin: one((x) => Math.cos(x)),
	cos: one((x) => -Math.sin(x)),
	tan: one((_, value) => 1 + value * value),
	asin: one((x) => 1 / underRoot(x)),
	acos: one((x) => -1 / underRoot(x)),
	atan: one((x) => 1 / (1 + x * x)),
	atan2: ([y, x]) => {
		const r = Math.hypot(y!, x!);
		return [x! / r / r, -y! / r / r];
	},
	sinh: one((x) => Math.cosh(x)),
	cosh: one((x) => Math.sinh(x)),
	tanh: one((x) => (1 / Math.cosh(x)) ** 2),
	erf: one(bell),
	erfc: one((x) => -bell(x)),
	abs: one((x) => (x < 0 ? -1 : 1)),
	sign: step,
	floor: step,
	ceil: step,
	round: step,
	min: shared,
	max: shared,
	sum: (args) => args.map(() => 1),
	mean: (args) => args.map(() => 1 / args.length),
	std: (args, value) => {
		const mean = args.reduce((sum, arg) => sum + arg / args.length, 0);
		// Where all are alike it depends on how they move: not known.
		if (value === 0) return args.map(() => NaN);
		return args.map((arg) => (arg - mean) / value / (args.length - 1));
	},
	count: (args) => args.map(() => 0),
	interpolate: ([x, x0, x1, y0, y1]) => {
		const [width, part] = [x1! - x0!, (x! - x0!) / (x1! - x0!)];
		const slope = (y1! - y0!) / width;
		return [slope, slope * (part - 1), -slope * part, 1 - part, part];
	},
	hypot: (args, value) => args.map((arg) => (value === 0 ? 1 : arg / value))
};
