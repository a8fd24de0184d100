/** Moments in the reader's zone, with the zone named. */

/** The cookie in which a browser tells the server its zone, so that both write the same time. */
export const ZONE_COOKIE = 'zone';

/** The zone of this browser, e.g. "Europe/Oslo". */
export const browserZone = () => Intl.DateTimeFormat().resolvedOptions().timeZone;

/** `name` if it is a zone that is known here, else UTC. */
export function knownZone(name: string | undefined): string {
	try {
		return new Intl.DateTimeFormat('en-GB', { timeZone: name ?? 'UTC' }).resolvedOptions().timeZone;
	} catch {
		return 'UTC';
	}
}

type Moment = Date | string;

const format = (at: Moment, options: Intl.DateTimeFormatOptions) =>
	new Intl.DateTimeFormat('en-GB', options).format(new Date(at)).replaceAll(' ', '\u00a0');

/** "26 Nov 2026"; a gate's date is a day, not a moment, and is given in UTC. */
export const formatDay = (at: Moment, zone = 'UTC') =>
	format(at, { timeZone: zone, day: 'numeric', month: 'short', year: 'numeric' });

/** "26 Nov". */
export const formatShortDay = (at: Moment, zone = 'UTC') =>
	format(at, { timeZone: zone, day: 'numeric', month: 'short' });

/** "08:09 CET". */
export const formatClock = (at: Moment, zone: string) =>
	format(at, { timeZone: zone, hour: '2-digit', minute: '2-digit', timeZoneName: 'short' });

/** "26 Nov 2026, 08:09 CET". */
export const formatMoment = (at: Moment, zone: string) =>
	`${formatDay(at, zone)}, ${formatClock(at, zone)}`;
