import { json } from '@sveltejs/kit';
import { noteJsonSchema } from '$lib/note/json-schema';
import { requireToken } from '$lib/server/auth/api-tokens';

export async function GET(event) {
	await requireToken(event, 'methods.read');
	return json(noteJsonSchema(), { headers: { 'content-type': 'application/schema+json' } });
}
