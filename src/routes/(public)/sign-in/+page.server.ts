import { redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { addressSchema, signIn } from '$lib/server/auth/sign-in';
import { answerForm } from '$lib/server/forms';
import { Problem } from '$lib/server/problems';
import type { Actions, PageServerLoad } from './$types';

const schema = z.object({
	email: addressSchema,
	password: z.string().min(1, 'Type the password of your account.').max(1000)
});

/** Where somebody wanted to go; only a path of this site, so that nobody is sent elsewhere. */
function wanted(url: URL): string {
	const to = url.searchParams.get('to') ?? '/';
	return /^\/(?![/\\])/.test(to) ? to : '/';
}

export const load: PageServerLoad = ({ locals, url }) => {
	if (locals.person) redirect(303, wanted(url));
	return { host: url.host, now: new Date() };
};

export const actions: Actions = {
	default: ({ request, cookies, url, getClientAddress }) =>
		answerForm(request, 'sign-in', schema, async ({ email, password }) => {
			const answer = await signIn(email, password, getClientAddress());
			if (answer.outcome === 'waits')
				throw new Problem(429, 'Too many tries.', { until: answer.until.toISOString() });
			if (answer.outcome === 'refused')
				throw new Problem(401, 'Not signed in.', { triesLeft: answer.triesLeft });
			const { name, value, attributes } = answer.cookie;
			cookies.set(name, value, attributes);
			redirect(303, wanted(url));
		})
};
