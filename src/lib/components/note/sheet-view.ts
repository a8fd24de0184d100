/** What a row may ask of the sheet that it stands on; the live note and a frozen one both answer. */
import type { ItemResult } from '$lib/engine/calc/results';
import type { Item, NoteContent } from '$lib/note/items';
import type { Prose } from '$lib/note/prose';
import { numberItems } from '$lib/note/numbering';

export type SheetView = {
	item(id: string): Item | undefined;
	result(id: string): ItemResult | undefined;
	/** Number of an item, e.g. "3.4"; empty when it is not on the sheet. */
	number(id: string): string;
	/** The symbol set in TeX; empty when no item of the sheet defines it. */
	symbolTex(symbol: string): string;
	/** Margin below which a check that holds is thin, as typed. */
	readonly thinLimit: string;
};

/** What an item was in the last baseline: its revision letter and the words beside the triangle. */
export type Was = {
	letter: string;
	words: string;
	/** What outputs of a line model were, by their name. */
	outputs?: Record<string, string>;
	/** The text with its new words marked, and the prose that it stands for. */
	text?: { of: Prose; marked: Prose };
};

/** A sheet that does not change: a baseline. */
export function frozenSheet(content: NoteContent, results: readonly ItemResult[]): SheetView {
	const items = new Map(content.items.map((item) => [item.id, item]));
	const byId = new Map(results.map((result) => [result.id, result]));
	const numbers = numberItems(content.items);
	const symbols = new Map(results.flatMap(symbolsOf));
	return {
		item: (id) => items.get(id),
		result: (id) => byId.get(id),
		number: (id) => numbers.get(id) ?? '',
		symbolTex: (symbol) => symbols.get(symbol) ?? '',
		thinLimit: content.thinLimit
	};
}

/** Symbols that an item defines, with their TeX. */
export function symbolsOf(result: ItemResult): [string, string][] {
	if (result.kind === 'check') return [];
	if (result.kind === 'lineModel') {
		return result.outputs.map((output) => [`${result.symbol}.${output.name}`, output.symbolTex]);
	}
	return [[result.symbol, result.symbolTex]];
}
