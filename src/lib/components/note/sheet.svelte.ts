/**
 * The live sheet: what the document holds and what the engine answers, item by item. Only rows that an
 * edit or a result touched are told; results come from the worker a moment after their edit.
 */
import { SvelteMap } from 'svelte/reactivity';
import type * as Y from 'yjs';
import type { ItemResult } from '$lib/engine/calc/results';
import { Evaluation } from '$lib/evaluation/evaluation';
import type { Item, NoteContent } from '$lib/note/items';
import { numberItems } from '$lib/note/numbering';
import { projectNote } from '$lib/note/projection';
import { thinLimitOf, toSheetItem } from '$lib/note/sheet-items';
import { watchNote, type NoteChange } from '$lib/note/watch';
import { kindsBySection } from './columns';
import { symbolsOf, type SheetView } from './sheet-view';
import { countChecks, type SheetSummary } from './summary';

export class SheetEntry {
	item = $state.raw() as Item;
	result = $state.raw<ItemResult>();
	number = $state('');

	constructor(item: Item) {
		this.item = item;
	}
}

export class NoteSheet implements SheetView {
	order = $state.raw<string[]>([]);
	thinLimit = $state('');
	/** Kinds in each section, for its captions. */
	sections = $state.raw(kindsBySection([]));
	summary = $state.raw<SheetSummary>({
		counts: { holds: 0, thin: 0, fails: 0, waits: 0 },
		marks: []
	});
	/** Whether the first results have come. */
	evaluated = $state(false);
	/** Whether a given was taken from a baseline of another note. */
	takes = $state(false);
	/** Why nothing is computed any more; empty while it is. */
	failure = $state('');

	// Looked up, never listened to: what changes is inside the entries, and in the order.
	// eslint-disable-next-line svelte/prefer-svelte-reactivity
	#entries = new Map<string, SheetEntry>();
	#symbols = new SvelteMap<string, string>();
	#evaluation: Evaluation;
	#unwatch: () => void;

	constructor(doc: Y.Doc) {
		this.#evaluation = new Evaluation({
			onResults: (changed, removed) => this.#answered(changed, removed),
			onFailure: (message) => (this.failure = message)
		});
		const { items, thinLimit } = projectNote(doc);
		this.#change({ upsert: items, remove: [], order: items.map(({ id }) => id), thinLimit });
		this.#unwatch = watchNote(doc, (change) => this.#change(change));
	}

	entry(id: string): SheetEntry | undefined {
		return this.#entries.get(id);
	}

	item(id: string): Item | undefined {
		return this.#entries.get(id)?.item;
	}

	result(id: string): ItemResult | undefined {
		return this.#entries.get(id)?.result;
	}

	number(id: string): string {
		return this.#entries.get(id)?.number ?? '';
	}

	symbolTex(symbol: string): string {
		return this.#symbols.get(symbol) ?? '';
	}

	/** What of this note's symbols, units and functions begins so. */
	complete(prefix: string) {
		return this.#evaluation.complete(prefix);
	}

	content(): NoteContent {
		const items = this.order.flatMap((id) => this.item(id) ?? []);
		return { format: 'holdfast-note', version: 1, thinLimit: this.thinLimit, items };
	}

	results(): ItemResult[] {
		return this.order.flatMap((id) => this.result(id) ?? []);
	}

	destroy(): void {
		this.#unwatch();
		this.#evaluation.dispose();
	}

	#change({ upsert, remove, order, thinLimit }: NoteChange): void {
		let kinds = order !== null;
		for (const item of upsert) {
			if (item.kind === 'given' && item.taken !== '') this.takes = true;
			const entry = this.#entries.get(item.id);
			if (!entry) this.#entries.set(item.id, new SheetEntry(item));
			else {
				kinds ||= entry.item.kind !== item.kind;
				entry.item = item;
			}
		}
		if (order) this.order = order.filter((id) => this.#entries.has(id));
		for (const id of remove) this.#entries.delete(id);
		if (kinds) this.#renumber();
		if (thinLimit !== null) this.thinLimit = thinLimit;
		this.#evaluation.apply({
			upsert: upsert.flatMap((item) => toSheetItem(item) ?? []),
			remove,
			...(order && { order }),
			...(thinLimit !== null && { thinLimit: thinLimitOf(thinLimit) })
		});
	}

	#renumber(): void {
		const items = this.order.flatMap((id) => this.item(id) ?? []);
		for (const [id, number] of numberItems(items)) this.#entries.get(id)!.number = number;
		this.sections = kindsBySection(items);
		this.summary = countChecks(this.order, (id) => this.result(id));
	}

	#answered(changed: ItemResult[], removed: string[]): void {
		for (const result of changed) {
			const entry = this.#entries.get(result.id);
			if (!entry) continue;
			entry.result = result;
			for (const [symbol, tex] of symbolsOf(result)) {
				if (symbol !== '') this.#symbols.set(symbol, tex);
			}
		}
		for (const id of removed) {
			const entry = this.#entries.get(id);
			if (entry) entry.result = undefined;
		}
		if (changed.some(({ kind }) => kind === 'check') || removed.length > 0 || !this.evaluated) {
			this.summary = countChecks(this.order, (id) => this.result(id));
		}
		this.evaluated = true;
	}
}
