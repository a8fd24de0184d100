import { knownZone, ZONE_COOKIE } from '$lib/time';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = ({ cookies, depends }) => {
	depends('app:zone');
	return { zone: knownZone(cookies.get(ZONE_COOKIE)) };
};
