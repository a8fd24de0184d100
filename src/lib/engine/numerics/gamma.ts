/** The gamma and beta functions, and the distributions that are told by them. */

/** Stirling's series: ln Γ(a) less (a − ½) ln a − a + ½ ln 2π, for a ≥ 10 to rounding (Abramowitz and Stegun 6.1.41). */
function tail(a: number): number {
	const x = 1 / (a * a);
	return (
		(1 / 12 -
			x * (1 / 360 - x * (1 / 1260 - x * (1 / 1680 - x * (1 / 1188 - (691 * x) / 360360))))) /
		a
	);
}

/** ln Γ(a) − [(a − ½) ln a − a + ½ ln 2π], a > 0: what Stirling's formula leaves out. */
export function stirlingRest(a: number): number {
	if (a >= 10) return tail(a);
	// From where the series is exact, down by Γ(a + 1) = a Γ(a).
	let product = 1;
	let x = a;
	for (; x < 10; x += 1) product *= x;
	return tail(x) + (x - 0.5) * Math.log(x) - x - Math.log(product) - ((a - 0.5) * Math.log(a) - a);
}

export const lnGamma = (a: number): number =>
	(a - 0.5) * Math.log(a) - a + 0.5 * Math.log(2 * Math.PI) + stirlingRest(a);

/** x^a e^−x/Γ(a), without the overflow of its parts. */
function density(a: number, x: number): number {
	const away = (x - a) / a;
	// ln x − ln a − away, small where x is near a.
	const curve = Math.abs(away) < 0.1 ? log1pLess(away) : Math.log(x / a) - away;
	return Math.sqrt(a / (2 * Math.PI)) * Math.exp(a * curve - stirlingRest(a));
}

/** ln(1 + x) − x for small x. */
function log1pLess(x: number): number {
	let term = -x * x;
	let sum = term / 2;
	for (let n = 3; n < 60; n += 1) {
		term *= -x;
		sum += term / n;
		if (Math.abs(term) < 1e-18 * Math.abs(sum)) break;
	}
	return sum;
}

/** Q(a, x) = Γ(a, x)/Γ(a), the upper regularised incomplete gamma function, a > 0, x ≥ 0. */
export function gammaQ(a: number, x: number): number {
	if (x <= 0) return 1;
	return x < a + 1 ? 1 - lowerSeries(a, x) : upperFraction(a, x);
}

function lowerSeries(a: number, x: number): number {
	let term = 1 / a;
	let sum = term;
	for (let n = 1; n < 100_000 && term > sum * 1e-17; n += 1) {
		term *= x / (a + n);
		sum += term;
	}
	return sum * density(a, x);
}

/** Legendre's continued fraction by Lentz's way. */
function upperFraction(a: number, x: number): number {
	const tiny = 1e-300;
	let b = x + 1 - a;
	let c = 1 / tiny;
	let d = 1 / b;
	let h = d;
	for (let n = 1; n < 100_000; n += 1) {
		const step = -n * (n - a);
		b += 2;
		d = 1 / nonZero(step * d + b);
		c = nonZero(b + step / c);
		h *= d * c;
		if (Math.abs(d * c - 1) < 1e-16) break;
	}
	return h * density(a, x);

	function nonZero(value: number) {
		return Math.abs(value) < tiny ? tiny : value;
	}
}

/** I_x(a, b), the regularised incomplete beta function (Lentz; Abramowitz and Stegun 26.5.8). */
export function betaI(x: number, a: number, b: number): number {
	if (x <= 0) return 0;
	if (x >= 1) return 1;
	return x > (a + 1) / (a + b + 2) ? 1 - betaFraction(1 - x, b, a) : betaFraction(x, a, b);
}

function betaFraction(x: number, a: number, b: number): number {
	const lnFront = a * Math.log(x) + b * Math.log1p(-x) - (lnGamma(a) + lnGamma(b) - lnGamma(a + b));
	const tiny = 1e-300;
	const nonZero = (value: number) => (Math.abs(value) < tiny ? tiny : value);
	let c = 1;
	let d = 1 / nonZero(1 - ((a + b) * x) / (a + 1));
	let h = d;
	for (let m = 1; m < 100_000; m += 1) {
		const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
		d = 1 / nonZero(1 + even * d);
		c = nonZero(1 + even / c);
		h *= d * c;
		const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
		d = 1 / nonZero(1 + odd * d);
		c = nonZero(1 + odd / c);
		h *= d * c;
		if (Math.abs(d * c - 1) < 1e-16) break;
	}
	return (Math.exp(lnFront) * h) / a;
}

/** P(T > t) of Student's t with ν degrees of freedom, t ≥ 0; from the middle where t is small beside it. */
export function studentUpper(t: number, nu: number): number {
	const square = t * t;
	return square < nu
		? (1 - betaI(square / (nu + square), 0.5, nu / 2)) / 2
		: betaI(nu / (nu + square), nu / 2, 0.5) / 2;
}
