import { Problem } from '$lib/server/problems';
import { requireBaseline } from '$lib/server/baselines/guard';
import { changesBefore } from '$lib/server/baselines/before';
import { opened } from '$lib/server/baselines/read';
import { setFormulas } from '$lib/server/formulas';
import { markViewed } from '$lib/server/baselines/waiting';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { row, note, programme, person } = await requireBaseline(
		event,
		event.params.baseline,
		'baseline.read'
	);
	if (programme.code !== event.params.programme)
		throw new Problem(404, `${event.params.programme} has no such baseline.`);
	await markViewed(row.id, person.id);
	const baseline = opened(row);
	return {
		baseline,
		before: await changesBefore(row.noteId, row.frozenAt, baseline),
		draft: note.revision,
		formulas: setFormulas(baseline)
	};
};
