/** Prose with what is new in it told apart: an inline piece that is new carries `added`. */
import type { Prose, ProseBlock, ProseInline, ProseListItem } from './prose';
import { pieces, proseTokens } from './tokens';
import { differenceOf } from './words';

export type ShownInline = ProseInline & { added?: true };

/** `after` as it stands, its new words, formulas and live values marked. */
export function withAdded(before: Prose, after: Prose): Prose {
	const isNew = differenceOf(proseTokens(before), proseTokens(after)).parts.flatMap((part) =>
		part.change === 'out' ? [] : part.tokens.map(() => part.change === 'in')
	);
	let at = 0;
	const next = () => isNew[at++] === true;

	function marked<B extends ProseBlock | ProseListItem>(block: B): B {
		if (block.type !== 'paragraph' && block.type !== 'heading')
			return { ...block, content: block.content.map((part) => marked(part)) };
		const content = block.content?.flatMap((inline) => markedInline(inline, next));
		// The end of a block is a token of its own.
		next();
		return { ...block, content };
	}
	return { ...after, content: after.content.map(marked) };
}

function markedInline(inline: ProseInline, next: () => boolean): ShownInline[] {
	if (inline.type === 'hardBreak') return [inline];
	if (inline.type !== 'text') return [next() ? { ...inline, added: true } : inline];
	const runs: { text: string; added: boolean }[] = [];
	let end = 0;
	for (const { 0: piece, index } of pieces(inline.text)) {
		const added = next();
		const gap = inline.text.slice(end, index);
		const last = runs.at(-1);
		if (last?.added === added) last.text += gap + piece;
		else {
			// The space before a new word is not new.
			if (last && !last.added) last.text += gap;
			else if (gap !== '') runs.push({ text: gap, added: false });
			runs.push({ text: piece, added });
		}
		end = index + piece.length;
	}
	if (end < inline.text.length) runs.push({ text: inline.text.slice(end), added: false });
	return runs.map(({ text, added }) => ({ ...inline, text, ...(added && { added }) }));
}
