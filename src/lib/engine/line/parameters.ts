/** Quantities that many methods of the line tell, each with its dimension and the unit that forms and tables show. */
import { quantity, told } from '../methods/parameter';
import { AREA, FORCE, LENGTH, MASS, PRESSURE, PURE } from '../quantities/dimension';

export const radiusOf = (label: string, symbol = 'r') =>
	quantity({ label, symbol, dimension: LENGTH, unit: 'km' });

/** A radius that is asked for; a hundred light-years are beyond any line. */
export const givenRadius = (label: string, symbol = 'r') =>
	quantity({ label, symbol, dimension: LENGTH, unit: 'km', range: { above: 0, most: 1e18 } });

export const forceOf = (label: string, symbol = 'T') =>
	quantity({ label, symbol, dimension: FORCE, unit: 'kN' });

export const stressOf = (label: string, symbol = 'σ') =>
	quantity({ label, symbol, dimension: PRESSURE, unit: 'GPa' });

export const massOf = (label: string, symbol = 'm') =>
	quantity({ label, symbol, dimension: MASS, unit: 't' });

export const marginAt = (label: string) =>
	quantity({
		label,
		symbol: 'MS',
		dimension: PURE,
		unit: '',
		optional: true,
		help: 'σ_al/(FS σ) − 1; none where nothing is under tension.'
	});

export const toldMass = (label: string, symbol: string) =>
	told({ label, symbol, dimension: MASS, unit: 't' });

export const toldArea = (label: string, symbol: string) =>
	told({ label, symbol, dimension: AREA, unit: 'mm^2' });

export const toldForce = (label: string, symbol = 'T') =>
	told({ label, symbol, dimension: FORCE, unit: 'kN' });
