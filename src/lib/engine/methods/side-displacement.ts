/** How far side loads carry a line from the vertical, and how it leans at the anchor. */
import { lineInputs, lineOf, topOf } from '../line/line';
import { siteWarnings } from '../line/site-warnings';
import { hang } from '../line/tension';
import { climberLoads, displace, isOn } from '../motion/side-displacement';
import { requireTaut } from '../motion/taut';
import { FORCE, LENGTH, MASS, PURE, VELOCITY, over } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity } from './parameter';
import { refuseInput } from './refused';

const radius = (label: string) =>
	quantity({ label, symbol: 'r', dimension: LENGTH, unit: 'km', range: { above: 0 } });
const force = (label: string) => quantity({ label, dimension: FORCE, unit: 'N' });
const displacement = (label: string) =>
	quantity({ label, symbol: 'y', dimension: LENGTH, unit: 'km' });

export const sideDisplacement = defineMethod({
	name: 'side-displacement',
	title: 'Side displacement',
	summary:
		'Static displacement of a taut line in the plane of rotation under climbers’ Coriolis forces and other side loads, and its lean at the anchor.',
	subject: 'motion',
	inputs: {
		...lineInputs,
		climbers: list({
			label: 'climbers under way',
			fewest: 0,
			most: 500,
			optional: true,
			help: 'Their masses count on the line; do not name them among the point masses again.',
			of: group({
				label: 'climber',
				fields: {
					radius: radius('radius'),
					mass: quantity({
						label: 'mass',
						symbol: 'm',
						dimension: MASS,
						unit: 't',
						range: { above: 0 }
					}),
					speed: quantity({
						label: 'speed, upwards above 0',
						symbol: 'v',
						dimension: VELOCITY,
						unit: 'km/h'
					})
				}
			})
		}),
		pointLoads: list({
			label: 'side forces, eastwards above 0',
			fewest: 0,
			most: 500,
			optional: true,
			of: group({
				label: 'force',
				fields: { radius: radius('radius'), force: force('force, eastwards') }
			})
		}),
		spreadLoads: list({
			label: 'side forces per length, constant between two radii',
			fewest: 0,
			most: 500,
			optional: true,
			of: group({
				label: 'load',
				fields: {
					from: radius('from the radius'),
					to: radius('to the radius'),
					force: quantity({
						label: 'force per length, eastwards',
						symbol: 'q',
						dimension: over(FORCE, LENGTH),
						unit: 'N/km'
					})
				}
			})
		}),
		points: integer({ label: 'rows of the table', range: { least: 2, most: 5000 }, default: 100 })
	},
	outputs: {
		anchorLean: quantity({
			label: 'slope of the line at the anchor, eastwards',
			symbol: 'y′',
			dimension: PURE,
			unit: 'deg'
		}),
		anchorForce: force('side force on the anchor, eastwards'),
		greatestDisplacement: displacement('greatest displacement, eastwards above 0'),
		greatestRadius: radius('radius of it'),
		topDisplacement: displacement('displacement of the top'),
		rows: list({
			label: 'along the line',
			fewest: 2,
			most: 5000,
			of: group({
				label: 'radius',
				fields: { radius: radius('radius'), displacement: displacement('displacement') }
			})
		})
	},
	sources: [
		'(T y′)′ − μ k_y y = −q in the co-rotating frame; Coriolis force 2mωv',
		'Gauss–Lobatto elements of high order'
	],
	validity:
		'Small displacements of a taut line in the plane of the equator; climbers move steadily and slowly against the line’s own periods.',
	leftOut: ['the motion on the way to the displaced shape', 'the air', 'bending'],
	refuses: ['a line that is slack anywhere', 'loads off the line', 'a line unstable in the plane'],
	caution: '',
	run(input) {
		const climbers = input.climbers ?? [];
		const line = lineOf({
			...input,
			masses: [...input.masses, ...climbers.map(({ radius, mass }) => ({ radius, mass }))]
		});
		requireTaut(line, hang(line));
		const points = input.pointLoads ?? [];
		const spread = input.spreadLoads ?? [];
		points.forEach(({ radius }, i) => {
			if (!isOn(line, radius))
				refuseInput(`pointLoads.${i}.radius`, `Side force ${i + 1} does not lie on the line.`);
		});
		spread.forEach(({ from, to }, i) => {
			if (!(from < to) || !isOn(line, from) || !isOn(line, to))
				refuseInput(
					`spreadLoads.${i}`,
					`Spread load ${i + 1} must run upwards between two radii on the line.`
				);
		});
		const loads = { points: [...climberLoads(line, climbers), ...points], spread };
		const found = displace(line, loads);
		const [bottom, top] = [line.pieces[0]!.from, topOf(line)];
		return {
			outputs: {
				anchorLean: found.anchorLean,
				anchorForce: found.anchorForce,
				greatestDisplacement: found.greatest.displacement,
				greatestRadius: found.greatest.radius,
				topDisplacement: found.at(top),
				rows: Array.from({ length: input.points }, (_, i) => {
					const radius =
						i === input.points - 1 ? top : bottom + ((top - bottom) * i) / (input.points - 1);
					return { radius, displacement: found.at(radius) };
				})
			},
			warnings: [
				...(Math.abs(found.anchorLean) > 0.1
					? ['The line leans by more than 0.1 at the anchor: the displacement is no longer small.']
					: []),
				...siteWarnings(input.site, line.field, top)
			]
		};
	}
});
