/**
 * The error function, to about 1e-15: its Maclaurin series in the form without cancellation
 * (Abramowitz and Stegun 7.1.6) up to 2.5, the continued fraction of erfc (7.1.14) beyond.
 */
export function erf(x: number): number {
	const size = Math.abs(x);
	const value = size < 2.5 ? series(size) : 1 - tail(size);
	return x < 0 ? -value : value;
}

export function erfc(x: number): number {
	return x < 2.5 ? 1 - erf(x) : tail(x);
}

function series(x: number): number {
	let term = x;
	let sum = x;
	for (let n = 1; term > sum * 1e-17 && n < 200; n += 1) {
		term *= (2 * x * x) / (2 * n + 1);
		sum += term;
	}
	return (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
}

function tail(x: number): number {
	let fraction = x;
	for (let n = 60; n >= 1; n -= 1) fraction = x + n / 2 / fraction;
	return Math.exp(-x * x) / Math.sqrt(Math.PI) / fraction;
}
