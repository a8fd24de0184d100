/** Release calendar: what a release reaches about the Sun by the day of the year, the line turning in the equator. */
import { departureAt } from '../release/departure';
import { MOST_DAYS, day, daysOf, isEarth, whenInput } from '../release/when';
import { heliocentricPath, relativeExcess } from '../release/heliocentric';
import { c3At } from '../release/orbit';
import { pathOutput, sunDistanceOf, sunInputs } from '../release/sun';
import { escapeRadius } from '../release/thresholds';
import { checkRadii, releaseWarnings, turningBody } from '../release/turning-body';
import { site } from '../line/site';
import { LENGTH, PURE, SPECIFIC_STRENGTH, VELOCITY } from '../quantities/dimension';
import { kilometres } from '../quantities/format';
import { defineMethod } from './method';
import { group, list, quantity } from './parameter';
import { Refused, refuseInput } from './refused';

/** Mean obliquity of the ecliptic at J2000, IAU 2006: 84 381.406″, in rad. */
const EARTH_TILT = (84_381.406 / 3600) * (Math.PI / 180);

const angle = (label: string, symbol: string) =>
	quantity({ label, symbol, dimension: PURE, unit: 'deg' });
export const releaseCalendar = defineMethod({
	name: 'release-calendar',
	title: 'Release calendar',
	summary:
		'Where a mass let go at one radius gets about the Sun, by the day: the line turns in the equator, so v∞ lies along the projection of the body’s motion on it.',
	subject: 'release',
	inputs: {
		site,
		radius: quantity({
			label: 'radius at which it is let go, from the body’s centre',
			symbol: 'r',
			dimension: LENGTH,
			unit: 'km',
			range: { above: 0, most: 1e40 }
		}),
		when: whenInput,
		tilt: quantity({
			label: 'tilt of the equator to the body’s path about the Sun',
			symbol: 'ε',
			dimension: PURE,
			unit: 'deg',
			range: { least: 0, most: Math.PI },
			optional: true,
			help: 'Where left out, for the Earth: its mean obliquity at J2000, 84 381.406″ (IAU 2006); it falls by 47″ a century. Other bodies need it.'
		}),
		...sunInputs
	},
	outputs: {
		tilt: angle('tilt used', 'ε'),
		sunDistance: quantity({
			label: 'distance of the body from the Sun, as used',
			symbol: 'd',
			dimension: LENGTH,
			unit: 'au'
		}),
		c3: quantity({
			label: 'characteristic energy',
			symbol: 'C3',
			dimension: SPECIFIC_STRENGTH,
			unit: 'km^2/s^2'
		}),
		excessSpeed: quantity({
			label: 'hyperbolic excess speed',
			symbol: 'v∞',
			dimension: VELOCITY,
			unit: 'km/s'
		}),
		days: list({
			label: 'by the day, at 0 h UT',
			fewest: 1,
			most: MOST_DAYS,
			of: group({
				label: 'day',
				fields: {
					date: { ...day, optional: true },
					sunLongitude: angle('longitude of the Sun', 'L_sun'),
					declination: {
						...angle('angle between the body’s motion about the Sun and its equator', 'δ'),
						help: 'sin δ = sin ε |cos L_sun|; v∞ stands off the body’s motion by it.'
					},
					outward: pathOutput('let go with the body’s motion'),
					inward: pathOutput('let go against the body’s motion')
				}
			})
		})
	},
	sources: [
		'patched conics in three dimensions: v∞ along the projection of the body’s heliocentric velocity on its equator',
		'longitude of the Sun: astronomy-engine (VSOP87 shortened; IAU precession and nutation)',
		'mean obliquity: IAU 2006 precession'
	],
	validity:
		'The body on a circle about the Sun, the tilt and the equinox fixed over the days. The longitude is the apparent one of date, seen from the Earth’s centre, for 1900 to 2100.',
	leftOut: [
		'eccentricity of the body’s path: 1.7 % in the Earth’s distance, up to 1° in the direction of its motion',
		'aberration (20″) in the Sun’s longitude',
		'other directions of v∞ within the equator, which trade reach against inclination',
		'phasing, and inclination of the planets; J2; the Moon’s pull'
	],
	refuses: [
		'a radius from which the mass does not escape',
		'what is no day of the calendar, and days outside 1900 to 2100',
		'days for bodies other than the Earth, for which the Sun’s longitudes are given instead',
		'a body’s motion that stands upright on its equator'
	],
	caution: '',
	run({ site, radius, when, tilt: given, sunGm, ...rest }) {
		const body = turningBody(site);
		checkRadii(body, [radius], 'radius');
		const distance = sunDistanceOf(site, { sunGm, ...rest });
		const tilt = given ?? (isEarth(site) ? EARTH_TILT : undefined);
		if (tilt === undefined) refuseInput('tilt', 'A body other than the Earth needs its tilt.');
		const c3 = c3At(body, radius);
		if (c3[0] < 0)
			throw new Refused(
				`Let go at a radius of ${kilometres(radius)} the mass stays bound to the body.`,
				{ remedy: `It escapes from a radius of ${kilometres(escapeRadius(body))} on.` }
			);
		const excess = relativeExcess(c3, distance, sunGm);
		return {
			outputs: {
				tilt,
				sunDistance: distance,
				c3: c3[0],
				excessSpeed: Math.sqrt(c3[0]),
				days: daysOf(site, when).map(({ date, sunLongitude }) => {
					const { declination, direction } = departureAt(sunLongitude, tilt);
					return {
						date,
						sunLongitude,
						declination,
						outward: heliocentricPath(distance, excess, direction, 1),
						inward: heliocentricPath(distance, excess, direction, -1)
					};
				})
			},
			warnings: releaseWarnings(site, radius)
		};
	}
});
