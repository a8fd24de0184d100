/** As-built: tension, stress and margin of a line whose section, masses and length are fixed. */
import { analyse, lineMass } from '../line/as-built';
import { elongation, lengthOf, type Elasticity } from '../line/elongation';
import { lineInputs, lineOf, topOf } from '../line/line';
import { siteWarnings } from '../line/site-warnings';
import { designStressOf, strengthInputs, strengthWarnings } from '../line/strength';
import { hang } from '../line/tension';
import {
	AREA,
	FORCE,
	LENGTH,
	MASS,
	PRESSURE,
	PURE,
	TEMPERATURE,
	over
} from '../quantities/dimension';
import { distance } from '../quantities/format';
import { defineMethod } from './method';
import { group, integer, list, quantity, type ValuesOf } from './parameter';

const radius = (label: string) => quantity({ label, symbol: 'r', dimension: LENGTH, unit: 'km' });
const force = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: FORCE, unit: 'kN' });
const mass = (label: string) => quantity({ label, symbol: 'm', dimension: MASS, unit: 't' });

const inputs = {
	...lineInputs,
	...strengthInputs,
	lift: group({
		label: 'lift that the anchor must hold in reserve',
		optional: true,
		fields: {
			mass: quantity({
				label: 'lift',
				symbol: 'm_lift',
				dimension: MASS,
				unit: 't',
				range: { above: 0 }
			}),
			reserve: quantity({
				label: 'required reserve, as a fraction of the lift’s weight at the anchor',
				dimension: PURE,
				unit: '',
				range: { least: 0 },
				help: 'The anchor tension with all masses in place must reach this share of the lift’s weight.'
			})
		}
	}),
	elasticity: group({
		label: 'elasticity, for strain and stretch',
		optional: true,
		fields: {
			modulus: quantity({
				label: 'modulus of elasticity',
				symbol: 'E',
				dimension: PRESSURE,
				unit: 'GPa',
				range: { above: 0 }
			}),
			expansion: quantity({
				label: 'coefficient of thermal expansion',
				symbol: 'α',
				dimension: over(PURE, TEMPERATURE),
				unit: '1/K',
				default: 0
			}),
			temperatureRise: quantity({
				label: 'temperature above that of manufacture',
				symbol: 'ΔT',
				dimension: TEMPERATURE,
				unit: 'K',
				default: 0,
				help: 'A difference of temperatures.'
			})
		}
	}),
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
			...force('tension at the anchor', 'T₀'),
			help: 'Below a mass that sits there.'
		},
		requiredTension: {
			...force('tension that the required reserve asks for at the anchor', 'T_req'),
			optional: true
		},
		reserveHeld: quantity({
			label: 'tension at the anchor over the lift’s weight there',
			dimension: PURE,
			unit: '',
			optional: true
		}),
		greatestTension: force('greatest tension', 'T_max'),
		greatestStress: quantity({
			label: 'greatest stress',
			symbol: 'σ_max',
			dimension: PRESSURE,
			unit: 'GPa'
		}),
		allowedStress: quantity({
			label: 'allowable over factor of safety',
			dimension: PRESSURE,
			unit: 'GPa'
		}),
		leastMargin: quantity({
			label: 'least margin of safety',
			symbol: 'MS',
			dimension: PURE,
			unit: '',
			optional: true,
			help: 'σ_al/(FS σ) − 1; none where nothing is under tension.'
		}),
		leastMarginRadius: {
			...radius('radius of the least margin'),
			optional: true,
			help: 'The lowest of those told within 1e-9 of the least.'
		},
		slack: list({
			label: 'where the line is slack; a failed check if anywhere',
			fewest: 0,
			most: 100_000,
			of: group({
				label: 'stretch',
				fields: { from: radius('from the radius'), to: radius('to the radius') }
			}),
			help: 'T < 0; less than 1e-13 of the greatest tension counts as rounding.'
		}),
		lineMass: mass('mass of the line, without point masses'),
		pointMass: mass('point masses together'),
		total: mass('line, point masses and counterweight'),
		length: quantity({ label: 'length as deployed', symbol: 'L', dimension: LENGTH, unit: 'km' }),
		manufacturedLength: quantity({
			label: 'length as manufactured',
			symbol: 'L₀',
			dimension: LENGTH,
			unit: 'km',
			optional: true
		}),
		stretch: quantity({
			label: 'stretch, deployed less manufactured length',
			symbol: 'L − L₀',
			dimension: LENGTH,
			unit: 'km',
			optional: true
		}),
		rows: list({
			label: 'along the line, upwards; two rows where something jumps',
			fewest: 2,
			most: 200_000,
			of: group({
				label: 'radius',
				fields: {
					radius: radius('radius'),
					area: quantity({ label: 'section', symbol: 'A', dimension: AREA, unit: 'mm^2' }),
					tension: force('tension', 'T'),
					stress: quantity({ label: 'stress', symbol: 'σ', dimension: PRESSURE, unit: 'GPa' }),
					margin: quantity({
						label: 'margin of safety',
						symbol: 'MS',
						dimension: PURE,
						unit: '',
						optional: true
					}),
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
		const elastic = input.elasticity && elasticityOf(input.elasticity);
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

const elasticityOf = ({
	modulus,
	expansion,
	temperatureRise
}: NonNullable<ValuesOf<typeof inputs>['elasticity']>): Elasticity => ({
	modulus,
	thermalStrain: expansion * temperatureRise
});

/** A line whose greatest tension dwarfs that at its anchor gives the latter as a small difference. */
function digitsLost(anchorTension: number, greatestTension: number): string[] {
	if (1e-15 * greatestTension < 1e-9 * Math.abs(anchorTension)) return [];
	return [
		'The anchor tension is the small difference of large figures: it follows the last digits of the counterweight and of the sections.'
	];
}
