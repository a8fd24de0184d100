/** Calendar days by name, "2027-03-20" (ISO 8601, Gregorian), and by count. No clock is read. */

const DAY = 86_400_000;
/** 2000-01-01 12:00 in milliseconds of the Date of ECMAScript. */
const J2000 = Date.UTC(2000, 0, 1, 12);

/** Days from J2000 to 0 h UT of that day; undefined for what is no day of the calendar. */
export function daysSinceJ2000(day: string): number | undefined {
	const [, year, month, date] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day) ?? [];
	if (year === undefined) return undefined;
	const days = (Date.UTC(Number(year), Number(month) - 1, Number(date)) - J2000) / DAY;
	// 2027-02-30 would come out as 2 March, and a year below 100 in another century.
	return dayName(days) === day ? days : undefined;
}

export const dayName = (days: number): string =>
	new Date(J2000 + days * DAY).toISOString().slice(0, 10);
