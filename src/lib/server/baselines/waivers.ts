/** Whether nothing stands in the way, or a waiver lets it through. */
import type { Waiver } from '$lib/note/frozen';
import type { Note } from '../auth/guard';
import { Problem } from '../problems';
import type { Candidate } from './candidate';

/** @throws Problem 422 with the list of what is in the way as `inTheWay`. */
export function requireFree(note: Note, candidate: Candidate, waivers: Waiver[]): void {
	if (candidate.content.items.length === 0)
		throw new Problem(422, `${note.number} has no items yet; there is nothing to freeze.`);
	const waived = new Set(waivers.map(({ itemId }) => itemId));
	const left = candidate.inTheWay.filter(
		({ kind, itemId }) => kind !== 'fails' || !waived.has(itemId)
	);
	if (left.length > 0) {
		const numbers = left.map(({ number, kind }) => `${number} ${kind}`).join(', ');
		throw new Problem(422, `${note.number} cannot be frozen: ${numbers}.`, { inTheWay: left });
	}
	const failing = new Set(
		candidate.inTheWay.filter(({ kind }) => kind === 'fails').map(({ itemId }) => itemId)
	);
	if (waived.size !== waivers.length || [...waived].some((id) => !failing.has(id)))
		throw new Problem(422, 'A waiver is for a failing check, and one is enough for each.');
}
