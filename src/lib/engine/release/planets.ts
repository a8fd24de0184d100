/**
 * Semi-major axes of the planets at J2000, au: Keplerian elements for approximate positions of the major
 * planets, JPL (E. M. Standish), table 1; from memory. The Earth's is that of the Earth–Moon barycentre.
 */
import type { BodyName } from '../line/bodies';
import { UNIVERSAL } from '../quantities/universal';

const AU = UNIVERSAL.astronomicalUnit.value;

const IN_AU = {
	Mercury: 0.38709927,
	Venus: 0.72333566,
	Earth: 1.00000261,
	Mars: 1.52371034,
	Jupiter: 5.202887,
	Saturn: 9.53667594,
	Uranus: 19.18916464,
	Neptune: 30.06992276
} as const;

export type Target = { name: string; distance: number };

export const PLANETS: readonly Target[] = Object.entries(IN_AU).map(([name, a]) => ({
	name,
	distance: a * AU
}));

/** Distances from the Sun, m, where none is given; the Moon has no path of its own about the Sun. */
export const SUN_DISTANCES: Readonly<Record<Exclude<BodyName, 'moon'>, number>> = {
	earth: AU,
	mars: IN_AU.Mars * AU,
	// Semi-major axis of Ceres, from memory.
	ceres: 2.767 * AU
};
