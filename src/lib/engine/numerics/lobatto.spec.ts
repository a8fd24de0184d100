import { describe, expect, it } from 'vitest';
import { lobatto } from './lobatto';

describe.each([1, 2, 5, 12, 22])('Gauss–Lobatto points of order %i', (order) => {
	const { nodes, weights, derivative } = lobatto(order);

	it('integrate every power up to 2p − 1 exactly', () => {
		for (let power = 0; power <= 2 * order - 1; power += 1) {
			const sum = nodes.reduce((total, x, i) => total + weights[i]! * x ** power, 0);
			expect(sum).toBeCloseTo(power % 2 === 0 ? 2 / (power + 1) : 0, 13);
		}
	});

	it('take the slope of every power up to p exactly', () => {
		for (let power = 1; power <= order; power += 1)
			nodes.forEach((x, i) => {
				const slope = nodes.reduce(
					(total, other, j) => total + derivative[i * (order + 1) + j]! * other ** power,
					0
				);
				expect(slope).toBeCloseTo(power * x ** (power - 1), 9);
			});
	});
});

it('has the nodes and weights of the published rule of five points', () => {
	// Abramowitz and Stegun, table 25.6, n = 5.
	const { nodes, weights } = lobatto(4);
	expect(nodes[3]).toBeCloseTo(0.6546536707, 10);
	expect([...weights].slice(0, 3)).toEqual([
		expect.closeTo(0.1, 9),
		expect.closeTo(0.5444444444, 9),
		expect.closeTo(0.7111111111, 9)
	]);
});
