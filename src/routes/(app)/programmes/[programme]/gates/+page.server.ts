import type { RequestEvent } from '@sveltejs/kit';
import { requireProgramme } from '$lib/server/auth/guard';
import { answerForm } from '$lib/server/forms';
import { addGate, changeGate, gatesOf, moveGate, removeGate } from '$lib/server/gates/gates';
import { changeProgramme } from '$lib/server/programmes/changes';
import {
	changedGateSchema,
	gateIdSchema,
	gateMoveSchema,
	gateSchema,
	programmeHeadSchema
} from '$lib/server/programmes/input';
import type { Actions, PageServerLoad } from './$types';

type Event = RequestEvent<{ programme: string }>;

export const load: PageServerLoad = async (event) => {
	const { programme } = await requireProgramme(event, event.params.programme, 'programme.read');
	return { gates: await gatesOf(programme.id), now: new Date() };
};

const asLead = (event: Event) => requireProgramme(event, event.params.programme, 'gate.change');

export const actions: Actions = {
	add: async (event) => {
		const { programme } = await asLead(event);
		return answerForm(event.request, 'add', gateSchema, (values) => addGate(programme.id, values));
	},

	change: async (event) => {
		const { programme } = await asLead(event);
		return answerForm(event.request, 'change', changedGateSchema, ({ id, ...values }) =>
			changeGate(programme.id, id, values)
		);
	},

	move: async (event) => {
		const { programme } = await asLead(event);
		return answerForm(event.request, 'move', gateMoveSchema, ({ id, direction }) =>
			moveGate(programme.id, id, direction)
		);
	},

	remove: async (event) => {
		const { programme } = await asLead(event);
		return answerForm(event.request, 'remove', gateIdSchema, ({ id }) =>
			removeGate(programme.id, id)
		);
	},

	head: async (event) => {
		const { programme } = await requireProgramme(event, event.params.programme, 'programme.change');
		return answerForm(event.request, 'head', programmeHeadSchema, (values) =>
			changeProgramme(programme.id, values)
		);
	}
};
