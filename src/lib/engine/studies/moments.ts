/**
 * Mean and standard deviation of what is known of a given, bounds included: the estimate and the standard
 * uncertainty that the law of propagation takes (JCGM 100, 4.3). Closed where nothing is cut off, else by
 * quadrature over the density between the bounds.
 */
import { integrate } from '../numerics/quadrature';
import { drawFrom, logarithmic, type Distribution } from './distribution';

export type Moments = { mean: number; u: number };

/** @throws Refused as `drawFrom` does. */
export function momentsOf(name: string, distribution: Distribution): Moments {
	drawFrom(name, distribution);
	const { kind, least, most } = distribution;
	const bounded = least !== undefined || most !== undefined;
	switch (kind) {
		case 'normal': {
			const { mean, u } = distribution;
			if (!bounded) return { mean, u };
			const score = (x: number) => (x - mean) / u;
			return ofScores((z) => mean + u * z, 0, optional(score, least), optional(score, most));
		}
		case 'lognormal': {
			if (!bounded) return { mean: distribution.mean, u: distribution.u };
			const { mu, sigma } = logarithmic(distribution);
			const score = (x: number) => (x > 0 ? (Math.log(x) - mu) / sigma : -Infinity);
			const value = (z: number) => Math.exp(mu + sigma * z);
			return ofScores(value, sigma, optional(score, least), optional(score, most));
		}
		case 'uniform': {
			const low = Math.max(distribution.low, least ?? -Infinity);
			const high = Math.min(distribution.high, most ?? Infinity);
			return { mean: low + (high - low) / 2, u: (high - low) / Math.sqrt(12) };
		}
		case 'triangular': {
			const { low, mode, high } = distribution;
			if (!bounded) return triangleMoments(low, mode, high);
			const from = Math.max(low, least ?? -Infinity);
			const to = Math.min(high, most ?? Infinity);
			const density = (x: number) =>
				x < mode ? (x - low) / (mode - low) : (high - x) / (high - mode);
			return overDensity(
				(x) => x,
				density,
				mode > from && mode < to ? [from, mode, to] : [from, to]
			);
		}
	}
}

const optional = (f: (x: number) => number, x: number | undefined) =>
	x === undefined ? undefined : f(x);

function triangleMoments(low: number, mode: number, high: number): Moments {
	const [a, b] = [mode - low, high - mode];
	return { mean: mode + (b - a) / 3, u: Math.sqrt((a * a + b * b + a * b) / 18) };
}

/**
 * Of a quantity that is a function of a normal score between two scores. Its square times the density has
 * its peak at 2σ for a lognormal; beyond ten deviations from the peaks (or what is nearest to them between
 * the bounds) nothing is left.
 */
function ofScores(
	value: (z: number) => number,
	sigma: number,
	least = -Infinity,
	most = Infinity
): Moments {
	const peak = Math.min(most, Math.max(least, 0));
	const last = Math.min(most, Math.max(least, 2 * sigma));
	const from = Math.max(least, -Math.sqrt(peak ** 2 + 100));
	const to = Math.min(most, 2 * sigma + Math.sqrt((last - 2 * sigma) ** 2 + 100));
	const edges = Array.from({ length: 17 }, (_, i) => from + ((to - from) * i) / 16);
	const scale = value(peak);
	const density = (z: number) => Math.exp(((peak - z) * (peak + z)) / 2);
	const { mean, u } = overDensity((z) => value(z) - scale, density, edges);
	return { mean: scale + mean, u };
}

/** Mean and, about it in a second pass, standard deviation. */
function overDensity(
	value: (x: number) => number,
	density: (x: number) => number,
	edges: readonly number[]
): Moments {
	const over = (f: (x: number) => number) =>
		integrate((x) => f(x) * density(x), edges, 1e-12).value;
	const whole = over(() => 1);
	const mean = over(value) / whole;
	return { mean, u: Math.sqrt(over((x) => (value(x) - mean) ** 2) / whole) };
}
