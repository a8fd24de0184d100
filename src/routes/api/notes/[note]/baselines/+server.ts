import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { freeze } from '$lib/server/baselines/freeze';
import { freezeInput } from '$lib/server/baselines/input';
import { baselinesOfNote } from '$lib/server/baselines/read';
import { readJson } from '$lib/server/reading';

export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'baseline.read');
	return json(await baselinesOfNote(note.id));
}

export async function POST(event) {
	const { note, programme, person } = await requireNote(
		event,
		event.params.note,
		'baseline.freeze'
	);
	const input = await readJson(event.request, freezeInput);
	const id = await freeze({ note, programme, person, input });
	return json({ id }, { status: 201 });
}
