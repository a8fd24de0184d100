import { z } from 'zod';

/**
 * A mail of ours: plain text to one person. Attack stopped here: line breaks or a second address in
 * what people typed (a title, a name) would add headers or recipients to the message.
 */
export const mailSchema = z.object({
	to: z.email().max(254),
	subject: z
		.string()
		.transform((text) => text.replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, ' ').trim())
		.pipe(z.string().min(1).max(250)),
	text: z.string().min(1).max(100_000)
});

export type Mail = z.infer<typeof mailSchema>;
