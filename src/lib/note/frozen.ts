/** Shapes that are kept as they were: what a remark was pinned to, what a baseline was frozen with. */
import { z } from 'zod';
import { plainText } from './plain-text';

/** An item as it stood when a remark was pinned to it. Figures are in the unit that was shown. */
export const pinnedValueSchema = z.object({
	number: z.string(),
	symbol: z.string(),
	symbolTex: z.string(),
	description: z.string(),
	/** Value of a quantity or margin of a check in the shown unit; null where there was none. */
	value: z.number().nullable(),
	unit: z.string(),
	/** Significant digits to show. */
	digits: z.number(),
	/** State of a check, or why there was no value ("waits for σ_d"). */
	state: z.string()
});
export type PinnedValue = z.infer<typeof pinnedValueSchema>;

/** Why a failing check may be frozen. */
export const waiverSchema = z.object({
	itemId: z.string(),
	reason: z
		.string()
		.transform((text) => plainText(text).trim())
		.pipe(
			z
				.string()
				.min(10, 'A waiver says why, in at least ten characters.')
				.max(2000, 'A waiver has at most 2 000 characters.')
		)
});
export type Waiver = z.infer<typeof waiverSchema>;

export const evidenceDigestSchema = z.object({
	fileId: z.string(),
	name: z.string(),
	size: z.number(),
	sha256: z.string()
});
export type EvidenceDigest = z.infer<typeof evidenceDigestSchema>;
