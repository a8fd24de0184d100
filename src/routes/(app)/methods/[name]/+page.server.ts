import { describe, methodNamed } from '$lib/server/engine/methods';
import { ENGINE_VERSION } from '$lib/engine/version';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = ({ params }) => ({
	engine: ENGINE_VERSION,
	method: describe(methodNamed(params.name))
});
