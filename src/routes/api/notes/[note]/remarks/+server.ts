import { json } from '@sveltejs/kit';
import { requireNote } from '$lib/server/auth/guard';
import { readJson } from '$lib/server/reading';
import { remarkInput } from '$lib/server/remarks/input';
import { remarksOf } from '$lib/server/remarks/list';
import { pinRemark } from '$lib/server/remarks/pin';

export async function GET(event) {
	const { note } = await requireNote(event, event.params.note, 'remark.read');
	return json(await remarksOf(note.id));
}

export async function POST(event) {
	const { note, programme, person } = await requireNote(event, event.params.note, 'remark.write');
	const { itemId, body } = await readJson(event.request, remarkInput);
	const id = await pinRemark({ note, programme, person, itemId, body });
	return json({ id }, { status: 201 });
}
