/** The orders in which the register of notes can stand, and the words that filter it. */
import type { ListedNote } from '$lib/server/notes/list';

export type Order = 'number' | 'title' | 'status' | 'checks' | 'remarks' | 'changed';

const amiss = ({ checks }: ListedNote) => checks.fails * 1e6 + checks.thin * 1e3 + checks.waits;

const COMPARE: Record<Order, (a: ListedNote, b: ListedNote) => number> = {
	number: (a, b) => a.number.localeCompare(b.number, 'en', { numeric: true }),
	title: (a, b) => a.title.localeCompare(b.title, 'en'),
	status: (a, b) => a.status.localeCompare(b.status, 'en'),
	// What needs looking at first: worst, most, newest.
	checks: (a, b) => amiss(b) - amiss(a),
	remarks: (a, b) => b.openRemarks - a.openRemarks,
	changed: (a, b) => b.changedAt.localeCompare(a.changedAt)
};

export function arranged(notes: ListedNote[], order: Order, words: string): ListedNote[] {
	const wanted = words.toLowerCase().split(/\s+/).filter(Boolean);
	return notes
		.filter((note) => {
			const text = `${note.number} ${note.title}`.toLowerCase();
			return wanted.every((word) => text.includes(word));
		})
		.toSorted((a, b) => COMPARE[order](a, b) || COMPARE.number(a, b));
}
