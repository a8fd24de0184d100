/** Stepped line: a line as manufactured, in sections of constant area with joints between them. */
import { equalHeights, equalRises } from '../line/boundaries';
import type { Field } from '../line/field';
import { givenRadius, radiusOf, stressOf, toldArea, toldForce, toldMass } from '../line/parameters';
import { sizingInputs, sizingOf, sizingWarnings } from '../line/sizing';
import { sizeStepped, type Section } from '../line/stepped';
import { baseSection, taperShape } from '../line/taper';
import { lnSum, told as toldOf } from '../numerics/logarithm';
import { MASS, PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity, told, variant, type ValuesOf } from './parameter';
import { refuseInput } from './refused';

const penalty = (label: string) => told({ label, dimension: PURE, unit: '%' });
const count = integer({
	label: 'number of sections',
	symbol: 'N',
	range: { least: 1, most: 20_000 }
});

const inputs = {
	...sizingInputs,
	sections: variant({
		label: 'where the sections meet',
		cases: {
			heights: { label: 'sections of equal height', fields: { count } },
			rises: {
				label: 'sections over which the potential changes by equal amounts',
				fields: { count }
			},
			radii: {
				label: 'at given radii',
				fields: {
					boundaries: list({
						label: 'interior boundaries upwards, without anchor and top',
						fewest: 0,
						most: 20_000,
						of: givenRadius('radius')
					})
				}
			}
		}
	}),
	jointMass: quantity({
		label: 'mass of a joint',
		symbol: 'm_j',
		dimension: MASS,
		unit: 'kg',
		range: { least: 0 },
		default: 0,
		help: 'One at each interior boundary.'
	})
} as const;

export const steppedLine = defineMethod({
	name: 'stepped-line',
	title: 'Stepped line',
	summary:
		'Sizes a line as manufactured: sections of constant area, each with the design stress as its greatest, joints between them, and what it weighs over the exact taper.',
	subject: 'line',
	inputs,
	outputs: {
		designStress: stressOf('design stress, allowable over factor of safety', 'σ_d'),
		sectionMass: toldMass('mass of the sections', 'm'),
		jointMass: toldMass('mass of the joints', 'm_j'),
		lineMass: toldMass('mass of the line, joints included', 'm'),
		counterweight: toldMass('counterweight', 'm_c'),
		total: toldMass('line and counterweight, lift excluded', 'm_tot'),
		taperLineMass: toldMass('mass of the exact taper from the same base', 'm'),
		taperTotal: toldMass('exact taper and its counterweight', 'm_tot'),
		linePenalty: {
			...penalty('mass penalty of the line over the exact taper'),
			help: 'Joints included.'
		},
		totalPenalty: {
			...penalty('mass penalty with the counterweight'),
			help: 'Joints included.'
		},
		balanceRadius: radiusOf('balance radius', 'r_s'),
		greatestTension: toldForce('greatest tension'),
		leastStress: stressOf('least stress along the line'),
		sections: list({
			label: 'sections upwards from the anchor; the greatest stress in each is the design stress',
			fewest: 1,
			most: 20_001,
			of: group({
				label: 'section',
				fields: {
					from: radiusOf('radius of its lower end'),
					to: radiusOf('radius of its upper end'),
					area: toldArea('section', 'A'),
					mass: toldMass('mass', 'm'),
					lowerTension: toldForce('tension at its lower end'),
					upperTension: toldForce('tension at its upper end'),
					lowerStress: stressOf('stress at its lower end'),
					upperStress: stressOf('stress at its upper end')
				}
			})
		})
	},
	sources: [
		'dT/dr = ρ A g, statics of a line in the co-rotating frame, section by section',
		'exact taper: P. K. Aravind, Am. J. Phys. 75 (2007) 125'
	],
	validity:
		'Straight line in the plane of the equator at rest in the co-rotating frame; density and section as deployed, under load; one climber, below the balance radius. Sized outwards from the base.',
	leftOut: [
		'climbers above the balance radius',
		'the length and the strength of joints',
		'the air and elasticity'
	],
	refuses: [
		'a section too long to carry itself, named with the length it must stay under',
		'a section or a joint above the balance radius that pulls outwards by more than the tension there',
		'a top at or below r_s (1 + 1e-9), or at the centre of the primary',
		'boundaries that do not ascend from the anchor to the top'
	],
	caution:
		'Sizing is no release for use: factors of safety and allowables follow the governing standard, and a line that carries people or passes over them is for local codes and licensed practice to judge.',
	run(input) {
		const { field, taper } = sizingOf(input);
		const { density, designStress, top } = taper;
		const baseArea = baseSection(field, taper);
		const boundaries = boundariesOf(field, top, input.sections);
		const { sections, lnSections, lnCounterweight } = sizeStepped(field, {
			density,
			designStress,
			lnBaseTension: Math.log(baseArea) + Math.log(designStress),
			boundaries,
			jointMass: input.jointMass
		});
		const lnJoints = Math.log(input.jointMass * (sections.length - 1));
		const lnLine = lnSum(lnSections, lnJoints);
		const lnTotal = lnSum(lnLine, lnCounterweight);

		const shape = taperShape(field, density, designStress);
		const lnPeak = Math.log(baseArea) + shape.lnTaper;
		const lnTaper =
			lnPeak + lnSum(shape.lnMass(field.balance, field.base), shape.lnMass(field.balance, top));
		const lnTaperTotal = lnSum(lnTaper, lnPeak + shape.lnCounterweight(top));
		const lnGreatestArea = sections.reduce((most, { lnArea }) => Math.max(most, lnArea), -Infinity);
		return {
			outputs: {
				designStress,
				sectionMass: toldOf(lnSections),
				jointMass: toldOf(lnJoints),
				lineMass: toldOf(lnLine),
				counterweight: toldOf(lnCounterweight),
				total: toldOf(lnTotal),
				taperLineMass: toldOf(lnTaper),
				taperTotal: toldOf(lnTaperTotal),
				linePenalty: lessOne(lnLine - lnTaper),
				totalPenalty: lessOne(lnTotal - lnTaperTotal),
				balanceRadius: field.balance,
				greatestTension: toldOf(lnGreatestArea + Math.log(designStress)),
				leastStress: sections.reduce(
					(least, { lowerStress, upperStress }) => Math.min(least, lowerStress, upperStress),
					Infinity
				),
				sections: sections.map(describe)
			},
			warnings: sizingWarnings(input, field, toldOf(lnGreatestArea))
		};
	}
});

/** @throws Refused where given boundaries do not ascend from the anchor to the top. */
function boundariesOf(
	field: Field,
	top: number,
	sections: ValuesOf<typeof inputs>['sections']
): number[] {
	switch (sections.kind) {
		case 'heights':
			return equalHeights(field, top, sections.count);
		case 'rises':
			return equalRises(field, top, sections.count);
		case 'radii': {
			const radii = [field.base, ...sections.boundaries, top];
			radii.slice(1).forEach((radius, i) => {
				if (radius > radii[i]!) return;
				const isTop = i === radii.length - 2;
				refuseInput(
					isTop ? 'top' : `sections.boundaries.${i}`,
					isTop
						? 'The top does not lie above the last boundary.'
						: `Boundary ${i + 1} does not lie above ${i === 0 ? 'the anchor' : 'the one before it'}.`
				);
			});
			return radii;
		}
	}
}

const describe = ({ lnArea, lnMass, lnLower, lnUpper, ...section }: Section) => ({
	...section,
	area: toldOf(lnArea),
	mass: toldOf(lnMass),
	lowerTension: toldOf(lnLower),
	upperTension: toldOf(lnUpper)
});

/** e^ln − 1, by its logarithm where that is beyond 1e300. */
const lessOne = (ln: number) => {
	const ratio = toldOf(ln);
	return typeof ratio === 'number' ? Math.expm1(ln) : ratio;
};
