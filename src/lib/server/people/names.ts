import { z } from 'zod';

/** A person's name as it stands on sheets: one line, short enough for a title block. */
export const personNameSchema = z
	.string()
	.trim()
	.min(2, 'A name has at least two letters, as in A. Nwosu.')
	.max(60, 'A name has at most 60 letters; sheets have little room.')
	.regex(/^[^\p{C}]*$/u, 'A name is one line of ordinary letters.');
