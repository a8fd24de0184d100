/**
 * A line as built: its field, its section over the radius in smooth pieces, the point masses on it and
 * the counterweight at its top. ρ and A are as deployed, under load; radii are from the body's centre.
 */
import { group, list, quantity, variant, type ValuesOf } from '../methods/parameter';
import { Refused, refuseInput } from '../methods/refused';
import { AREA, DENSITY, MASS, PRESSURE } from '../quantities/dimension';
import type { Field } from './field';
import { constantPiece, linearPiece, taperPiece, type Piece } from './piece';
import { givenRadius } from './parameters';
import { fieldOf, site } from './site';

export type { Piece };

export type PointMass = { radius: number; mass: number };

export type Line = {
	field: Field;
	/** kg/m³ */
	density: number;
	/** From the anchor to the top without a gap. */
	pieces: readonly Piece[];
	/** Upwards; one at the anchor counts above the base tension. */
	masses: readonly PointMass[];
	/** kg, at the top */
	counterweight: number;
};

export const topOf = ({ pieces }: Line): number => pieces.at(-1)!.to;

const sectionAt = (label: string) =>
	quantity({ label, symbol: 'A', dimension: AREA, unit: 'mm^2', range: { above: 0 } });

/** What describes a line whose section is known; shared by all methods that look at one. */
export const lineInputs = {
	site,
	density: quantity({
		label: 'density',
		symbol: 'ρ',
		dimension: DENSITY,
		unit: 'kg/m^3',
		range: { above: 0 }
	}),
	section: variant({
		label: 'section over the radius',
		cases: {
			taper: {
				label: 'constant-stress taper',
				fields: {
					baseArea: sectionAt('section at the anchor'),
					designStress: quantity({
						label: 'design stress of the taper',
						symbol: 'σ_d',
						dimension: PRESSURE,
						unit: 'GPa',
						range: { above: 0 }
					}),
					top: givenRadius('radius of the top, from the body’s centre', 'r_t')
				}
			},
			stepped: {
				label: 'sections of constant area',
				fields: {
					baseRadius: {
						...givenRadius('radius of the anchor; the body’s own where left out'),
						optional: true
					},
					sections: list({
						label: 'sections upwards from the anchor',
						fewest: 1,
						most: 20_000,
						of: group({
							label: 'section',
							fields: { to: givenRadius('radius of its upper end'), area: sectionAt('area') }
						})
					})
				}
			},
			table: {
				label: 'table, linear between rows',
				fields: {
					rows: list({
						label: 'rows upwards from the anchor',
						fewest: 2,
						most: 20_000,
						of: group({
							label: 'row',
							fields: { radius: givenRadius('radius'), area: sectionAt('area') }
						})
					})
				}
			}
		}
	}),
	masses: list({
		label: 'point masses on the line: climbers, joints, stations',
		fewest: 0,
		most: 20_000,
		of: group({
			label: 'point mass',
			fields: {
				radius: givenRadius('radius'),
				mass: quantity({
					label: 'mass',
					symbol: 'm',
					dimension: MASS,
					unit: 't',
					range: { least: 0 }
				})
			}
		})
	}),
	counterweight: quantity({
		label: 'counterweight',
		symbol: 'm_c',
		dimension: MASS,
		unit: 't',
		range: { least: 0 }
	})
} as const;

export type LineInput = ValuesOf<typeof lineInputs>;

/** @throws Refused where rows do not ascend, a mass lies off the line or no line can stand there. */
export function lineOf(input: LineInput): Line {
	const field = fieldOf(input.site);
	const pieces = piecesOf(field, input);
	const top = pieces.at(-1)!.to;
	if (top >= field.limit) refuseInput('section', 'The line reaches the centre of the primary.');
	const masses = [...input.masses].sort((a, b) => a.radius - b.radius);
	input.masses.forEach(({ radius }, i) => {
		if (radius < pieces[0]!.from || radius > top)
			refuseInput(`masses.${i}.radius`, `Point mass ${i + 1} does not lie on the line.`);
	});
	return { field, density: input.density, pieces, masses, counterweight: input.counterweight };
}

function piecesOf(field: Field, { section, density }: LineInput): Piece[] {
	switch (section.kind) {
		case 'taper': {
			const { baseArea, designStress, top } = section;
			if (top <= field.base) refuseInput('section.top', 'The top lies below the anchor.');
			const shape = shapeOf(field, density / designStress, baseArea, top);
			const edges = [field.base, ...(top > field.balance ? [field.balance] : []), top];
			return edges.slice(1).map((to, i) => taperPiece(field, shape, edges[i]!, to));
		}
		case 'stepped': {
			const radii = [section.baseRadius ?? field.base, ...section.sections.map(({ to }) => to)];
			ascending(radii, (i) => `section.sections.${i - 1}.to`);
			return section.sections.map(({ to, area }, i) => constantPiece(field, radii[i]!, to, area));
		}
		case 'table': {
			const { rows } = section;
			ascending(
				rows.map(({ radius }) => radius),
				(i) => `section.rows.${i}.radius`
			);
			const points = rows.map(({ radius, area }) => [radius, area] as const);
			return points.slice(1).map((point, i) => linearPiece(field, points[i]!, point));
		}
	}
}

/** @throws Refused where a section of the taper cannot be told as a number. */
function shapeOf(field: Field, k: number, baseArea: number, top: number) {
	const lnPeak = Math.log(baseArea) + k * field.depth(field.base);
	const lnTop = lnPeak - k * field.depth(top);
	const told = 300 * Math.LN10;
	if (!(lnPeak < told))
		throw new Refused('Beyond any build: the section at the balance radius is above 1e300 m².', {
			code: 'beyond-any-build',
			remedy: 'A stronger or lighter material, or another body, brings it down.'
		});
	if (!(lnTop > -told))
		throw new Refused('The section at the top is below 1e-300 m²: no line is left there.', {
			remedy: 'Set the top lower.'
		});
	return { k, peakArea: Math.exp(lnPeak) };
}

function ascending(radii: readonly number[], path: (i: number) => string): void {
	radii.forEach((radius, i) => {
		if (i > 0 && !(radius > radii[i - 1]!))
			refuseInput(path(i), `Radius ${i + 1} does not lie above the one before it.`);
	});
}
