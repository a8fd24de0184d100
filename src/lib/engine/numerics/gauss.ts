/** Gauss–Legendre quadrature of 16 points on [−1, 1], exact to degree 31: the positive nodes, their weights. */
export const NODES_16 = Float64Array.of(
	0.09501250983763744,
	0.2816035507792589,
	0.4580167776572274,
	0.6178762444026438,
	0.755404408355003,
	0.8656312023878318,
	0.9445750230732326,
	0.9894009349916499
);
export const WEIGHTS_16 = Float64Array.of(
	0.1894506104550685,
	0.1826034150449236,
	0.16915651939500254,
	0.14959598881657674,
	0.12462897125553388,
	0.09515851168249279,
	0.06225352393864789,
	0.027152459411754093
);

/** ∫ f from `from` to `to` by one panel. */
export function gauss16(f: (x: number) => number, from: number, to: number): number {
	const half = (to - from) / 2;
	const centre = from + half;
	let sum = 0;
	for (let i = 0; i < 8; i += 1) {
		const step = half * NODES_16[i]!;
		sum += WEIGHTS_16[i]! * (f(centre - step) + f(centre + step));
	}
	return sum * half;
}
