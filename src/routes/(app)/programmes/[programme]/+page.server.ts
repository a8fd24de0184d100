import { redirect } from '@sveltejs/kit';
import { requireProgramme } from '$lib/server/auth/guard';
import { db } from '$lib/server/db';
import { answerForm } from '$lib/server/forms';
import { gatesOf } from '$lib/server/gates/gates';
import { createNote, newNoteSchema, nextNumber } from '$lib/server/notes/create';
import { listNotes } from '$lib/server/notes/list';
import { invitationsOf } from '$lib/server/people/invitations';
import { membersOf } from '$lib/server/programmes/members';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'note.read');
	return {
		notes: await listNotes([programme.id]),
		nextNumber: await nextNumber(db, programme.id, programme.code),
		gates: await gatesOf(programme.id),
		members: await membersOf(programme.id),
		invited: (await invitationsOf(programme.id)).length,
		now: new Date()
	};
};

export const actions: Actions = {
	create: async (event) => {
		const { person, programme } = await requireProgramme(
			event,
			event.params.programme,
			'note.create'
		);
		return answerForm(event.request, 'create', newNoteSchema, async (values) => {
			const { number } = await createNote(programme, person.id, values);
			redirect(303, `/programmes/${programme.code}/notes/${number}`);
		});
	}
};
