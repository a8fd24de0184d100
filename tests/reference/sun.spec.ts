/** The Sun's longitude by date against ERFA (make_sun.py), and against published figures. */
import { describe, expect, it } from 'vitest';
import { daysSinceJ2000 } from '$lib/engine/release/day';
import { sunLongitude } from '$lib/engine/release/sun-longitude';
import cases from './data/sun.json';

const ARCSECOND = Math.PI / 648_000;
const MINUTE = 1 / 1440;

/** The shorter way round from one angle to another, rad. */
const apart = (a: number, b: number) => Math.abs(Math.atan2(Math.sin(a - b), Math.cos(a - b)));

describe('the longitude of the Sun', () => {
	it('agrees with ERFA within 3″ on 400 days of 1900 to 2100', () => {
		expect(cases).toHaveLength(400);
		for (const { day, longitude } of cases)
			expect(apart(sunLongitude(daysSinceJ2000(day)!), longitude), day).toBeLessThan(3 * ARCSECOND);
	});

	// Almanac times of 2000 to the minute, UT; from memory. The Sun moves 2.5″ in a minute.
	it('passes the equinoxes and solstices of 2000 at the published minute', () => {
		const seasons: [string, number, number][] = [
			['2000-03-20', 7 * 60 + 35, 0],
			['2000-06-21', 60 + 48, 90],
			['2000-09-22', 17 * 60 + 28, 180],
			['2000-12-21', 13 * 60 + 37, 270]
		];
		for (const [day, minutes, degrees] of seasons) {
			const there = sunLongitude(daysSinceJ2000(day)! + minutes * MINUTE);
			expect(apart(there, (degrees * Math.PI) / 180), day).toBeLessThan(3 * ARCSECOND);
		}
	});

	// J. Meeus, Astronomical Algorithms, example 25.b: 1992 October 13, 0 h TD, 199° 54′ 22″; from memory.
	it('meets the worked example of Meeus', () => {
		const terrestrial = daysSinceJ2000('1992-10-13')! - 59 / 86_400;
		const published = ((199 + 54 / 60 + 22 / 3600) * Math.PI) / 180;
		expect(apart(sunLongitude(terrestrial), published)).toBeLessThan(3 * ARCSECOND);
	});
});
