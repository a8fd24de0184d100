/** A body for properties that hold for all of them. */
import type { TurningBody } from './turning-body';

/** @param size log10 of the radius in m. @param density kg/m³. @param ratio height of the balance radius in radii */
export function bodyOf(size: number, density: number, ratio: number): TurningBody {
	const radius = 10 ** size;
	const gm = 6.6743e-11 * density * (4 / 3) * Math.PI * radius ** 3;
	const rate = Math.sqrt(gm / (radius * (1 + ratio)) ** 3);
	return { gm, radius, rate, balance: Math.cbrt(gm / rate ** 2) };
}
