import { requireAdministrator } from '$lib/server/auth/guard';
import { answerForm } from '$lib/server/forms';
import { listAccounts } from '$lib/server/people/accounts';
import { createProgramme } from '$lib/server/programmes/changes';
import { newProgrammeSchema } from '$lib/server/programmes/input';
import { listProgrammes } from '$lib/server/programmes/list';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireAdministrator(event, 'accounts.read');
	return { accounts: await listAccounts(), programmes: await listProgrammes() };
};

export const actions: Actions = {
	create: (event) => {
		const administrator = requireAdministrator(event, 'programme.create');
		return answerForm(event.request, 'create', newProgrammeSchema, (values) =>
			createProgramme(administrator, values)
		);
	}
};
