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
	await requireToken(event, 'methods.run');
	// The engine checks the input against the method's description.
	return json(await callMethod(event.params.name, await readJson(event.request, z.unknown())));
}
