/** What a stress is held against: an allowable and a factor of safety of the user's own; none is fixed here. */
import { choice, quantity, type ValuesOf } from '../methods/parameter';
import { PRESSURE, PURE } from '../quantities/dimension';

const STANDARDS = {
	nasa: 'NASA-STD-5001',
	ecss: 'ECSS-E-ST-32-10',
	other: 'another standard, the user’s own'
} as const;

export const strengthInputs = {
	allowable: quantity({
		label: 'allowable stress of the material',
		symbol: 'σ_al',
		dimension: PRESSURE,
		unit: 'GPa',
		range: { above: 0 }
	}),
	factorOfSafety: quantity({
		label: 'factor of safety',
		symbol: 'FS',
		dimension: PURE,
		unit: '',
		range: { above: 0 },
		help: 'From the governing standard; none is fixed here.'
	}),
	standard: choice({
		label: 'governing standard',
		options: STANDARDS,
		optional: true,
		help: 'The standard from which the factor of safety is taken. It changes no figure.'
	})
} as const;

export type Strength = ValuesOf<typeof strengthInputs>;

/** Allowable over factor of safety, Pa. */
export const designStressOf = ({ allowable, factorOfSafety }: Strength): number =>
	allowable / factorOfSafety;

export function strengthWarnings({ factorOfSafety, standard }: Strength): string[] {
	const source = standard ? ` from ${STANDARDS[standard]}` : '';
	return [
		...(factorOfSafety < 1
			? ['The factor of safety is below 1: the design stress is above the allowable.']
			: []),
		`The factor of safety of ${factorOfSafety} is the user’s choice${source}; that it governs here is theirs to show.`
	];
}
