/** Periods of what excites a line, and how far a line's own keep from them. */

export type Named = { name: string; period: number };

const HOUR = 3600;

/** The usual tidal constituents, h: common practice. */
const TIDES: readonly Named[] = [
	{ name: 'M2', period: 12.4206 * HOUR },
	{ name: 'S2', period: 12 * HOUR },
	{ name: 'N2', period: 12.6583 * HOUR },
	{ name: 'K1', period: 23.9345 * HOUR },
	{ name: 'O1', period: 25.8193 * HOUR }
];

/** @param omega rate of rotation of the frame, rad/s */
export function forcingsOf(
	omega: number,
	given: { tides: boolean; climberInterval: number | undefined; others: readonly Named[] }
): Named[] {
	return [
		{ name: 'one turn of the body', period: (2 * Math.PI) / omega },
		...(given.tides ? [...TIDES, { name: 'solar day', period: 24 * HOUR }] : []),
		...(given.climberInterval === undefined
			? []
			: [{ name: 'climber interval', period: given.climberInterval }]),
		...given.others
	];
}

export type Separation = {
	mode: string;
	period: number;
	forcing: string;
	forcingPeriod: number;
	/** |P/P_f − 1| */
	separation: number;
	clear: boolean;
};

export const separations = (
	modes: readonly Named[],
	forcings: readonly Named[],
	limit: number
): Separation[] =>
	modes.flatMap((mode) =>
		forcings.map((forcing) => {
			const separation = Math.abs(mode.period / forcing.period - 1);
			return {
				mode: mode.name,
				period: mode.period,
				forcing: forcing.name,
				forcingPeriod: forcing.period,
				separation,
				clear: separation >= limit
			};
		})
	);
