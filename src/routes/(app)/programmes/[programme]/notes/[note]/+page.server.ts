import type { RequestEvent } from '@sveltejs/kit';
import { requireNoteNumbered } from '$lib/server/auth/guard';
import { may, type ProgrammeAction } from '$lib/server/auth/permissions';
import { answerForm } from '$lib/server/forms';
import { gatesOf } from '$lib/server/gates/gates';
import { noteForPage } from '$lib/server/notes/page';
import { changeTitleBlock, titleBlockSchema } from '$lib/server/notes/title-block';
import { membersOf } from '$lib/server/programmes/members';
import type { Actions, PageServerLoad } from './$types';

type Event = RequestEvent<{ programme: string; note: string }>;

const asked = (event: Event, action: ProgrammeAction) =>
	requireNoteNumbered(event, event.params.programme, event.params.note, action);

export const load: PageServerLoad = async (event) => {
	const { note, programme, role } = await asked(event, 'note.read');
	event.depends('note:head');
	const edits = may(role, 'note.edit');
	const [page, people, gates] = await Promise.all([
		noteForPage(note),
		edits ? membersOf(programme.id) : [],
		edits ? gatesOf(programme.id) : []
	]);
	return {
		note: page,
		can: { edit: edits, remark: may(role, 'remark.write'), freeze: may(role, 'baseline.freeze') },
		/** What the title block can name. */
		choices: {
			people: people.map(({ userId, name }) => ({ id: userId, name })),
			gates: gates.map(({ id, kind, name }) => ({ id, kind, name }))
		}
	};
};

export const actions: Actions = {
	titleBlock: async (event) => {
		const { note } = await asked(event, 'note.edit');
		return answerForm(event.request, 'titleBlock', titleBlockSchema, (values) =>
			changeTitleBlock(note, values)
		);
	}
};
