import { expect, test } from 'vitest';
import { daysTo, gateDay, inDays, nextGate } from './gate-words';

const NOW = new Date('2026-12-01T23:30:00Z');

test.each([
	[0, 'today'],
	[1, 'in 1 day'],
	[7, 'in 7 days'],
	[77, 'in 11 weeks'],
	[400, 'in 13 months'],
	[-3, '3 days ago']
])('%i days are said as "%s"', (days, words) => {
	expect(inDays(days).replaceAll('\u00a0', ' ')).toBe(words);
});

test('days are counted from day to day, whatever the hour', () => {
	expect(daysTo('2026-12-02', NOW)).toBe(1);
	expect(daysTo('2026-12-01', NOW)).toBe(0);
});

test('the year is left out in the year that it is', () => {
	expect(gateDay('2026-12-24', NOW).replaceAll('\u00a0', ' ')).toBe('24 Dec');
	expect(gateDay('2027-02-16', NOW).replaceAll('\u00a0', ' ')).toBe('16 Feb 2027');
});

test('the next gate is the one after the last at which something is frozen', () => {
	const gate = (kind: string, baselines: number) => ({ kind, baselines });
	expect(nextGate([gate('SRR', 2), gate('PDR', 0), gate('CDR', 0)])?.kind).toBe('PDR');
	expect(nextGate([gate('SRR', 0), gate('PDR', 0)])?.kind).toBe('SRR');
	expect(nextGate([gate('SRR', 1)])).toBeNull();
	expect(nextGate([])).toBeNull();
});
