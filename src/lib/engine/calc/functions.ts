/** The functions of ordinary mathematics that expressions may call. */
import { erf, erfc } from '../numerics/erf';
import { deviation, greatest, least, mean, total, type Gather } from './gather';

/** How dimensions pass through: what goes in, what comes out. */
export type DimensionRule =
	/** Pure numbers in, a pure number out. */
	| 'pure'
	/** One argument of any dimension, raised to this power. */
	| { power: number }
	/** All arguments alike; the same dimension comes out. */
	| 'alike'
	/** All arguments alike; a pure number comes out. */
	| 'alike to pure'
	/** All arguments alike and such that they can be added. */
	| 'total'
	/** All arguments alike; what lies between two of them comes out. */
	| 'spread'
	/** A value, then the list that it lies in, then the list from which the answer comes. */
	| 'interpolation';

export type FunctionDefinition = {
	/** Fewest and most arguments. */
	takes: [number, number];
	rule: DimensionRule;
	evaluate: (...args: number[]) => number;
	/** The same over the values of lists and whatever stands beside them; else each value of a list goes in alone. */
	gathers?: Gather;
	/** Says where it is not defined, e.g. "the logarithm is defined for positive numbers only". */
	domain?: { holds: (...args: number[]) => boolean; words: string };
	description: string;
	/** TeX of the name; the default is the name in upright letters. */
	tex?: string;
	/** Came when notes had used the name for quantities: it is a function only before a parenthesis. */
	isLate?: true;
};

const MOST_ARGUMENTS = 50;

const gathering = (
	gathers: Gather,
	description: string,
	more: Partial<FunctionDefinition> = {}
): FunctionDefinition => ({
	takes: [1, MOST_ARGUMENTS],
	rule: 'alike',
	evaluate: (...args) => gathers(args),
	gathers,
	description,
	...more
});

const positive = (what: string) => ({
	holds: (x: number) => x > 0,
	words: `${what} is defined for positive numbers only`
});
const withinOne = (what: string) => ({
	holds: (x: number) => Math.abs(x) <= 1,
	words: `${what} is defined from −1 to 1 only`
});

const pure = (
	evaluate: (x: number) => number,
	description: string,
	more: Partial<FunctionDefinition> = {}
): FunctionDefinition => ({ takes: [1, 1], rule: 'pure', evaluate, description, ...more });

/** On the line through two rows of a table. */
function between(x: number, x0: number, x1: number, y0: number, y1: number): number {
	const part = (x - x0) / (x1 - x0);
	// From the nearer row, so that a row's own value comes out as it stands there.
	return part < 0.5 ? y0 + part * (y1 - y0) : y1 - (1 - part) * (y1 - y0);
}

export const FUNCTIONS = {
	sqrt: {
		takes: [1, 1],
		rule: { power: 1 / 2 },
		evaluate: Math.sqrt,
		domain: { holds: (x) => x >= 0, words: 'the square root of a negative number is not real' },
		description: 'Square root'
	},
	cbrt: { takes: [1, 1], rule: { power: 1 / 3 }, evaluate: Math.cbrt, description: 'Cube root' },
	exp: pure(Math.exp, 'Exponential function', { tex: '\\exp' }),
	expm1: pure(Math.expm1, 'exp(x) − 1, exact for small x'),
	ln: pure(Math.log, 'Natural logarithm', { tex: '\\ln', domain: positive('ln') }),
	log: {
		takes: [1, 2],
		rule: 'pure',
		evaluate: (x, base) => (base === undefined ? Math.log(x) : Math.log(x) / Math.log(base)),
		domain: {
			holds: (x, base) => x > 0 && (base === undefined || (base > 0 && base !== 1)),
			words: 'log is defined for positive numbers, and for a positive base that is not 1'
		},
		description: 'Natural logarithm, or log(x, base)',
		tex: '\\ln'
	},
	log1p: pure(Math.log1p, 'ln(1 + x), exact for small x', {
		domain: { holds: (x) => x > -1, words: 'log1p is defined above −1 only' }
	}),
	log2: pure(Math.log2, 'Logarithm to base 2', { tex: '\\log_2', domain: positive('log2') }),
	log10: pure(Math.log10, 'Decimal logarithm', { tex: '\\log_{10}', domain: positive('log10') }),
	sin: pure(Math.sin, 'Sine', { tex: '\\sin' }),
	cos: pure(Math.cos, 'Cosine', { tex: '\\cos' }),
	tan: pure(Math.tan, 'Tangent', { tex: '\\tan' }),
	asin: pure(Math.asin, 'Inverse sine', { tex: '\\arcsin', domain: withinOne('asin') }),
	acos: pure(Math.acos, 'Inverse cosine', { tex: '\\arccos', domain: withinOne('acos') }),
	atan: pure(Math.atan, 'Inverse tangent', { tex: '\\arctan' }),
	atan2: {
		takes: [2, 2],
		rule: 'alike to pure',
		evaluate: Math.atan2,
		domain: {
			holds: (y, x) => y !== 0 || x !== 0,
			words: 'the direction of a point at the origin is not defined'
		},
		description: 'Direction of the point x, y: atan2(y, x)'
	},
	sinh: pure(Math.sinh, 'Hyperbolic sine', { tex: '\\sinh' }),
	cosh: pure(Math.cosh, 'Hyperbolic cosine', { tex: '\\cosh' }),
	tanh: pure(Math.tanh, 'Hyperbolic tangent', { tex: '\\tanh' }),
	erf: pure(erf, 'Error function'),
	erfc: pure(erfc, 'Complementary error function'),
	abs: { takes: [1, 1], rule: { power: 1 }, evaluate: Math.abs, description: 'Absolute value' },
	sign: {
		takes: [1, 1],
		rule: 'alike to pure',
		evaluate: Math.sign,
		description: 'Sign: −1, 0 or 1',
		tex: '\\operatorname{sgn}'
	},
	floor: pure(Math.floor, 'Largest whole number not above'),
	ceil: pure(Math.ceil, 'Smallest whole number not below'),
	round: pure(Math.round, 'Nearest whole number'),
	min: gathering(least, 'Least', { evaluate: Math.min, tex: '\\min' }),
	max: gathering(greatest, 'Greatest', { evaluate: Math.max, tex: '\\max' }),
	sum: gathering(total, 'Sum of values or of a list', { rule: 'total', isLate: true }),
	mean: gathering(mean, 'Arithmetic mean of values or of a list', { isLate: true }),
	std: gathering(deviation, 'Standard deviation (n − 1) of values or of a list', {
		rule: 'spread',
		isLate: true,
		domain: {
			holds: (...args) => args.length > 1,
			words: 'a standard deviation takes at least two values'
		}
	}),
	count: gathering(({ length }) => length, 'How many values', {
		rule: 'alike to pure',
		isLate: true
	}),
	interpolate: {
		takes: [3, 3],
		rule: 'interpolation',
		evaluate: between,
		description: 'Between the rows of a table: interpolate(x, list of x, list of y)',
		isLate: true
	},
	hypot: {
		takes: [2, MOST_ARGUMENTS],
		rule: 'total',
		evaluate: Math.hypot,
		description: 'Square root of the sum of squares'
	}
} satisfies Record<string, FunctionDefinition>;

export type FunctionName = keyof typeof FUNCTIONS;

export const isFunction = (name: string): name is FunctionName => Object.hasOwn(FUNCTIONS, name);
/** Whether no quantity may have the name. */
export const isKept = (name: string) => isFunction(name) && !functionNamed(name).isLate;

export const functionNamed = (name: FunctionName): FunctionDefinition => FUNCTIONS[name];
