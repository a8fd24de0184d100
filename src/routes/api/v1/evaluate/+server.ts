import { json } from '@sveltejs/kit';
import { ENGINE_VERSION } from '$lib/engine/version';
import { noteContentSchema } from '$lib/note/items';
import { requireToken } from '$lib/server/auth/api-tokens';
import { evaluateContent } from '$lib/server/engine/evaluate';
import { readJson } from '$lib/server/reading';

export async function POST(event) {
	await requireToken(event, 'note.evaluate');
	const content = await readJson(event.request, noteContentSchema);
	return json({ engine: ENGINE_VERSION, results: await evaluateContent(content) });
}
