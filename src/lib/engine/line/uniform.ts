/**
 * A line of uniform section in the co-rotating frame: σ(r) = σ₀ + ρ [U(r) − U(R)], greatest at r_s. With
 * σ₀ at the anchor and nothing pulling at its upper end, that end lies above r_s, where σ is zero again.
 */
import { UNIVERSAL } from '../quantities/universal';
import type { Field } from './field';
import { radiusAbove } from './level';

/** Greatest stress, Pa, at the balance radius; σ₀ is the stress at the anchor. */
export function uniformPeakStress(field: Field, density: number, baseStress = 0): number {
	return baseStress + density * field.depth(field.base);
}

/**
 * Radius of the upper end, m, where σ is zero: U(H) = U(R) − σ₀/ρ beyond r_s. One body without J2 and
 * σ₀ = 0 has H = (R/2)[√(1 + 8(r_s/R)³) − 1].
 */
export function freeStandingRadius(field: Field, specificBaseStress = 0): number {
	return radiusAbove(field, field.depth(field.base) + specificBaseStress);
}

/** Stress, Pa, at radius r of a line with σ₀ at the anchor. */
export function uniformStress(
	field: Field,
	density: number,
	baseStress: number,
	r: number
): number {
	return baseStress + density * field.rise(field.base, r);
}

/** Length of a uniform wire that breaks under its own weight at g₀, m. */
export const breakingLength = (stress: number, density: number) =>
	stress / (density * UNIVERSAL.standardGravity.value);
