/** The days of a release calendar, as a person gives them, with the Sun's longitude on each. */
import type { Site } from '../line/site';
import { integer, list, quantity, text, variant, type ValueOf } from '../methods/parameter';
import { refuseInput } from '../methods/refused';
import { PURE } from '../quantities/dimension';
import { dayName, daysSinceJ2000 } from './day';
import { sunLongitude } from './sun-longitude';

export const MOST_DAYS = 4000;
/** Years for which the ephemeris was compared with another. */
const YEARS = { first: '1900-01-01', last: '2100-12-31' };

export const day = text({ label: 'day, as 2027-03-20', longest: 10 });

export const whenInput = variant({
	label: 'when',
	cases: {
		days: {
			label: 'days from a first one on',
			fields: {
				from: { ...day, label: 'first day, as 2027-03-20' },
				count: integer({ label: 'number of days', range: { least: 1, most: MOST_DAYS } }),
				step: integer({
					label: 'days from one to the next',
					range: { least: 1, most: 400 },
					default: 1
				})
			}
		},
		dates: {
			label: 'days by name',
			fields: { dates: list({ label: 'days', fewest: 1, most: MOST_DAYS, of: day }) }
		},
		longitudes: {
			label: 'longitudes of the Sun',
			fields: {
				longitudes: list({
					label: 'longitudes of the Sun, seen from the body',
					symbol: 'L_sun',
					fewest: 1,
					most: MOST_DAYS,
					of: quantity({
						label: 'longitude from the body’s spring equinox, along its path',
						symbol: 'L_sun',
						dimension: PURE,
						unit: 'deg',
						range: { least: -1e6, most: 1e6 }
					})
				})
			}
		}
	}
});

export const isEarth = (site: Site) => site.kind === 'body' && site.body === 'earth';

/** @throws Refused for what is no day, lies outside the years, or belongs to another body than the Earth */
export function daysOf(
	site: Site,
	when: ValueOf<typeof whenInput>
): { date: string | undefined; sunLongitude: number }[] {
	if (when.kind === 'longitudes')
		return when.longitudes.map((sunLongitude) => ({ date: undefined, sunLongitude }));
	if (!isEarth(site))
		refuseInput(
			'when',
			'Days are known for the Earth only.',
			'Give the longitudes of the Sun, seen from the body.'
		);
	const days =
		when.kind === 'dates'
			? when.dates.map((date, i) => dayNumber(date, `when.dates.${i}`))
			: daysFrom(dayNumber(when.from, 'when.from'), when.count, when.step);
	return days.map((day) => ({ date: dayName(day), sunLongitude: sunLongitude(day) }));
}

function daysFrom(first: number, count: number, step: number): number[] {
	const days = Array.from({ length: count }, (_, i) => first + i * step);
	if (days.at(-1)! > daysSinceJ2000(YEARS.last)!)
		refuseInput('when.count', `The last day lies after ${YEARS.last}.`);
	return days;
}

function dayNumber(name: string, path: string): number {
	const day = daysSinceJ2000(name);
	if (day === undefined) refuseInput(path, `“${name}” is no day as 2027-03-20.`);
	if (name < YEARS.first || name > YEARS.last)
		refuseInput(path, `Days are known from ${YEARS.first} to ${YEARS.last}.`);
	return day;
}
