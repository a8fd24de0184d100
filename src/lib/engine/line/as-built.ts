/**
 * As-built analysis of a line whose section, masses, counterweight and length are fixed: tension, stress and
 * margin along it, its anchor tension, where it is slack. MS(r) = σ_al/(FS σ) − 1; none where σ ≤ 0.
 */
import { strainOf, type Elasticity } from './elongation';
import { topOf, type Line } from './line';
import { slackIn, type Interval } from './slack';
import { hangForSurvey, survey, type Extremes } from './survey';
import type { Stretch } from './tension';

/** One radius of the line, one side of it where something jumps. */
export type Row = {
	/** m */
	radius: number;
	/** m² */
	area: number;
	/** N */
	tension: number;
	/** Pa */
	stress: number;
	margin: number | undefined;
	strain: number | undefined;
};

export type AsBuilt = {
	/** Upwards. */
	rows: Row[];
	extremes: Extremes;
	leastMargin: number | undefined;
	slack: Interval[];
};

export const marginOf = (limitStress: number, stress: number): number | undefined =>
	stress > 0 ? limitStress / stress - 1 : undefined;

/**
 * @param limitStress σ_al/FS, Pa
 * @param points how many radii, equally spaced from the anchor to the top, are told besides those where something jumps
 */
export function analyse(
	line: Line,
	limitStress: number,
	points: number,
	elasticity?: Elasticity
): AsBuilt {
	const bottom = line.pieces[0]!.from;
	const step = (topOf(line) - bottom) / Math.max(1, points - 1);
	const grid = Array.from({ length: Math.max(0, points - 2) }, (_, i) => bottom + (i + 1) * step);
	const hanging = hangForSurvey(line, grid);
	const extremes = survey(line, hanging, limitStress);
	return {
		rows: rowsOf(hanging.stretches, limitStress, elasticity),
		extremes,
		leastMargin: marginOf(limitStress, extremes.stress),
		slack: slackIn(line, hanging, extremes.greatestTension)
	};
}

function rowsOf(
	stretches: readonly Stretch[],
	limitStress: number,
	elasticity: Elasticity | undefined
): Row[] {
	const rows: Row[] = [];
	const add = (radius: number, area: number, tension: number) => {
		const stress = tension / area;
		const strain = elasticity && strainOf(elasticity, stress);
		rows.push({ radius, area, tension, stress, margin: marginOf(limitStress, stress), strain });
	};
	for (const { from, to, lower, upper, lowerArea, upperArea } of stretches) {
		const before = rows.at(-1);
		const goesOn =
			before?.tension === lower && Math.abs(before.area - lowerArea) <= 1e-12 * lowerArea;
		if (!goesOn) add(from, lowerArea, lower);
		add(to, upperArea, upper);
	}
	return rows;
}

/** Mass of the line's material, kg. */
export const lineMass = ({ density, pieces }: Line): number =>
	density * pieces.reduce((sum, { from, to, volume }) => sum + volume(from, to), 0);
