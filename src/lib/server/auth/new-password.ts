import { z } from 'zod';
import { passwordRules } from '$lib/password-rules';

/** A password that meets the rules for the person; each rule it breaks is a sentence. */
export const newPasswordSchema = (person: (string | undefined)[]) =>
	z.string().superRefine((password, context) => {
		const known = person.filter((text) => text !== undefined);
		for (const rule of passwordRules(password, known))
			if (!rule.holds) context.addIssue({ code: 'custom', message: `It must be: ${rule.words}.` });
	});
