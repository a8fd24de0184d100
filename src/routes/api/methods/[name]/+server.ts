import { json } from '@sveltejs/kit';
import { z } from 'zod';
import { requirePerson } from '$lib/server/auth/guard';
import { callMethod } from '$lib/server/engine/methods';
import { readJson } from '$lib/server/reading';

/** For the page of the method. */
export async function POST(event) {
	const person = requirePerson(event);
	const input = await readJson(event.request, z.unknown());
	return json(await callMethod(person.id, event.params.name, input));
}
