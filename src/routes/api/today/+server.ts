import { json } from '@sveltejs/kit';
import { requirePerson } from '$lib/server/auth/guard';
import { today } from '$lib/server/programmes/today';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => json(await today(requirePerson(event).id));
