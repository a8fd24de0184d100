import { error, redirect, type RequestEvent } from '@sveltejs/kit';
import { z } from 'zod';
import { linksOfNetwork, take } from '$lib/server/auth/limits';
import { newPasswordSchema } from '$lib/server/auth/new-password';
import { personNameSchema } from '$lib/server/people/names';
import { signIn } from '$lib/server/auth/sign-in';
import { sessionFromCookie, type SessionCookie } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { answerForm } from '$lib/server/forms';
import { gatesOf } from '$lib/server/gates/gates';
import { acceptAs, acceptAsNew, decline, hasAccount } from '$lib/server/people/answers';
import { openInvitation } from '$lib/server/people/invitations';
import { Problem } from '$lib/server/problems';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, locals, getClientAddress }) => {
	if ((await take(linksOfNetwork, getClientAddress())).until)
		error(429, 'Too many links were opened from this network; try in 15 minutes.');
	const invitation = await openInvitation(db, params.token);
	return {
		invitation,
		gates: invitation ? await gatesOf(invitation.programme.id) : [],
		hasAccount: invitation !== null && (await hasAccount(invitation.email)),
		signedInAs: locals.person?.email ?? null
	};
};

const enter = (event: RequestEvent, code: string, cookie?: SessionCookie): never => {
	if (cookie) event.cookies.set(cookie.name, cookie.value, cookie.attributes);
	redirect(303, `/programmes/${code}`);
};

export const actions: Actions = {
	/** Somebody new: makes an account. */
	join: async (event) => {
		const { request, params } = event;
		const invitation = await openInvitation(db, params.token);
		const posted = await request.clone().formData();
		const name = String(posted.get('name') ?? '');
		const schema = z.object({
			name: personNameSchema,
			password: newPasswordSchema([name, invitation?.email])
		});
		return answerForm(request, 'join', schema, async (person) => {
			const { code, cookie } = await acceptAsNew(params.token, person);
			enter(event, code, cookie);
		});
	},

	/** Somebody with an account, who signs in to accept. */
	signIn: (event) =>
		answerForm(
			event.request,
			'signIn',
			z.object({ password: z.string().max(1000) }),
			async (typed) => {
				const { params, getClientAddress } = event;
				const invitation = await openInvitation(db, params.token);
				if (!invitation) throw new Problem(409, 'This invitation does not stand any more.');
				const answer = await signIn(invitation.email, typed.password, getClientAddress());
				if (answer.outcome !== 'in')
					throw new Problem(
						answer.outcome === 'waits' ? 429 : 401,
						answer.outcome === 'waits'
							? 'Too many tries. Sign-in waits for 15 minutes; a link for a new password works at once.'
							: 'This is not the password of your account.'
					);
				const found = await sessionFromCookie(`${answer.cookie.name}=${answer.cookie.value}`);
				enter(event, await acceptAs(params.token, found!.person), answer.cookie);
			}
		),

	/** Somebody who is signed in with the invited address. */
	accept: (event) =>
		answerForm(event.request, 'accept', z.object({}), async () => {
			if (!event.locals.person) throw new Problem(401, 'You are not signed in any more.');
			enter(event, await acceptAs(event.params.token, event.locals.person));
		}),

	decline: ({ request, params }) =>
		answerForm(request, 'decline', z.object({}), () => decline(params.token))
};
