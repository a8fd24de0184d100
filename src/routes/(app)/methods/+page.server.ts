import { METHODS } from '$lib/engine/methods/catalogue';
import { ENGINE_VERSION } from '$lib/engine/version';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = () => ({
	engine: ENGINE_VERSION,
	methods: [...METHODS.values()].map(({ name, title, summary, subject }) => ({
		name,
		title,
		summary,
		subject
	}))
});
