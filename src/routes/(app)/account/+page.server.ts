import { redirect, type RequestEvent } from '@sveltejs/kit';
import { z } from 'zod';
import {
	apiTokensOf,
	makeApiToken,
	newApiTokenSchema,
	revokeApiToken
} from '$lib/server/auth/api-tokens';
import { requirePerson } from '$lib/server/auth/guard';
import { newPasswordSchema } from '$lib/server/auth/new-password';
import { countSessions } from '$lib/server/auth/sessions';
import { answerForm } from '$lib/server/forms';
import { changePassword, rename, signOut, signOutEverywhere } from '$lib/server/people/accounts';
import { personNameSchema } from '$lib/server/people/names';
import { programmesOf } from '$lib/server/programmes/members';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const person = requirePerson(event);
	const [sessions, places, tokens] = await Promise.all([
		countSessions(person.id),
		programmesOf(person.id),
		apiTokensOf(person.id)
	]);
	return {
		sessions,
		tokens,
		places: places.map(({ programme: { code, title }, role }) => ({ code, title, role }))
	};
};

const asking = (event: RequestEvent) => ({
	person: requirePerson(event),
	sessionId: event.locals.sessionId!
});

export const actions: Actions = {
	rename: (event) => {
		const { person } = asking(event);
		return answerForm(event.request, 'rename', z.object({ name: personNameSchema }), ({ name }) =>
			rename(person.id, name)
		);
	},

	password: (event) => {
		const { person, sessionId } = asking(event);
		const schema = z.object({
			oldPassword: z.string().min(1, 'Type your present password.').max(1000),
			password: newPasswordSchema([person.name, person.email])
		});
		return answerForm(event.request, 'password', schema, ({ oldPassword, password }) =>
			changePassword(person, sessionId, { old: oldPassword, new: password })
		);
	},

	makeToken: (event) => {
		const { person } = asking(event);
		return answerForm(event.request, 'makeToken', newApiTokenSchema, async (values) => ({
			token: await makeApiToken(person.id, values)
		}));
	},

	revokeToken: (event) => {
		const { person } = asking(event);
		return answerForm(event.request, 'revokeToken', z.object({ id: z.uuid() }), ({ id }) =>
			revokeApiToken(person.id, id)
		);
	},

	signOut: async (event) => {
		const { person, sessionId } = asking(event);
		const { name, value, attributes } = await signOut(person.id, sessionId);
		event.cookies.set(name, value, attributes);
		redirect(303, '/sign-in');
	},

	signOutEverywhere: async (event) => {
		await signOutEverywhere(asking(event).person.id);
		redirect(303, '/sign-in');
	}
};
