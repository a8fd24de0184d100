/**
 * Philox 4×32-10, the counter-based generator of Salmon, Moraes, Dror and Shaw ("Parallel random numbers:
 * as easy as 1, 2, 3", SC'11): four random words as a pure function of a counter and a key. Any sample of a
 * study is had on its own, so that runs go on where they stopped and another given changes no draw.
 */
const TWO_32 = 2 ** 32;

/** The block of four 32-bit words at a counter (c₀ … c₃) under a key (k₀, k₁), written to `out`. */
export function philox(
	c0: number,
	c1: number,
	c2: number,
	c3: number,
	k0: number,
	k1: number,
	out: Uint32Array
): void {
	for (let round = 0; round < 10; round += 1) {
		const low0 = Math.imul(0xd2511f53, c0) >>> 0;
		const low1 = Math.imul(0xcd9e8d57, c2) >>> 0;
		// The product is rounded by at most 2¹¹; without its low word it is a multiple of 2³², so that the
		// nearest one is exact.
		const high0 = ((0xd2511f53 * c0 - low0) / TWO_32 + 0.5) >>> 0;
		const high1 = ((0xcd9e8d57 * c2 - low1) / TWO_32 + 0.5) >>> 0;
		c0 = (high1 ^ c1 ^ k0) >>> 0;
		c1 = low1;
		c2 = (high0 ^ c3 ^ k1) >>> 0;
		c3 = low0;
		k0 = (k0 + 0x9e3779b9) >>> 0;
		k1 = (k1 + 0xbb67ae85) >>> 0;
	}
	out[0] = c0;
	out[1] = c1;
	out[2] = c2;
	out[3] = c3;
}

/**
 * Fills `out` with the draws of one sample, uniform in (0, 1): odd multiples of 2⁻⁵³, so that neither end
 * is ever met. The seed is a whole number from 0 to 2⁵³ − 1; draw j of a sample stays the same however
 * many are asked for.
 */
export function uniformDraws(seed: number, sample: number, out: Float64Array): void {
	for (let block = 0; 2 * block < out.length; block += 1) {
		philox(sample >>> 0, high(sample), block, 0, seed >>> 0, high(seed), words);
		out[2 * block] = inUnit(words[0]!, words[1]!);
		// Beyond the end of a typed array of odd length this is without effect.
		out[2 * block + 1] = inUnit(words[2]!, words[3]!);
	}
}

const words = new Uint32Array(4);

const high = (whole: number) => Math.floor(whole / TWO_32) >>> 0;

/** (2 k + 1) 2⁻⁵³ with k of 52 bits: 32 of the first word and 20 of the second. */
const inUnit = (first: number, second: number) =>
	(first * 2 ** 20 + (second >>> 12) + 0.5) * 2 ** -52;
