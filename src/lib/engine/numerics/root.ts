/**
 * The root of f between `low` and `high`, where it has opposite signs, to the last digits: Chandrupatla's
 * mixture of inverse quadratic interpolation and bisection (Adv. Eng. Software 28 (1997) 145). It ends in any case.
 */
export function root(f: (x: number) => number, low: number, high: number): number {
	let [a, b] = [high, low];
	let [fa, fb] = [f(a), f(b)];
	// The third point of the interpolation.
	let c: number;
	let fc: number;
	if (fa === 0) return a;
	let share = 0.5;
	for (let i = 0; i < 200 && fb !== 0; i += 1) {
		const x = a + share * (b - a);
		const fx = f(x);
		if (Math.sign(fx) === Math.sign(fa)) [c, fc] = [a, fa];
		else [c, b, fc, fb] = [b, a, fb, fa];
		[a, fa] = [x, fx];
		const [best, width] = [Math.abs(fa) < Math.abs(fb) ? a : b, Math.abs(b - a)];
		const smallest = 2 ** -52 * Math.abs(best);
		if (fa === 0 || width <= 2 * smallest) return best;
		const xi = (a - b) / (c - b);
		const phi = (fa - fb) / (fc - fb);
		const curved = phi ** 2 < xi && (1 - phi) ** 2 < 1 - xi;
		share = curved
			? (fa / (fb - fa)) * (fc / (fb - fc)) +
				((((c - a) / (b - a)) * fa) / (fc - fa)) * (fb / (fc - fb))
			: 0.5;
		const least = smallest / width;
		share = Math.min(1 - least, Math.max(least, share));
	}
	return b;
}
