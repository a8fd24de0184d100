import { expect, test } from 'vitest';
import { formatClock, formatDay, formatMoment, knownZone } from './time';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

test('a moment is given in the zone of the reader, and the zone is named', () => {
	const at = '2026-11-26T07:09:00Z';
	expect(plain(formatMoment(at, 'Europe/Oslo'))).toBe('26 Nov 2026, 08:09 CET');
	expect(plain(formatMoment(at, 'UTC'))).toBe('26 Nov 2026, 07:09 UTC');
});

test('summer time has its own name', () => {
	expect(plain(formatClock('2026-07-01T07:09:00Z', 'Europe/Oslo'))).toBe('09:09 CEST');
});

test('a day that is no moment is the same day everywhere', () => {
	expect(plain(formatDay('2026-11-24'))).toBe('24 Nov 2026');
});

test.each([undefined, '', 'Mars/Olympus', '../../etc/passwd'])(
	'zone %j is taken as UTC',
	(name) => {
		expect(knownZone(name)).toBe('UTC');
	}
);
