import { describe, expect, it } from 'vitest';
import { philox, uniformDraws } from './philox';

const words = (text: string) => text.split(' ').map((word) => parseInt(word, 16));

describe('Philox 4×32-10', () => {
	// Known-answer vectors of the authors' library Random123, tests/kat_vectors.
	const known = [
		{
			counter: '00000000 00000000 00000000 00000000',
			key: '00000000 00000000',
			block: '6627e8d5 e169c58d bc57ac4c 9b00dbd8'
		},
		{
			counter: 'ffffffff ffffffff ffffffff ffffffff',
			key: 'ffffffff ffffffff',
			block: '408f276d 41c83b0e a20bc7c6 6d5451fd'
		},
		{
			counter: '243f6a88 85a308d3 13198a2e 03707344',
			key: 'a4093822 299f31d0',
			block: 'd16cfe09 94fdcceb 5001e420 24126ea1'
		}
	];

	it('gives the authors’ known answers', () => {
		for (const { counter, key, block } of known) {
			const out = new Uint32Array(4);
			const [c0, c1, c2, c3] = words(counter) as [number, number, number, number];
			const [k0, k1] = words(key) as [number, number];
			philox(c0, c1, c2, c3, k0, k1, out);
			expect([...out]).toEqual(words(block));
		}
	});
});

describe('the draws of a sample', () => {
	it('are the same whatever was drawn before, and however many are asked for', () => {
		const five = new Float64Array(5);
		uniformDraws(2026, 7, five);
		const two = new Float64Array(2);
		uniformDraws(2026, 0, two);
		uniformDraws(2026, 7, two);
		expect([...two]).toEqual([...five.slice(0, 2)]);
	});

	it('differ by seed and by sample, above 2³² as well', () => {
		const seen = new Set<number>();
		for (const seed of [0, 1, 2 ** 32, 2 ** 53 - 1])
			for (const sample of [0, 1, 2 ** 32]) {
				const draws = new Float64Array(3);
				uniformDraws(seed, sample, draws);
				draws.forEach((draw) => seen.add(draw));
			}
		expect(seen.size).toBe(4 * 3 * 3);
	});

	it('never meet 0 or 1', () => {
		const draws = new Float64Array(1000);
		for (let sample = 0; sample < 100; sample += 1) {
			uniformDraws(1, sample, draws);
			expect(draws.every((draw) => draw > 0 && draw < 1)).toBe(true);
		}
	});
});
