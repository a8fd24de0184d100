import { fail, redirect } from '@sveltejs/kit';
import { requireNoteNumbered } from '$lib/server/auth/guard';
import { candidateOf } from '$lib/server/baselines/candidate';
import { freeze } from '$lib/server/baselines/freeze';
import { freezeInput, waiversFromForm } from '$lib/server/baselines/input';
import { summaryOf } from '$lib/server/baselines/title-block';
import { gatesOf } from '$lib/server/gates/gates';
import { Problem } from '$lib/server/problems';
import { membersOf } from '$lib/server/programmes/members';
import { remarksOf } from '$lib/server/remarks/list';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { programme, note } = await requireNoteNumbered(
		event,
		event.params.programme,
		event.params.note,
		'baseline.freeze'
	);
	const { seq, content, results, evidence, inTheWay } = await candidateOf(note);
	const remarks = await remarksOf(note.id);
	const team = await membersOf(programme.id);
	return {
		note,
		seq,
		gates: await gatesOf(programme.id),
		summary: summaryOf(content, results),
		files: evidence.length,
		inTheWay,
		remarks: remarks.filter(({ settled }) => !settled),
		told: team.length - 1
	};
};

export const actions: Actions = {
	default: async (event) => {
		const { person, programme, note } = await requireNoteNumbered(
			event,
			event.params.programme,
			event.params.note,
			'baseline.freeze'
		);
		const form = await event.request.formData();
		const input = freezeInput.safeParse({
			gateId: form.get('gateId'),
			revision: form.get('revision'),
			seenSeq: Number(form.get('seenSeq')),
			waivers: waiversFromForm(form)
		});
		if (!input.success) {
			const words = [...new Set(input.error.issues.map(({ message }) => message))];
			return fail(422, { message: words.join(' ') });
		}
		let id: string;
		try {
			id = await freeze({ note, programme, person, input: input.data });
		} catch (error) {
			if (!(error instanceof Problem)) throw error;
			return fail(error.status, { message: error.message });
		}
		redirect(303, `/programmes/${programme.code}/baselines/${id}`);
	}
};
