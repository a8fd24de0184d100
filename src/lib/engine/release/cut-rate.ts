/** How often a line is cut by what flies about: by height bands of the user's own table. */

export type Band = {
	/** Height of the lower and of the upper edge, m. */
	from: number;
	to: number;
	/** Objects above the critical size through a unit of area and time, 1/(m² s). */
	flux: number;
	/** Width over which a passing object cuts the line, m. */
	width: number;
};

/** Λ = Σ F w Δr, 1/s: a Poisson process, the bands independent of each other. */
export const cutRates = (bands: readonly Band[]): number[] =>
	bands.map(({ from, to, flux, width }) => flux * width * (to - from));

/** P(cut within t) = 1 − exp(−Λt) */
export const cutProbability = (rate: number, time: number): number => -Math.expm1(-rate * time);
