import { requireProgramme } from '$lib/server/auth/guard';
import { parametersOf } from '$lib/server/baselines/parameters';
import { setFormulas } from '$lib/server/formulas';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'baseline.read');
	const parameters = await parametersOf(programme.id);
	return { parameters, formulas: setFormulas(parameters) };
};
