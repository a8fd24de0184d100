import { requirePerson } from '$lib/server/auth/guard';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = (event) => {
	const { id, name, email, isAdministrator } = requirePerson(event);
	return { person: { id, name, email, isAdministrator } };
};
