/**
 * Sums, products and quotients carried in two doubles, about 31 digits (Dekker, Numer. Math. 18 (1971) 224;
 * Knuth, The Art of Computer Programming 2, 4.2.2). For the few places where the small difference of large terms is wanted.
 * Holds below about 1e300, where Dekker's splitting overflows.
 */

/** Their sum is the number; the second is below half a unit in the last place of the first. */
export type DoubleDouble = readonly [high: number, low: number];

export const exactly = (x: number): DoubleDouble => [x, 0];

/** a + b without loss. */
export function twoSum(a: number, b: number): DoubleDouble {
	const sum = a + b;
	const shared = sum - a;
	return [sum, a - (sum - shared) + (b - shared)];
}

/** 2²⁷ + 1: parts a double into two halves whose products are exact. */
const SPLITTER = 134_217_729;

function split(a: number): DoubleDouble {
	const scaled = SPLITTER * a;
	const high = scaled - (scaled - a);
	return [high, a - high];
}

/** a · b without loss. */
export function twoProduct(a: number, b: number): DoubleDouble {
	const product = a * b;
	const [aHigh, aLow] = split(a);
	const [bHigh, bLow] = split(b);
	const low = aHigh * bHigh - product + aHigh * bLow + aLow * bHigh + aLow * bLow;
	return [product, low];
}

export function add([a, aLow]: DoubleDouble, [b, bLow]: DoubleDouble): DoubleDouble {
	const [sum, lost] = twoSum(a, b);
	return twoSum(sum, lost + aLow + bLow);
}

export const negative = ([a, low]: DoubleDouble): DoubleDouble => [-a, -low];

export function multiply([a, aLow]: DoubleDouble, [b, bLow]: DoubleDouble): DoubleDouble {
	const [product, lost] = twoProduct(a, b);
	return twoSum(product, lost + a * bLow + aLow * b);
}

export function divide(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
	const quotient = a[0] / b[0];
	const rest = add(a, negative(multiply(b, exactly(quotient))));
	return twoSum(quotient, rest[0] / b[0]);
}
