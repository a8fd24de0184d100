import { json } from '@sveltejs/kit';
import { requireProgramme } from '$lib/server/auth/guard';
import { listNotes } from '$lib/server/notes/list';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'note.read');
	return json(await listNotes([programme.id]));
};
