/**
 * What is known of an uncertain given (JCGM 101, 6.4): normal, lognormal, uniform or triangular, each with
 * optional bounds within which it is known to lie. Bounded means truncated: what lies between the bounds
 * keeps its shape and is scaled to 1; nothing is heaped at the bounds.
 */
import { normalProbability, normalQuantile } from '../numerics/normal';
import { Refused } from '../methods/refused';

export type Distribution = (
	| { kind: 'normal'; mean: number; u: number }
	/** Mean and standard deviation of the quantity itself, not of its logarithm. */
	| { kind: 'lognormal'; mean: number; u: number }
	| { kind: 'uniform'; low: number; high: number }
	| { kind: 'triangular'; low: number; mode: number; high: number }
) & { least?: number | undefined; most?: number | undefined };

/** Probabilities and their inverses from either side, so that neither tail loses digits. */
type Shape = {
	below: (x: number) => number;
	above: (x: number) => number;
	/** x with below(x) = p */
	fromBelow: (p: number) => number;
	/** x with above(x) = p */
	fromAbove: (p: number) => number;
};

/** A value of the given for a probability in (0, 1), or for a standard normal score. */
export type Draw = { ofProbability: (p: number) => number; ofScore: (z: number) => number };

/** A probability between the bounds below which its own rounding would be seen in what is drawn. */
const LEAST_KEPT = 1e-250;
/** Standard deviation over mean of a lognormal, beyond which its moments say nothing. */
const WIDEST_LOGNORMAL = 100;

/** @throws Refused where the parameters describe no distribution, or the bounds leave nothing of it. */
export function drawFrom(name: string, distribution: Distribution): Draw {
	checkDistribution(name, distribution);
	const { kind, least, most } = distribution;
	const shape = shapeOf(distribution);
	if (least === undefined && most === undefined) return unbounded(distribution, shape);

	const inBounds = (x: number) => Math.min(most ?? Infinity, Math.max(least ?? -Infinity, x));
	// From the side on which the bounds lie.
	const upper = least !== undefined && shape.below(least) > 0.5;
	const [side, back] = upper
		? ([shape.above, shape.fromAbove] as const)
		: ([shape.below, shape.fromBelow] as const);
	const start = least === undefined ? 0 : side(least);
	const end = most === undefined ? (upper ? 0 : 1) : side(most);
	if (!(Math.abs(end - start) > LEAST_KEPT))
		throw new Refused(`${name}: its bounds leave nothing of the ${kind} distribution.`, {
			remedy: 'Look at the bounds and at the distribution: they hardly overlap.'
		});
	const ofProbability = (p: number) => inBounds(back(start + p * (end - start)));
	return { ofProbability, ofScore: (z) => ofProbability(normalProbability(z)) };
}

function unbounded(distribution: Distribution, shape: Shape): Draw {
	const ofProbability = shape.fromBelow;
	if (distribution.kind === 'normal') {
		const { mean, u } = distribution;
		return { ofProbability, ofScore: (z) => mean + u * z };
	}
	if (distribution.kind === 'lognormal') {
		const { mu, sigma } = logarithmic(distribution);
		return { ofProbability, ofScore: (z) => Math.exp(mu + sigma * z) };
	}
	return { ofProbability, ofScore: (z) => ofProbability(normalProbability(z)) };
}

function shapeOf(distribution: Distribution): Shape {
	switch (distribution.kind) {
		case 'normal': {
			const { mean, u } = distribution;
			return {
				below: (x) => normalProbability((x - mean) / u),
				above: (x) => normalProbability((mean - x) / u),
				fromBelow: (p) => mean + u * normalQuantile(p),
				fromAbove: (p) => mean - u * normalQuantile(p)
			};
		}
		case 'lognormal': {
			const { mu, sigma } = logarithmic(distribution);
			const score = (x: number) => (x > 0 ? (Math.log(x) - mu) / sigma : -Infinity);
			return {
				below: (x) => normalProbability(score(x)),
				above: (x) => normalProbability(-score(x)),
				fromBelow: (p) => Math.exp(mu + sigma * normalQuantile(p)),
				fromAbove: (p) => Math.exp(mu - sigma * normalQuantile(p))
			};
		}
		case 'uniform': {
			const { low, high } = distribution;
			const share = (length: number) => Math.min(1, Math.max(0, length / (high - low)));
			return {
				below: (x) => share(x - low),
				above: (x) => share(high - x),
				fromBelow: (p) => low + p * (high - low),
				fromAbove: (p) => high - p * (high - low)
			};
		}
		case 'triangular':
			return triangle(distribution.low, distribution.mode, distribution.high);
	}
}

function triangle(low: number, mode: number, high: number): Shape {
	const width = high - low;
	const rising = (mode - low) / width;
	/** Probability beyond x on the side of the triangle that ends at `end`, for x on that side. */
	const corner = (x: number, end: number) => {
		const share = (x - end) / (mode - end);
		return share * share * (end === low ? rising : 1 - rising);
	};
	const below = (x: number) =>
		x <= low ? 0 : x >= high ? 1 : x <= mode ? corner(x, low) : 1 - corner(x, high);
	const above = (x: number) =>
		x <= low ? 1 : x >= high ? 0 : x > mode ? corner(x, high) : 1 - corner(x, low);
	const fromLow = (p: number) => low + Math.sqrt(p * width * (mode - low));
	const fromHigh = (p: number) => high - Math.sqrt(p * width * (high - mode));
	return {
		below,
		above,
		fromBelow: (p) => (p <= rising ? fromLow(p) : fromHigh(1 - p)),
		fromAbove: (p) => (p < 1 - rising ? fromHigh(p) : fromLow(1 - p))
	};
}

/** Mean and standard deviation of the logarithm of a lognormal quantity. */
export function logarithmic({ mean, u }: { mean: number; u: number }) {
	const variance = Math.log1p((u / mean) ** 2);
	return { mu: Math.log(mean) - variance / 2, sigma: Math.sqrt(variance) };
}

function checkDistribution(name: string, distribution: Distribution): void {
	const { kind, least, most } = distribution;
	const refuse = (message: string): never => {
		throw new Refused(`${name}: ${message}`);
	};
	if (least !== undefined && most !== undefined && least >= most)
		refuse('its lower bound does not lie below its upper bound.');
	switch (kind) {
		case 'normal':
		case 'lognormal': {
			const { mean, u } = distribution;
			if (!(u > 0)) refuse('its standard uncertainty must be above 0.');
			if (kind === 'normal') return;
			if (mean <= 0) refuse('a lognormal quantity has a mean above 0.');
			if (u > WIDEST_LOGNORMAL * mean)
				refuse(`a lognormal whose u is above ${WIDEST_LOGNORMAL} times its mean says nothing.`);
			return;
		}
		case 'uniform':
		case 'triangular': {
			const { low, high } = distribution;
			if (!(low < high)) refuse('its lower end does not lie below its upper end.');
			if (kind === 'triangular' && (distribution.mode < low || distribution.mode > high))
				refuse('its mode does not lie between its ends.');
		}
	}
}
