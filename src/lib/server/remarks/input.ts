/** What people may send. */
import { z } from 'zod';
import { itemIdSchema } from '$lib/note/items';
import { plainText } from '$lib/note/plain-text';

const words = z
	.string()
	.transform((text) => plainText(text).trim())
	.pipe(
		z
			.string()
			.min(1, 'A remark says something.')
			.max(4000, 'A remark has at most 4 000 characters.')
	);

export const remarkInput = z.object({ itemId: itemIdSchema, body: words });
export const replyInput = z.object({ body: words });
export const settledInput = z.object({ settled: z.boolean() });
