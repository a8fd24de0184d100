import { error, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { linksOfNetwork, take } from '$lib/server/auth/limits';
import { resetFor, setPassword } from '$lib/server/auth/resets';
import { newPasswordSchema } from '$lib/server/auth/new-password';
import { answerForm } from '$lib/server/forms';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, getClientAddress }) => {
	if ((await take(linksOfNetwork, getClientAddress())).until)
		error(429, 'Too many links were opened from this network; try in 15 minutes.');
	const found = await resetFor(params.token);
	return { person: found && { name: found.name, email: found.email } };
};

export const actions: Actions = {
	default: async ({ request, params, cookies }) => {
		const found = await resetFor(params.token);
		const schema = z.object({ password: newPasswordSchema([found?.name, found?.email]) });
		return answerForm(request, 'set', schema, async ({ password }) => {
			const { name, value, attributes } = await setPassword(params.token, password);
			cookies.set(name, value, attributes);
			redirect(303, '/');
		});
	}
};
