/**
 * The closed shape of a text item: ProseMirror JSON of our own node names. The editor's schema, the
 * projection, comparison and the frozen sheet all follow it.
 */
import * as z from 'zod/mini';

/**
 * Where a link may lead: the web, mail, or a page of this site. Anything else (javascript:, data:,
 * another host written as // or /\\) would run or mislead when somebody follows it.
 */
const hrefSchema = z
	.string()
	.check(z.maxLength(2000), z.regex(/^(https?:\/\/|mailto:|\/(?![/\\]))/i));

/** Deepest nesting of lists that is read; a document cannot make readers recurse without end. */
export const DEEPEST_LIST = 8;

export const markSchema = z.discriminatedUnion('type', [
	z.object({ type: z.literal('bold') }),
	z.object({ type: z.literal('italic') }),
	z.object({ type: z.literal('subscript') }),
	z.object({ type: z.literal('superscript') }),
	z.object({ type: z.literal('link'), attrs: z.object({ href: hrefSchema }) })
]);
export type ProseMark = z.infer<typeof markSchema>;

const marks = z.optional(z.array(markSchema));

export const inlineSchema = z.discriminatedUnion('type', [
	z.object({ type: z.literal('text'), text: z.string(), marks }),
	z.object({ type: z.literal('hardBreak'), marks }),
	/** A formula in TeX, set by KaTeX. */
	z.object({ type: z.literal('formula'), attrs: z.object({ tex: z.string() }), marks }),
	/** The live value of a quantity of the note, by the symbol it had when put in and its item. */
	z.object({
		type: z.literal('quantity'),
		attrs: z.object({
			item: z.string(),
			/** Output of a line model, e.g. "taper"; empty for a given or a calculation. */
			output: z.string()
		}),
		marks
	})
]);
export type ProseInline = z.infer<typeof inlineSchema>;

const inlineContent = z.optional(z.array(inlineSchema));

const paragraphSchema = z.object({ type: z.literal('paragraph'), content: inlineContent });
const headingSchema = z.object({
	type: z.literal('heading'),
	attrs: z.object({ level: z.union([z.literal(3), z.literal(4)]) }),
	content: inlineContent
});

export type ProseBlock =
	| z.infer<typeof paragraphSchema>
	| z.infer<typeof headingSchema>
	| { type: 'bulletList' | 'orderedList'; content: ProseListItem[] };
export type ProseListItem = { type: 'listItem'; content: ProseBlock[] };

const blockSchema: z.ZodMiniType<ProseBlock> = z.lazy(() =>
	z.union([
		paragraphSchema,
		headingSchema,
		z.object({
			type: z.enum(['bulletList', 'orderedList']),
			content: z.array(z.object({ type: z.literal('listItem'), content: z.array(blockSchema) }))
		})
	])
);

export const proseSchema = z.object({ type: z.literal('doc'), content: z.array(blockSchema) });
export type Prose = z.infer<typeof proseSchema>;
