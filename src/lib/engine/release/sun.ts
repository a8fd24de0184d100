/** What the methods about paths round the Sun ask for, and the words for such a path. */
import { group, quantity, type ValuesOf } from '../methods/parameter';
import { refuseInput, Refused } from '../methods/refused';
import type { Site } from '../line/site';
import { LENGTH, PURE, dimension } from '../quantities/dimension';
import { UNIVERSAL } from '../quantities/universal';
import { SUN_DISTANCES } from './planets';

export const sunInputs = {
	sunDistance: quantity({
		label: 'distance of the body from the Sun',
		symbol: 'd',
		dimension: LENGTH,
		unit: 'au',
		range: { above: 0 },
		optional: true,
		help: 'Radius of its circular path. Where left out: 1 au for the Earth, 1.5237 au for Mars, 2.767 au for Ceres; a body of one’s own needs it.'
	}),
	sunGm: quantity({
		label: 'gravitational parameter of the Sun',
		symbol: 'GM_sun',
		dimension: dimension(0, 3, -2),
		unit: 'm^3/s^2',
		range: { above: 0 },
		default: UNIVERSAL.sunGm.value
	})
} as const;

/** m from the Sun. @throws Refused where the body has no path of its own about the Sun, or none is known */
export function sunDistanceOf(site: Site, { sunDistance }: ValuesOf<typeof sunInputs>): number {
	if (site.kind !== 'body')
		return (
			sunDistance ??
			refuseInput('sunDistance', 'A body of one’s own needs its distance from the Sun.')
		);
	if (site.body === 'moon')
		throw new Refused('What leaves the Moon is still bound to the Earth, not yet about the Sun.');
	return sunDistance ?? SUN_DISTANCES[site.body];
}

const fromSun = (label: string) => quantity({ label, dimension: LENGTH, unit: 'au' });

export const pathOutput = (label: string) =>
	group({
		label,
		fields: {
			nearPoint: fromSun('nearest point to the Sun'),
			farPoint: {
				...fromSun('furthest point from the Sun'),
				optional: true,
				help: 'None where the path leaves the Sun for good.'
			},
			inclination: quantity({
				label: 'inclination to the body’s own path',
				symbol: 'i',
				dimension: PURE,
				unit: 'deg',
				help: 'Above 90° it goes round backwards.'
			})
		}
	});
