/** What describes a line to be sized: its place, material, base and top. Shared by the exact taper and the stepped line. */
import { quantity, variant, type Told, type ValuesOf } from '../methods/parameter';
import { refuseInput } from '../methods/refused';
import { AREA, DENSITY, MASS, PURE } from '../quantities/dimension';
import { distance, formatFigure } from '../quantities/format';
import type { Field } from './field';
import { givenRadius } from './parameters';
import { fieldOf, site } from './site';
import { siteWarnings } from './site-warnings';
import { designStressOf, strengthInputs, strengthWarnings } from './strength';
import { isAboveSynchronous, type TaperInput } from './taper';

export const sizingInputs = {
	site,
	density: quantity({
		label: 'density',
		symbol: 'ρ',
		dimension: DENSITY,
		unit: 'kg/m^3',
		range: { above: 0 }
	}),
	...strengthInputs,
	base: variant({
		label: 'what the base is sized by',
		cases: {
			lift: {
				label: 'the lift that it carries',
				fields: {
					lift: quantity({
						label: 'lift',
						symbol: 'm_lift',
						dimension: MASS,
						unit: 't',
						range: { above: 0 }
					})
				}
			},
			area: {
				label: 'its section',
				fields: {
					area: quantity({
						label: 'section at the anchor',
						symbol: 'A₀',
						dimension: AREA,
						unit: 'mm^2',
						range: { above: 0 }
					})
				}
			}
		}
	}),
	reserve: quantity({
		label: 'reserve of lift',
		dimension: PURE,
		unit: '',
		range: { least: 0 },
		default: 0,
		help: 'Further lift that the base carries, as a fraction of the lift.'
	}),
	top: {
		...givenRadius('radius of the top, from the body’s centre', 'r_t'),
		help: 'Above the balance radius: only there the counterweight pulls outwards.'
	}
} as const;

export type Sizing = ValuesOf<typeof sizingInputs>;

/** @throws Refused where no line can stand or end there. */
export function sizingOf(input: Sizing): { field: Field; taper: TaperInput } {
	const field = fieldOf(input.site);
	refuseTop(field, 'top', input.top);
	return { field, taper: taperInputOf(input) };
}

export const taperInputOf = (input: Sizing): TaperInput => ({
	density: input.density,
	designStress: designStressOf(input),
	base: input.base,
	reserve: input.reserve,
	top: input.top
});

/** @throws Refused where no line can end at this radius. */
export function refuseTop(field: Field, path: string, top: number): void {
	if (!isAboveSynchronous(field, top))
		refuseInput(
			path,
			`The top at the radius ${distance(top)} is not above the balance radius of ${distance(field.balance)}: nothing there pulls outwards to hold the line up.`,
			`Set the top above the radius ${distance(field.balance)}.`
		);
	if (top >= field.limit)
		refuseInput(
			path,
			'The line reaches the centre of the primary.',
			`Set the top below the radius ${distance(field.limit)}.`
		);
}

/** @param peakArea greatest section, m² */
export const sizingWarnings = (input: Sizing, field: Field, peakArea: Told): string[] => [
	...(typeof peakArea === 'number'
		? []
		: [
				`Beyond any build: the greatest section is 10 to the power ${formatFigure(peakArea.log10, 4)} m².`
			]),
	'Sized for a climber below the balance radius only: one above it adds its outward pull to everything below. The as-built analysis and the climber envelope look at that.',
	...strengthWarnings(input),
	...siteWarnings(input.site, field, input.top)
];
