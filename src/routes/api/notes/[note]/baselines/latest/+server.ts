import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { latestBaseline } from '$lib/server/baselines/read';

/** Null as long as the note has no baseline. */
export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'baseline.read');
	return json(await latestBaseline(note.id));
}
