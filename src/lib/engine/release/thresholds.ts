/** The radii at which the fate of a mass let go changes, and those that give a wanted C3. */
import { twoSum, type DoubleDouble } from '../numerics/double-double';
import { quantity } from '../methods/parameter';
import { refuseInput } from '../methods/refused';
import { root } from '../numerics/root';
import { LENGTH } from '../quantities/dimension';
import type { TurningBody } from './turning-body';

/** 2^⅓ r_s, m: from here on a mass let go escapes. */
export const escapeRadius = ({ balance }: TurningBody): number => Math.cbrt(2) * balance;

/**
 * The radius, m, from which the periapsis just touches `entry`, m, below r_s: with s = r/r_s and
 * p = entry/r_s the root of s⁴ + p s³ = 2p, whose left side only rises.
 */
export function grazingRadius({ balance }: TurningBody, entry: number): number {
	const p = entry / balance;
	return balance * root((s) => s ** 3 * (s + p) - 2 * p, p, 1);
}

/**
 * The radius, m, at which C3 = ω²r² − 2GM/r comes to `c3` ≥ 0, m²/s²: with s = r/r_s the root of
 * s³ − c s = 2, c = C3/(ω r_s)², which lies between 2^⅓ and 2^⅓ + √c.
 */
export function radiusForC3({ rate, balance }: TurningBody, c3: number): number {
	const c = c3 / (rate * balance) ** 2;
	const least = Math.cbrt(2);
	return balance * root((s) => s - c / s - 2 / s ** 2, least, (least + Math.sqrt(c)) * (1 + 1e-15));
}

export const interfaceInput = quantity({
	label: 'height of the entry interface above the surface',
	symbol: 'h_e',
	dimension: LENGTH,
	unit: 'km',
	range: { least: 0 },
	default: 0,
	help: 'Where the air begins to count; 0 is the surface. On Earth 120 km is common practice.'
});

/** R + h_e in two doubles, m. @throws Refused where it does not lie below r_s */
export function entryRadius({ radius, balance }: TurningBody, height: number): DoubleDouble {
	const entry = twoSum(radius, height);
	if (entry[0] >= balance)
		refuseInput('interfaceHeight', 'The entry interface does not lie below the balance radius.');
	return entry;
}
