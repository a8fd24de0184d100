import { json } from '@sveltejs/kit';
import { z } from 'zod';
import { requireToken } from '$lib/server/auth/api-tokens';
import { callMethod, describeForApi, methodNamed } from '$lib/server/engine/methods';
import { readJson } from '$lib/server/reading';

export async function GET(event) {
	await requireToken(event, 'methods.read');
	return json(describeForApi(methodNamed(event.params.name)));
}

export async function POST(event) {
	const { userId } = await requireToken(event, 'methods.run');
	// The engine checks the input against the method's description.
	const input = await readJson(event.request, z.unknown());
	return json(await callMethod(userId, event.params.name, input));
}
