/** Gauss–Lobatto–Legendre points: the nodes of high-order elements, their weights and derivatives. */

export type Lobatto = {
	/** Order p of the polynomials; there are p + 1 nodes. */
	order: number;
	/** From −1 to 1, both included. */
	nodes: Float64Array;
	weights: Float64Array;
	/** d/dx at node i of the polynomial that is 1 at node j and 0 at the others: [i (p + 1) + j]. */
	derivative: Float64Array;
};

const kept = new Map<number, Lobatto>();

/** Exact for polynomials up to degree 2p − 1. Abramowitz and Stegun 25.4.32. */
export function lobatto(order: number): Lobatto {
	let found = kept.get(order);
	if (!found) kept.set(order, (found = compute(order)));
	return found;
}

function compute(order: number): Lobatto {
	const nodes = new Float64Array(order + 1);
	const values = new Float64Array(order + 1);
	for (let i = 0; i <= order; i += 1) {
		// Chebyshev's extrema lie near; Newton on (1 − x²) P′ with (1 − x²) P″ = 2x P′ − p (p + 1) P.
		let x = -Math.cos((Math.PI * i) / order);
		for (let step = 0; step < 50 && i > 0 && i < order; step += 1) {
			const { value, before } = legendre(order, x);
			const change = (order * (before - x * value)) / (order * (order + 1) * value);
			x += change;
			if (Math.abs(change) < 1e-16) break;
		}
		nodes[i] = x;
		values[i] = legendre(order, x).value;
	}
	const weights = values.map((value) => 2 / (order * (order + 1) * value * value));
	const derivative = new Float64Array((order + 1) ** 2);
	for (let i = 0; i <= order; i += 1) {
		let row = 0;
		for (let j = 0; j <= order; j += 1) {
			if (i === j) continue;
			const slope = values[i]! / (values[j]! * (nodes[i]! - nodes[j]!));
			derivative[i * (order + 1) + j] = slope;
			row += slope;
		}
		// A constant has no slope.
		derivative[i * (order + 1) + i] = -row;
	}
	return { order, nodes, weights, derivative };
}

/** P_n(x) and P_{n−1}(x). */
function legendre(order: number, x: number): { value: number; before: number } {
	let [before, value] = [1, x];
	for (let n = 2; n <= order; n += 1)
		[before, value] = [value, ((2 * n - 1) * x * value - (n - 1) * before) / n];
	return { value, before };
}
