/** Counts of checks, in words. */
import type { CheckCounts, CheckState } from '$lib/note/summary';

const WORDS: Record<CheckState, (count: number) => string> = {
	fails: (count) => `${count} ${count === 1 ? 'fails' : 'fail'}`,
	thin: (count) => `${count} thin`,
	waits: (count) => `${count} ${count === 1 ? 'waits' : 'wait'}`,
	holds: (count) => `${count} ${count === 1 ? 'holds' : 'hold'}`
};

/** What is to be said of a note's checks: each state that is not well, or that all hold, or that there are none. */
export function checkWords(checks: CheckCounts): { state: CheckState; word: string }[] {
	const amiss = (['fails', 'thin', 'waits'] as const).filter((state) => checks[state] > 0);
	if (amiss.length > 0) return amiss.map((state) => ({ state, word: WORDS[state](checks[state]) }));
	return checks.holds > 0 ? [{ state: 'holds', word: 'all hold' }] : [];
}

/** The same as one phrase, for who cannot see the drawing. */
export const checkPhrase = (checks: CheckCounts) =>
	checkWords(checks)
		.map(({ word }) => word)
		.join(', ') || 'no checks';

export function sumChecks(all: CheckCounts[]): CheckCounts {
	const sum: CheckCounts = { holds: 0, thin: 0, fails: 0, waits: 0 };
	for (const checks of all)
		for (const state of Object.keys(sum) as CheckState[]) sum[state] += checks[state];
	return sum;
}
