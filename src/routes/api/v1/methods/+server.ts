import { json } from '@sveltejs/kit';
import { requireToken } from '$lib/server/auth/api-tokens';
import { catalogueForApi } from '$lib/server/engine/methods';

export async function GET(event) {
	await requireToken(event, 'methods.read');
	return json(catalogueForApi());
}
