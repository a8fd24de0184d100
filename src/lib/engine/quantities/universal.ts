/** Figures that belong to no body a line may stand on. */

export type Figure = {
	/** In coherent SI units. */
	value: number;
	/** Standard uncertainty in the same unit; null where the source gives none, 0 where it is defined. */
	uncertainty: number | null;
	source: string;
};

export const UNIVERSAL = {
	/** G, m³/(kg s²) */
	gravitation: { value: 6.6743e-11, uncertainty: 1.5e-15, source: 'CODATA 2018' },
	/** g₀, m/s² */
	standardGravity: { value: 9.80665, uncertainty: 0, source: '3rd CGPM, 1901' },
	/** GM of the Sun, m³/s² */
	sunGm: {
		value: 1.32712440018e20,
		uncertainty: 8e9,
		source: 'JPL DE405, its uncertainty from memory'
	},
	/** m */
	astronomicalUnit: { value: 149_597_870_700, uncertainty: 0, source: 'IAU 2012 resolution B2' }
} as const satisfies Record<string, Figure>;
