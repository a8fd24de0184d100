/** Reach: how far from and how near to the Sun a mass gets that is let go from the line. */
import { c3At } from '../release/orbit';
import { IN_PLANE, c3ToReach, heliocentricPath, relativeExcess } from '../release/heliocentric';
import { PLANETS } from '../release/planets';
import { pathOutput, sunDistanceOf, sunInputs } from '../release/sun';
import { radiusForC3 } from '../release/thresholds';
import { checkRadii, radiiInput, releaseWarnings, turningBody } from '../release/turning-body';
import { site } from '../line/site';
import { LENGTH, SPECIFIC_STRENGTH, VELOCITY } from '../quantities/dimension';
import { kilometres } from '../quantities/format';
import { defineMethod } from './method';
import { choice, flag, group, list, quantity, text } from './parameter';
import { refuseInput } from './refused';

const length = (label: string, symbol?: string) =>
	quantity({ label, symbol, dimension: LENGTH, unit: 'km' });
const c3 = quantity({
	label: 'characteristic energy',
	symbol: 'C3',
	dimension: SPECIFIC_STRENGTH,
	unit: 'km^2/s^2'
});
const excessSpeed = quantity({
	label: 'hyperbolic excess speed',
	symbol: 'v∞',
	dimension: VELOCITY,
	unit: 'km/s'
});
const targetFields = {
	name: text({ label: 'name', longest: 100 }),
	distance: quantity({
		label: 'distance from the Sun',
		dimension: LENGTH,
		unit: 'au',
		range: { above: 0 }
	})
} as const;

/** A planet of the default table this near to the body's own path is the body itself. */
const ITSELF = 1e-3;

export const reach = defineMethod({
	name: 'reach',
	title: 'Reach about the Sun',
	summary:
		'How near to the Sun and how far from it a mass gets that is let go from the line, by radius; and the least radius from which it gets to each planet.',
	subject: 'release',
	inputs: {
		site,
		...sunInputs,
		radii: { ...radiiInput, fewest: 0, optional: true },
		targets: list({
			label: 'distances from the Sun to get to',
			fewest: 0,
			most: 1000,
			optional: true,
			help: 'Where left out: the semi-major axes of the planets at J2000 (JPL approximate elements, from memory).',
			of: group({ label: 'target', fields: targetFields })
		}),
		top: {
			...length('radius of the line’s top, from the body’s centre', 'r_t'),
			range: { above: 0 },
			optional: true,
			help: 'To tell which targets lie beyond the line.'
		}
	},
	outputs: {
		sunDistance: quantity({
			label: 'distance of the body from the Sun, as used',
			symbol: 'd',
			dimension: LENGTH,
			unit: 'au'
		}),
		targets: list({
			label: 'least radius by target',
			fewest: 0,
			most: 1000,
			of: group({
				label: 'target',
				fields: {
					...targetFields,
					direction: choice({
						label: 'let go',
						options: {
							outward: 'with the body’s motion, outwards from the Sun',
							inward: 'against the body’s motion, inwards to the Sun'
						}
					}),
					c3,
					excessSpeed,
					radius: length('least radius from which it gets there', 'r'),
					height: length('the same as a height'),
					beyondTop: flag({ label: 'lies above the line’s top', default: false })
				}
			})
		}),
		paths: list({
			label: 'paths by radius, in the order given',
			fewest: 0,
			most: 20_000,
			of: group({
				label: 'release',
				fields: {
					radius: length('radius', 'r'),
					height: length('height above the surface'),
					c3,
					excessSpeed: { ...excessSpeed, optional: true },
					outward: {
						...pathOutput('let go with the body’s motion'),
						optional: true,
						help: 'None where the mass stays bound to the body.'
					},
					inward: { ...pathOutput('let go against the body’s motion'), optional: true }
				}
			})
		})
	},
	sources: [
		'patched conics: v = v_body ± √C3 on a circle about the Sun, vis-viva, far (near) point 2a − d',
		'least departure to a distance: the tangent transfer ellipse of Hohmann',
		'planets: Keplerian elements for approximate positions, JPL (E. M. Standish), from memory'
	],
	validity:
		'The body on a circle about the Sun, all paths in its plane; v∞ along or against its motion. The body’s own pull is taken to end where the Sun’s begins.',
	leftOut: [
		'change of plane: the line turns in the equator, not in the ecliptic (the release calendar has it)',
		'phasing: whether the planet is there',
		'eccentricity and inclination of all planets, J2, the Moon, the air'
	],
	refuses: [
		'a target on the body’s own path',
		'the Moon, and a line between a moon and its primary',
		'a body of one’s own without its distance from the Sun',
		'a radius inside the body'
	],
	caution: '',
	run({ site, sunGm, radii = [], targets, top, ...rest }) {
		const body = turningBody(site);
		const distance = sunDistanceOf(site, { sunGm, ...rest });
		checkRadii(body, radii, 'radii');
		const wanted =
			targets ?? PLANETS.filter((planet) => Math.abs(planet.distance / distance - 1) > ITSELF);
		const found = wanted.map((target, i) => {
			if (target.distance === distance)
				refuseInput(
					`targets.${i}.distance`,
					`${target.name} lies on the body’s own path: no path of its own leads there.`
				);
			const c3 = c3ToReach(target.distance, distance, sunGm);
			const radius = radiusForC3(body, c3);
			return {
				...target,
				direction: target.distance > distance ? ('outward' as const) : ('inward' as const),
				c3,
				excessSpeed: Math.sqrt(c3),
				radius,
				height: radius - body.radius,
				beyondTop: top !== undefined && radius > top
			};
		});
		return {
			outputs: {
				sunDistance: distance,
				targets: found,
				paths: radii.map((radius) => {
					const c3 = c3At(body, radius);
					const about = { radius, height: radius - body.radius, c3: c3[0] };
					if (c3[0] < 0)
						return { ...about, excessSpeed: undefined, outward: undefined, inward: undefined };
					const excess = relativeExcess(c3, distance, sunGm);
					return {
						...about,
						excessSpeed: Math.sqrt(c3[0]),
						outward: heliocentricPath(distance, excess, IN_PLANE, 1),
						inward: heliocentricPath(distance, excess, IN_PLANE, -1)
					};
				})
			},
			warnings: [
				...found
					.filter(({ beyondTop }) => beyondTop)
					.map(
						({ name, radius }) =>
							`${name} is out of reach: it takes a radius of ${kilometres(radius)}, above the line’s top.`
					),
				...releaseWarnings(site, Math.max(...radii, ...found.map(({ radius }) => radius), 0))
			]
		};
	}
});
