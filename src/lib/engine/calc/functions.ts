/** The functions of ordinary mathematics that expressions may call. */
import { erf, erfc } from '../numerics/erf';

/** How dimensions pass through: what goes in, what comes out. */
export type DimensionRule =
	/** Pure numbers in, a pure number out. */
	| 'pure'
	/** One argument of any dimension, raised to this power. */
	| { power: number }
	/** All arguments alike; the same dimension comes out. */
	| 'alike'
	/** All arguments alike; a pure number comes out. */
	| 'alike to pure';

export type FunctionDefinition = {
	/** Fewest and most arguments. */
	takes: [number, number];
	rule: DimensionRule;
	evaluate: (...args: number[]) => number;
	/** Says where it is not defined, e.g. "the logarithm is defined for positive numbers only". */
	domain?: { holds: (...args: number[]) => boolean; words: string };
	description: string;
	/** TeX of the name; the default is the name in upright letters. */
	tex?: string;
};

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
	min: { takes: [1, 50], rule: 'alike', evaluate: Math.min, description: 'Least', tex: '\\min' },
	max: { takes: [1, 50], rule: 'alike', evaluate: Math.max, description: 'Greatest', tex: '\\max' },
	hypot: {
		takes: [2, 50],
		rule: 'alike',
		evaluate: Math.hypot,
		description: 'Square root of the sum of squares'
	}
} satisfies Record<string, FunctionDefinition>;

export type FunctionName = keyof typeof FUNCTIONS;

export const isFunction = (name: string): name is FunctionName => Object.hasOwn(FUNCTIONS, name);
export const functionNamed = (name: FunctionName): FunctionDefinition => FUNCTIONS[name];
