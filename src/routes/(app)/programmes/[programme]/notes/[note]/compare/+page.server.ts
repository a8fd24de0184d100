import { redirect } from '@sveltejs/kit';
import { requireNoteNumbered } from '$lib/server/auth/guard';
import { comparedInput } from '$lib/server/baselines/input';
import { baselinesOfNote } from '$lib/server/baselines/read';
import { compareSides } from '$lib/server/baselines/sides';
import { setFormulas } from '$lib/server/formulas';
import { readQuery } from '$lib/server/reading';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { note } = await requireNoteNumbered(
		event,
		event.params.programme,
		event.params.note,
		'baseline.read'
	);
	const revisions = (await baselinesOfNote(note.id)).map(({ revision }) => revision);
	const [latest] = revisions;
	if (!latest) return { note, revisions, compared: null, formulas: {} };
	if (!event.url.searchParams.has('from')) redirect(307, `?from=${latest}&to=now`);
	const { from, to } = readQuery(event.url, comparedInput);
	const compared = await compareSides(note, from, to);
	return { note, revisions, compared, formulas: setFormulas(compared) };
};
