/** Lines for specs: on an Earth-like body of round numbers. */
import { lineOf, type Line, type LineInput, type PointMass } from './line';

export const BODY = { kind: 'own', gm: 4e14, radius: 6.4e6, rate: 7.3e-5, j2: 0 } as const;

export const TOP = 1.06e8;

type Section = LineInput['section'];

export const lineWith = (
	section: Section,
	counterweight: number,
	masses: PointMass[] = [],
	site: LineInput['site'] = { ...BODY, mass: undefined, period: undefined }
): Line => lineOf({ site, density: 1300, section, masses, counterweight });

export const taper = (baseArea = 4e-6, designStress = 50e9, top = TOP): Section => ({
	kind: 'taper',
	baseArea,
	designStress,
	top
});

/** Equal sections of one area each. */
export const stepped = (areas: number[], top = TOP): Section => ({
	kind: 'stepped',
	baseRadius: undefined,
	sections: areas.map((area, i) => ({
		to: i === areas.length - 1 ? top : BODY.radius + ((i + 1) * (top - BODY.radius)) / areas.length,
		area
	}))
});

export const table = (...rows: [radius: number, area: number][]): Section => ({
	kind: 'table',
	rows: rows.map(([radius, area]) => ({ radius, area }))
});
