import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, divide, exactly, multiply, twoProduct, twoSum } from './double-double';

/** Whole numbers are exact in BigInt, which shares nothing with the arithmetic here. */
const whole = fc.maxSafeInteger();
const big = ([high, low]: readonly [number, number]) => BigInt(high) + BigInt(low);

describe('arithmetic in two doubles', () => {
	it('adds and multiplies whole numbers without loss', () => {
		fc.assert(
			fc.property(whole, whole, (a, b) => {
				expect(big(twoSum(a, b))).toBe(BigInt(a) + BigInt(b));
				expect(big(twoProduct(a, b))).toBe(BigInt(a) * BigInt(b));
			})
		);
	});

	it('carries at least thirty digits through a product, a sum and a quotient', () => {
		fc.assert(
			fc.property(whole, whole, whole, (a, b, c) => {
				fc.pre(c !== 0 && a !== 0 && b !== 0);
				const there = add(multiply(exactly(a), exactly(b)), exactly(c));
				expect(big(there)).toBe(BigInt(a) * BigInt(b) + BigInt(c));
				const quotient = divide(multiply(exactly(a), exactly(b)), exactly(c));
				const back = add(multiply(quotient, exactly(c)), multiply(exactly(-a), exactly(b)));
				expect(Math.abs(back[0])).toBeLessThanOrEqual(1e-30 * Math.abs(a) * Math.abs(b));
			})
		);
	});
});
