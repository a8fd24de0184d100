import { z } from 'zod';
import { askForReset } from '$lib/server/auth/resets';
import { addressSchema } from '$lib/server/auth/sign-in';
import { answerForm } from '$lib/server/forms';
import type { Actions } from './$types';

export const actions: Actions = {
	default: ({ request, getClientAddress }) =>
		answerForm(request, 'reset', z.object({ email: addressSchema }), ({ email }) =>
			askForReset(email, getClientAddress())
		)
};
