import { isUuid, requireNote, requirePerson } from '../auth/guard';
import type { ProgrammeAction } from '../auth/permissions';
import type { SignedIn } from '../auth/sessions';
import { Problem } from '../problems';
import { findBaseline } from './read';

/** The baseline with an id and its note, for somebody who may take the action there. */
export async function requireBaseline(
	asker: { locals: { person: SignedIn | null } },
	baselineId: string,
	action: ProgrammeAction
) {
	requirePerson(asker);
	const row = isUuid(baselineId) ? await findBaseline(baselineId) : undefined;
	if (!row) throw new Problem(404, 'There is no such baseline in a programme that you are in.');
	return { row, ...(await requireNote(asker, row.noteId, action)) };
}
