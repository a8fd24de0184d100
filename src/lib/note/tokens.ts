/** Texts, plain or prose, cut into the pieces that a comparison tells apart. */
import type { Prose, ProseBlock, ProseInline, ProseListItem } from './prose';

/** The smallest piece that is in or out: a word, a sign, a formula, a live value, the end of a block. */
export type Token = {
	kind: 'word' | 'sign' | 'formula' | 'quantity' | 'end';
	/** The word or sign; TeX of a formula; item (and output) of a live value. */
	text: string;
	/** Whether white space follows. */
	spaced: boolean;
};

// A word keeps what joins its letters and digits: 1.059, CL-DN-004, loom’s.
const PIECE = /[\p{L}\p{M}\p{N}_]+(?:[.,'’‑-][\p{L}\p{M}\p{N}_]+)*|[^\s\p{L}\p{M}\p{N}_]/gu;

/** The words and signs of a text, with where they stand. */
export const pieces = (text: string) => text.matchAll(PIECE);

export function textTokens(text: string): Token[] {
	return [...pieces(text)].map(({ 0: piece, index }) => ({
		kind: /^[\p{L}\p{N}_]/u.test(piece) ? 'word' : 'sign',
		text: piece,
		spaced: /^\s/.test(text.slice(index + piece.length, index + piece.length + 1))
	}));
}

export function proseTokens(prose: Prose): Token[] {
	return prose.content.flatMap(blockTokens);
}

function blockTokens(block: ProseBlock | ProseListItem): Token[] {
	if (block.type === 'paragraph' || block.type === 'heading') {
		return [...inlineTokens(block.content ?? []), { kind: 'end', text: '', spaced: false }];
	}
	return (block.content as (ProseBlock | ProseListItem)[]).flatMap(blockTokens);
}

function inlineTokens(content: ProseInline[]): Token[] {
	const tokens: Token[] = [];
	for (const inline of content) {
		const last = tokens.at(-1);
		if (inline.type === 'text') {
			if (last && /^\s/.test(inline.text)) last.spaced = true;
			tokens.push(...textTokens(inline.text));
		} else if (inline.type === 'hardBreak') {
			if (last) last.spaced = true;
		} else if (inline.type === 'formula') {
			tokens.push({ kind: 'formula', text: inline.attrs.tex, spaced: false });
		} else {
			const { item, output } = inline.attrs;
			tokens.push({ kind: 'quantity', text: output ? `${item}.${output}` : item, spaced: false });
		}
	}
	return tokens;
}
