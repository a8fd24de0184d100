/** What stands beside a gate: its day, and how far it is. */
import { formatDay, formatShortDay } from '$lib/time';

const DAY = 86_400_000;

/** Whole days from today to a gate's day, both in UTC. */
export const daysTo = (date: string, now: Date) =>
	Math.round((Date.parse(date) - Date.parse(now.toISOString().slice(0, 10))) / DAY);

/** "in 7 days", "in 25 weeks", "in 11 months", "today", "3 days ago". */
export function inDays(days: number): string {
	if (days === 0) return 'today';
	const size = Math.abs(days);
	const span =
		size < 28
			? plural(size, 'day')
			: size < 7 * 30
				? plural(Math.round(size / 7), 'week')
				: plural(Math.round(size / 30.44), 'month');
	return days > 0 ? `in ${span}` : `${span} ago`;
}

const plural = (count: number, one: string) => `${count}\u00a0${one}${count === 1 ? '' : 's'}`;

/** The day of a gate, with the year unless it is this one. */
export const gateDay = (date: string, now: Date) =>
	date.startsWith(String(now.getUTCFullYear())) ? formatShortDay(date) : formatDay(date);

/** Where a programme is: the first gate at which nothing is frozen yet; null past the last. */
export function nextGate<G extends { baselines: number }>(gates: G[]): G | null {
	const lastFrozen = gates.findLastIndex((gate) => gate.baselines > 0);
	return gates[lastFrozen + 1] ?? null;
}
