/** As-built: tension, stress and margin of a line whose section, masses and length are fixed. */
import { analyse, lineMass } from '../line/as-built';
import { elasticity, requiredLift, thermal } from '../line/as-built-inputs';
import { elongation, lengthOf } from '../line/elongation';
import { lineInputs, lineOf, topOf } from '../line/line';
import { forceOf, marginAt, massOf, radiusOf, stressOf } from '../line/parameters';
import { siteWarnings } from '../line/site-warnings';
import { designStressOf, strengthInputs, strengthWarnings } from '../line/strength';
import { hang } from '../line/tension';
import { AREA, PURE } from '../quantities/dimension';
import { distance } from '../quantities/format';
import { defineMethod } from './method';
import { group, integer, list, quantity } from './parameter';

const inputs = {
	...lineInputs,
	...strengthInputs,
	lift: requiredLift,
	elasticity,
	points: integer({
		label: 'radii told, equally spaced from the anchor to the top',
		range: { least: 2, most: 20_000 },
		default: 200
	})
} as const;

export const asBuilt = defineMethod({
	name: 'as-built',
	title: 'As-built analysis',
	summary:
		'Tension, stress and margin of safety along a line whose section, point masses, counterweight and length are fixed; its anchor tension, where it is slack, and what it stretches by.',
	subject: 'line',
	inputs,
	outputs: {
		anchorTension: {
			...forceOf('tension at the anchor', 'T₀'),
			help: 'Below a mass that sits there.'
		},
		requiredTension: {
			...forceOf('tension that the required reserve asks for at the anchor', 'T_req'),
			optional: true
		},
		reserveHeld: quantity({
			label: 'tension at the anchor over the lift’s weight there',
			dimension: PURE,
			unit: '',
			optional: true
		}),
		greatestTension: forceOf('greatest tension', 'T_max'),
		greatestStress: stressOf('greatest stress', 'σ_max'),
		allowedStress: stressOf('allowable over factor of safety'),
		leastMargin: marginAt('least margin of safety'),
		leastMarginRadius: {
			...radiusOf('radius of the least margin'),
			optional: true,
			help: 'The lowest of those told within 1e-9 of the least.'
		},
		slack: list({
			label: 'where the line is slack; a failed check if anywhere',
			fewest: 0,
			most: 100_000,
			of: group({
				label: 'stretch',
				fields: { from: radiusOf('from the radius'), to: radiusOf('to the radius') }
			}),
			help: 'T < 0; less than 1e-13 of the greatest tension counts as rounding.'
		}),
		lineMass: massOf('mass of the line, without point masses'),
		pointMass: massOf('point masses together'),
		total: massOf('line, point masses and counterweight'),
		length: radiusOf('length as deployed', 'L'),
		manufacturedLength: { ...radiusOf('length as manufactured', 'L₀'), optional: true },
		stretch: {
			...radiusOf('stretch, deployed less manufactured length', 'L − L₀'),
			optional: true
		},
		rows: list({
			label: 'along the line, upwards; two rows where something jumps',
			fewest: 2,
			most: 200_000,
			of: group({
				label: 'radius',
				fields: {
					radius: radiusOf('radius'),
					area: quantity({ label: 'section', symbol: 'A', dimension: AREA, unit: 'mm^2' }),
					tension: forceOf('tension'),
					stress: stressOf('stress'),
					margin: marginAt('margin of safety'),
					strain: quantity({
						label: 'strain',
						symbol: 'ε',
						dimension: PURE,
						unit: '',
						optional: true
					})
				}
			})
		})
	},
	sources: [
		'dT/dr = ρ A g − statics of a line in the co-rotating frame; T(r_t) = −m_c g(r_t)',
		'margin of safety as in NASA-STD-5001 and ECSS-E-ST-32-10: allowable over factor of safety times stress, less one'
	],
	validity:
		'Straight line in the plane of the equator at rest in the co-rotating frame, its length fixed; density and section as deployed, under load, Poisson contraction included by the user. E and α are constant. A table of sections is linear between its rows.',
	leftOut: [
		'motion of the climbers and of the line',
		'the air, wind and ice',
		'bending, and local stress at joints and grips',
		'creep and damage'
	],
	refuses: [
		'radii that do not ascend, masses off the line',
		'a taper whose section is above 1e300 m² or below 1e-300 m² somewhere',
		'a strain of −100 % or less'
	],
	caution:
		'A calculation, not a release for use: factors of safety and allowables follow the governing standard, and a line that carries people or passes over them is for local codes and licensed practice to judge.',
	run(input) {
		const line = lineOf(input);
		const limitStress = designStressOf(input);
		const elastic = input.elasticity && thermal(input.elasticity);
		const found = analyse(line, limitStress, input.points, elastic);
		const { rows, extremes, leastMargin, slack } = found;
		const { anchorTension, greatestTension, stress, stressRadius } = extremes;
		const length = lengthOf(line);
		const stretch = elastic && elongation(line, hang(line), elastic);
		const ownMass = lineMass(line);
		const pointMass = line.masses.reduce((sum, { mass }) => sum + mass, 0);
		const liftWeight = input.lift && input.lift.mass * line.field.g(line.pieces[0]!.from);
		const requiredTension = input.lift && input.lift.reserve * liftWeight!;
		return {
			outputs: {
				anchorTension,
				requiredTension,
				reserveHeld: liftWeight && anchorTension / liftWeight,
				greatestTension,
				greatestStress: stress,
				allowedStress: limitStress,
				leastMargin,
				leastMarginRadius: leastMargin === undefined ? undefined : stressRadius,
				slack,
				lineMass: ownMass,
				pointMass,
				total: ownMass + pointMass + line.counterweight,
				length,
				manufacturedLength: stretch === undefined ? undefined : length - stretch,
				stretch,
				rows
			},
			warnings: [
				...slack.map(
					({ from, to }) =>
						`Slack from the radius ${distance(from)} to ${distance(to)}: the line would have to push there.`
				),
				...(requiredTension !== undefined && anchorTension < requiredTension
					? ['The anchor tension is below the required reserve.']
					: []),
				...(leastMargin !== undefined && leastMargin < 0
					? [`The stress is above the allowed at the radius ${distance(stressRadius)}.`]
					: []),
				...digitsLost(anchorTension, greatestTension),
				...strengthWarnings(input),
				...siteWarnings(input.site, line.field, topOf(line))
			]
		};
	}
});

/** A line whose greatest tension dwarfs that at its anchor gives the latter as a small difference. */
function digitsLost(anchorTension: number, greatestTension: number): string[] {
	if (1e-15 * greatestTension < 1e-9 * Math.abs(anchorTension)) return [];
	return [
		'The anchor tension is the small difference of large figures: it follows the last digits of the counterweight and of the sections.'
	];
}
