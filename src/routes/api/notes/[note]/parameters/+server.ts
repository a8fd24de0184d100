import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { parametersOf } from '$lib/server/baselines/parameters';

/** What the note may take from the other notes of its programme. */
export async function GET(event) {
	const { note, programme } = await requireNote(event, event.params.note, 'baseline.read');
	const parameters = await parametersOf(programme.id);
	return json(parameters.filter(({ noteId }) => noteId !== note.id));
}
