/** A line of uniform section with nothing pulling at either end (METHODS: σ(r) = ρ [U(r) − U(R)]). */
import type { Field } from './field';

/** Greatest stress, Pa, at the synchronous radius. */
export function uniformPeakStress(field: Field, density: number): number {
	return density * field.rise(field.base, field.balance);
}

/**
 * Radius at which the line ends, m: U(H) = U(R) beyond the synchronous radius. Without J2 this is
 * (R/2)[√(1 + 8(r_s/R)³) − 1], which is where the bisection starts from; it ends at the last digit.
 */
export function freeStandingRadius(field: Field): number {
	const { base, balance: synchronous, rise } = field;
	const closed = (base / 2) * (Math.sqrt(1 + 8 * (synchronous / base) ** 3) - 1);
	let low = Math.max(synchronous, closed * (1 - 1e-2));
	let high = closed * (1 + 1e-2);
	for (let i = 0; i < 200 && high - low > closed * 1e-15; i += 1) {
		const middle = (low + high) / 2;
		if (rise(base, middle) > 0) low = middle;
		else high = middle;
	}
	return (low + high) / 2;
}

/** Length of a uniform wire that breaks under its own weight at g₀, m. */
export const breakingLength = (stress: number, density: number) => stress / (density * 9.80665);
