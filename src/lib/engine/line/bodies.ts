/** Bodies a line may stand on. Each figure carries its unit, its standard uncertainty and its source. */

import type { Figure } from '../quantities/universal';

export type Body = {
	label: string;
	/** Gravitational parameter, m³/s². */
	gm: Figure;
	/** Equatorial radius (the Moon: mean), m. */
	radius: Figure;
	/** Sidereal rate of rotation, rad/s. */
	rate: Figure;
	/** Second zonal harmonic; null where none is used. */
	j2: Figure | null;
	/** For a moon: distance of its L1 from its centre, m, beyond which one body alone says nothing. */
	l1: Figure | null;
};

export type BodyName = 'earth' | 'mars' | 'moon' | 'ceres';

const turn = 2 * Math.PI;

export const BODIES: Record<BodyName, Body> = {
	earth: {
		label: 'Earth',
		gm: { value: 3.986004418e14, uncertainty: 8e5, source: 'WGS 84, NIMA TR 8350.2' },
		radius: { value: 6_378_137, uncertainty: 0, source: 'WGS 84, NIMA TR 8350.2' },
		rate: { value: 7.292115e-5, uncertainty: 1.5e-12, source: 'WGS 84, NIMA TR 8350.2' },
		j2: { value: 1.08263e-3, uncertainty: null, source: 'WGS 84, rounded' },
		l1: null
	},
	mars: {
		label: 'Mars',
		gm: { value: 4.2828375e13, uncertainty: null, source: 'JPL' },
		radius: { value: 3_396_190, uncertainty: 100, source: 'IAU WGCCRE' },
		rate: { value: turn / 88_642.66, uncertainty: null, source: 'IAU WGCCRE' },
		j2: { value: 1.96045e-3, uncertainty: null, source: 'JPL' },
		l1: null
	},
	moon: {
		label: 'Moon',
		gm: { value: 4.902800066e12, uncertainty: null, source: 'JPL DE440' },
		radius: { value: 1_737_400, uncertainty: 1000, source: 'IAU WGCCRE, mean' },
		rate: { value: turn / (27.321661 * 86_400), uncertainty: null, source: 'IAU WGCCRE' },
		j2: { value: 2.0321e-4, uncertainty: null, source: 'JPL' },
		l1: {
			value: 5.8019e7,
			uncertainty: null,
			source: 'circular three-body problem at the mean distance of 384 400 km'
		}
	},
	ceres: {
		label: 'Ceres',
		gm: { value: 6.26284e10, uncertainty: null, source: 'Dawn, from memory' },
		radius: { value: 482_000, uncertainty: null, source: 'Dawn, from memory' },
		rate: { value: turn / (9.07417 * 3600), uncertainty: null, source: 'Dawn, from memory' },
		j2: null,
		l1: null
	}
};
