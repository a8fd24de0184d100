import { requirePerson } from '$lib/server/auth/guard';
import { today } from '$lib/server/programmes/today';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => ({
	today: await today(requirePerson(event).id)
});
