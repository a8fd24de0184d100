import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { authorshipOf } from '$lib/server/notes/written';

export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'note.read');
	return json(await authorshipOf(note.id));
}
