import type { RequestEvent } from '@sveltejs/kit';
import { requireProgramme } from '$lib/server/auth/guard';
import { answerForm } from '$lib/server/forms';
import {
	invitationsOf,
	invite,
	inviteAgain,
	withdrawInvitation
} from '$lib/server/people/invitations';
import { changeMember, removeMember } from '$lib/server/programmes/changes';
import {
	invitationIdSchema,
	invitedSchema,
	memberSchema,
	removalSchema
} from '$lib/server/programmes/input';
import { membersOf } from '$lib/server/programmes/members';
import type { Actions, PageServerLoad } from './$types';

type Event = RequestEvent<{ programme: string }>;

export const load: PageServerLoad = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'people.read');
	return {
		members: await membersOf(programme.id),
		invitations: await invitationsOf(programme.id),
		now: new Date()
	};
};

const asInviter = (event: Event) =>
	requireProgramme(event, event.params.programme, 'people.invite');
const asChanger = (event: Event) =>
	requireProgramme(event, event.params.programme, 'people.change');

export const actions: Actions = {
	invite: async (event) => {
		const { person, programme } = await asInviter(event);
		return answerForm(event.request, 'invite', invitedSchema, (invited) =>
			invite(person, programme, invited)
		);
	},

	again: async (event) => {
		const { person, programme } = await asInviter(event);
		return answerForm(event.request, 'again', invitationIdSchema, ({ id }) =>
			inviteAgain(person, programme, id)
		);
	},

	withdraw: async (event) => {
		const { programme } = await asInviter(event);
		return answerForm(event.request, 'withdraw', invitationIdSchema, ({ id }) =>
			withdrawInvitation(programme.id, id)
		);
	},

	change: async (event) => {
		const { programme } = await asChanger(event);
		return answerForm(event.request, 'change', memberSchema, ({ id, ...values }) =>
			changeMember(programme.id, id, values)
		);
	},

	remove: async (event) => {
		const { person, programme } = await asChanger(event);
		return answerForm(event.request, 'remove', removalSchema, ({ id }) =>
			removeMember(person, programme, id)
		);
	}
};
