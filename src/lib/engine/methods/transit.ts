/** A climber's transit: time, energy, side force. */
import { fieldOf, site } from '../line/site';
import { siteWarnings } from '../line/site-warnings';
import { speedAt, transit as along, turnsOf, type Climber } from '../motion/transit';
import { gauss16 } from '../numerics/gauss';
import { ENERGY, FORCE, LENGTH, MASS, POWER, PURE, TIME, VELOCITY } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity } from './parameter';
import { Refused, refuseInput } from './refused';

const radius = (label: string) =>
	quantity({ label, symbol: 'r', dimension: LENGTH, unit: 'km', range: { above: 0 } });
const speed = (label: string) =>
	quantity({ label, symbol: 'v', dimension: VELOCITY, unit: 'km/h', range: { above: 0 } });
const share = (label: string) => ({ label, dimension: PURE, unit: '' });
const energy = (label: string) => quantity({ label, dimension: ENERGY, unit: 'MWh' });
const sideForce = (label: string) => quantity({ label, dimension: FORCE, unit: 'N' });

export const transit = defineMethod({
	name: 'transit',
	title: 'Climber transit',
	summary:
		'Time, energy and side force of a climber between two radii, its speed limited by v_max and by power.',
	subject: 'motion',
	inputs: {
		site,
		mass: quantity({
			label: 'mass of the climber',
			symbol: 'm',
			dimension: MASS,
			unit: 't',
			range: { above: 0 }
		}),
		from: radius('radius where it starts'),
		to: radius('radius where it ends'),
		topSpeed: speed('greatest speed'),
		power: quantity({
			label: 'power, driving and braking',
			symbol: 'P',
			dimension: POWER,
			unit: 'MW',
			range: { above: 0 }
		}),
		efficiency: quantity({
			...share('efficiency of the drive'),
			symbol: 'η',
			range: { above: 0, most: 1 },
			default: 1
		}),
		recovery: quantity({
			...share('share of the braked energy that is recovered'),
			symbol: 'η_rec',
			range: { least: 0, most: 1 },
			default: 0
		}),
		points: integer({ label: 'rows of the table', range: { least: 2, most: 5000 }, default: 100 })
	},
	outputs: {
		time: quantity({ label: 'time on the way', symbol: 't', dimension: TIME, unit: 'd' }),
		energy: energy('energy drawn against gravity'),
		braked: energy('energy to be braked'),
		recovered: energy('energy recovered of it'),
		meanSpeed: speed('mean speed'),
		leastSpeed: speed('least speed'),
		leastSpeedRadius: radius('radius of the least speed'),
		greatestSideForce: {
			...sideForce('greatest Coriolis force on the line'),
			help: 'Westwards while the climber goes up, eastwards while it goes down.'
		},
		rows: list({
			label: 'along the way',
			fewest: 2,
			most: 6000,
			of: group({
				label: 'radius',
				fields: {
					radius: radius('radius'),
					time: quantity({ label: 'time since the start', dimension: TIME, unit: 'd' }),
					speed: speed('speed'),
					sideForce: sideForce('Coriolis force on the line, westwards')
				}
			})
		})
	},
	sources: ['v = min(v_max, ηP/(m|g|)); Coriolis force 2mωv'],
	validity:
		'Straight line in the plane of the equator; the climber is a point mass and moves steadily.',
	leftOut: [
		'kinetic energy and the times of setting off and stopping',
		'the air',
		'losses that do not go with the force on the climber',
		'the line’s answer to the climber: see side displacement and the as-built analysis'
	],
	refuses: ['a start and an end that are the same, or that lie outside the field of the line'],
	caution: '',
	run(input) {
		const field = fieldOf(input.site);
		const { from, to } = input;
		if (from === to) refuseInput('to', 'The climber ends where it starts.');
		for (const [path, r] of Object.entries({ from, to })) {
			if (r < field.base * (1 - 1e-12))
				refuseInput(path, `${path} lies below the anchor, inside the body.`);
			if (r >= field.limit) refuseInput(path, `${path} lies beyond the primary.`);
		}
		const climber: Climber = input;
		const way = along(field, climber, from, to);
		if (!(way.time <= 1e300)) throw new Refused('The climber never arrives.');
		return {
			outputs: {
				...way,
				meanSpeed: Math.abs(to - from) / way.time,
				rows: rowsOf(input, field, climber)
			},
			warnings: siteWarnings(input.site, field, Math.max(from, to))
		};
	}
});

type Way = { from: number; to: number; points: number };

/** At equal steps of the radius, and where the speed has a kink. */
function rowsOf({ from, to, points }: Way, field: Parameters<typeof speedAt>[0], climber: Climber) {
	const up = to > from ? 1 : -1;
	const steps = Array.from({ length: points }, (_, i) => from + ((to - from) * i) / (points - 1));
	const radii = [...new Set([...steps, ...turnsOf(field, climber, from, to), to])]
		.filter((r) => (r - from) * up >= 0 && (to - r) * up >= 0)
		.sort((a, b) => (a - b) * up);
	let time = 0;
	return radii.map((radius, i) => {
		if (i > 0) {
			const before = radii[i - 1]!;
			time += Math.abs(gauss16((r) => 1 / speedAt(field, climber, r), before, radius));
		}
		const speed = speedAt(field, climber, radius);
		return { radius, time, speed, sideForce: 2 * climber.mass * field.omega * speed * up };
	});
}
