import { requireProgramme } from '$lib/server/auth/guard';
import { baselinesOfProgramme } from '$lib/server/baselines/read';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'baseline.read');
	return { baselines: await baselinesOfProgramme(programme.id) };
};
