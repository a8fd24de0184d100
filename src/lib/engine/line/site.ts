/** Where a line stands: a known body, one of the user's own, or a moon with its primary. */
import { choice, flag, quantity, variant, type ValueOf } from '../methods/parameter';
import { Refused } from '../methods/refused';
import { LENGTH, PURE, TIME, dimension, over } from '../quantities/dimension';
import { UNIVERSAL } from '../quantities/universal';
import { BODIES, type Body } from './bodies';
import { bodyField, moonField, type Field, type Spheroid } from './field';

const GRAVITATIONAL = dimension(0, 3, -2);

export const site = variant({
	label: 'where the line stands',
	cases: {
		body: {
			label: 'a known body',
			fields: {
				body: choice({
					label: 'body',
					options: { earth: 'Earth', mars: 'Mars', moon: 'Moon', ceres: 'Ceres' }
				}),
				j2: flag({
					label: 'with J2',
					default: false,
					help: 'Whether the body’s oblateness counts (equator); none is known here for Ceres.'
				})
			}
		},
		own: {
			label: 'a body of one’s own',
			fields: {
				gm: quantity({
					label: 'gravitational parameter',
					symbol: 'GM',
					dimension: GRAVITATIONAL,
					unit: 'm^3/s^2',
					range: { above: 0 },
					optional: true,
					help: 'This or the mass.'
				}),
				mass: quantity({
					label: 'mass',
					symbol: 'M',
					dimension: dimension(1),
					unit: 'kg',
					range: { above: 0 },
					optional: true
				}),
				radius: quantity({
					label: 'equatorial radius',
					symbol: 'R',
					dimension: LENGTH,
					unit: 'km',
					range: { above: 0 }
				}),
				rate: quantity({
					label: 'rate of rotation',
					symbol: 'ω',
					dimension: over(PURE, TIME),
					unit: 'rad/s',
					range: { above: 0 },
					optional: true,
					help: 'This or the period, sidereal.'
				}),
				period: quantity({
					label: 'period of rotation',
					dimension: TIME,
					unit: 'h',
					range: { above: 0 },
					optional: true
				}),
				j2: quantity({
					label: 'second zonal harmonic',
					symbol: 'J2',
					dimension: PURE,
					unit: '',
					range: { least: 0, below: 0.5 },
					default: 0
				})
			}
		},
		moon: {
			label: 'a moon with its primary',
			fields: {
				side: choice({
					label: 'side',
					options: { near: 'towards the primary, through L1', far: 'away from it, through L2' },
					default: 'near'
				}),
				moonGm: quantity({
					label: 'gravitational parameter of the moon',
					symbol: 'GM₂',
					dimension: GRAVITATIONAL,
					unit: 'm^3/s^2',
					range: { above: 0 },
					default: BODIES.moon.gm.value
				}),
				moonRadius: quantity({
					label: 'radius of the moon',
					symbol: 'R',
					dimension: LENGTH,
					unit: 'km',
					range: { above: 0 },
					default: BODIES.moon.radius.value
				}),
				primaryGm: quantity({
					label: 'gravitational parameter of the primary',
					symbol: 'GM₁',
					dimension: GRAVITATIONAL,
					unit: 'm^3/s^2',
					range: { above: 0 },
					default: BODIES.earth.gm.value
				}),
				distance: quantity({
					label: 'distance between the centres',
					symbol: 'd',
					dimension: LENGTH,
					unit: 'km',
					range: { above: 0 },
					default: 384_400e3,
					help: 'Circular orbit; the rate of rotation follows from it.'
				})
			}
		}
	}
});

export type Site = ValueOf<typeof site>;

export const ofBody = (body: Body, withJ2: boolean): Field => bodyField(spheroid(body, withJ2));

const spheroid = ({ gm, radius, rate, j2 }: Body, withJ2: boolean): Spheroid => ({
	gm: gm.value,
	radius: radius.value,
	rate: rate.value,
	j2: withJ2 && j2 ? j2.value : 0
});

/** @throws Refused where no line can stand. */
export function fieldOf(place: Site): Field {
	const field = place.kind === 'moon' ? moonLine(place) : bodyField(spheroidOf(place));
	if (field.balance > field.base * (1 + 1e-9)) return field;
	throw new Refused('The balance radius lies inside the body: nothing holds a line up.', {
		remedy: 'Look at the rate of rotation, the radius and the gravitational parameter.'
	});
}

/** The one body that a line stands on. */
export function spheroidOf(place: Site & { kind: 'body' | 'own' }): Spheroid {
	if (place.kind === 'body') return spheroid(BODIES[place.body], place.j2);
	const gm = oneOf('site', {
		gm: place.gm,
		mass: place.mass && place.mass * UNIVERSAL.gravitation.value
	});
	const rate = oneOf('site', {
		rate: place.rate,
		period: place.period && (2 * Math.PI) / place.period
	});
	return { gm, radius: place.radius, rate, j2: place.j2 };
}

function moonLine(place: Site & { kind: 'moon' }): Field {
	const { moonRadius, distance, moonGm, primaryGm, side } = place;
	if (moonRadius >= distance)
		throw new Refused('The moon is larger than its distance from the primary.');
	if (moonGm >= primaryGm) throw new Refused('The moon is heavier than its primary.');
	return moonField({ moonGm, primaryGm, moonRadius, distance }, side);
}

/** The one of two ways of saying a thing that was used. */
function oneOf(path: string, ways: Record<string, number | undefined>): number {
	const given = Object.entries(ways).filter(([, value]) => value !== undefined);
	if (given.length === 1) return given[0]![1]!;
	const names = Object.keys(ways).join(' or ');
	throw new Refused(`Give ${names}, and only one of them.`, {
		code: 'input',
		faults: [{ path, message: `Give ${names}, and only one of them.` }]
	});
}
