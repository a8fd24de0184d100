/** The title block of a baseline and the circumstances of its freezing: the first of its sealed texts. */
import { z } from 'zod';

const checkCounts = z.object({
	holds: z.number(),
	thin: z.number(),
	fails: z.number(),
	waits: z.number()
});

export const headSchema = z.object({
	format: z.literal('holdfast-baseline'),
	version: z.literal(1),
	note: z.object({
		id: z.string(),
		number: z.string(),
		title: z.string(),
		department: z.string(),
		technicalReference: z.string(),
		creator: z.string(),
		approver: z.string()
	}),
	programme: z.object({ code: z.string(), title: z.string(), legalOwner: z.string() }),
	revision: z.string(),
	gate: z.object({ id: z.string(), kind: z.string(), name: z.string() }),
	/** The update of the document that was frozen. */
	seq: z.number(),
	frozenBy: z.object({ id: z.string(), name: z.string() }),
	frozenAt: z.iso.datetime(),
	engineVersion: z.string(),
	items: z.number(),
	/** Quantities, outputs of line models and checks. */
	figures: z.number(),
	checks: checkCounts
});
export type BaselineHead = z.infer<typeof headSchema>;
