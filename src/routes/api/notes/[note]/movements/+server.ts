import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { movementsOf } from '$lib/server/notes/written';

export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'note.read');
	return json(await movementsOf(note.id));
}
