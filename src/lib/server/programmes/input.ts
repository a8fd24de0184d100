/** What people type about programmes, people and gates. */
import { z } from 'zod';
import { addressSchema } from '../auth/sign-in';
import { ROLES } from '../auth/permissions';

const line = (most: number) =>
	z
		.string()
		.trim()
		.max(most, `This has room for ${most} characters.`)
		.regex(/^[^\p{C}]*$/u, 'This is one line of ordinary characters.');

const title = line(80).min(3, 'A title has at least three letters.');
const summary = line(120);
const field = line(40);
const id = z.guid('This row is not there any more.');

export const newProgrammeSchema = z.object({
	code: z
		.string()
		.trim()
		.toUpperCase()
		.regex(/^[A-Z][A-Z0-9]{1,5}$/, 'A code has two to six letters and digits, as in CL.'),
	title,
	summary,
	legalOwner: line(80).min(2, 'The legal owner stands in every title block.'),
	leadEmail: addressSchema
});

export const programmeHeadSchema = z.object({ title, summary });

export const invitedSchema = z.object({
	email: addressSchema,
	role: z.enum(ROLES, 'Choose what they may do.'),
	field,
	message: line(500)
});

export const invitationIdSchema = z.object({ id });

export const memberSchema = z.object({ id, role: z.enum(ROLES), field });

/** Ending somebody's place asks for their name, typed. */
export const removalSchema = z
	.object({ id, name: z.string(), typed: z.string().trim() })
	.refine(({ name, typed }) => typed === name, {
		path: ['typed'],
		error: 'Type the name as it stands in the row.'
	});

export const gateSchema = z.object({
	kind: line(12).min(1, 'Say which gate it is, as in PDR.'),
	name: line(80).min(3, 'A gate has a name, as in Preliminary design review.'),
	date: z.union([z.literal('').transform(() => null), z.iso.date('A date is a day that exists.')])
});

export const changedGateSchema = gateSchema.extend({ id });
export const gateIdSchema = z.object({ id });
export const gateMoveSchema = z.object({ id, direction: z.enum(['earlier', 'later']) });
