import { requireProgramme } from '$lib/server/auth/guard';
import { may, PROGRAMME_ACTIONS } from '$lib/server/auth/permissions';
import { recordHere } from '$lib/server/programmes/members';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = async (event) => {
	const { person, programme, role } = await requireProgramme(
		event,
		event.params.programme,
		'programme.read'
	);
	await recordHere(person.id, programme.id);
	const { id, code, title, summary, legalOwner } = programme;
	return {
		programme: { id, code, title, summary, legalOwner },
		role,
		/** What the person may do here, for pages to offer; each request is asked again. */
		may: PROGRAMME_ACTIONS.filter((action) => may(role, action))
	};
};
