/** What a lead sends to freeze a note. */
import { z } from 'zod';
import { waiverSchema } from '$lib/note/frozen';

export const freezeInput = z.object({
	gateId: z.guid('Choose the gate at which the note is frozen.'),
	/** The revision that the lead means to freeze, and the update at which they looked. */
	revision: z.string().min(1).max(8),
	seenSeq: z.int().min(0),
	waivers: z.array(waiverSchema).max(1000)
});
export type FreezeInput = z.infer<typeof freezeInput>;

/** Which sides a comparison holds against each other, as in the address of its page. */
export const comparedInput = z.object({
	from: z.string().min(1).max(8),
	to: z.string().min(1).max(8).default('now')
});

const WAIVER_FIELD = 'waiver:';

/** The waivers of the freeze form: one field for each failing check; an empty one is no waiver. */
export function waiversFromForm(form: FormData): { itemId: string; reason: string }[] {
	return [...form]
		.filter(([name, value]) => name.startsWith(WAIVER_FIELD) && String(value).trim() !== '')
		.map(([name, value]) => ({ itemId: name.slice(WAIVER_FIELD.length), reason: String(value) }));
}
