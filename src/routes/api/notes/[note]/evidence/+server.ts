import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { fileName, storeEvidence } from '$lib/server/evidence/evidence';
import type { Bytes } from '$lib/server/evidence/store';
import { Problem } from '$lib/server/problems';

/** The body is the file as it is; `?name=` is its name. */
export async function POST(event) {
	const { note, person } = await requireNote(event, event.params.note, 'evidence.upload');
	const name = fileName.safeParse(event.url.searchParams.get('name') ?? '');
	if (!name.success) throw new Problem(422, name.error.issues[0]!.message);
	if (!event.request.body)
		throw new Problem(422, `${name.data} has no content, or the request names no Content-Type.`);
	const file = await storeEvidence({
		noteId: note.id,
		userId: person.id,
		name: name.data,
		body: event.request.body as Bytes
	});
	return json(file, { status: 201 });
}
