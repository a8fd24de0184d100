import { requirePerson } from '$lib/server/auth/guard';
import { programmeSummaries } from '$lib/server/programmes/today';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => ({
	programmes: await programmeSummaries(requirePerson(event).id),
	now: new Date()
});
