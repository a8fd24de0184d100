/** Completing the word at the caret of an expression: the note's symbols first, then functions and units. */
import type * as Y from 'yjs';
import type { Suggestion } from '$lib/engine/calc/completion';
import type { SharedText } from './shared-text.svelte';

/** A name as expressions have it, up to the caret: letters, digits, underscores, dots of line models. */
const NAME = /[\p{L}_][\p{L}\p{N}_.]*$/u;

export class Completion {
	prefix = $state('');
	suggestions = $state.raw<Suggestion[]>([]);
	index = $state(0);

	#field = $state.raw<SharedText | null>(null);
	#asked = 0;

	constructor(readonly complete: (prefix: string) => Promise<Suggestion[]>) {}

	get chosen(): Suggestion | undefined {
		return this.#field ? this.suggestions[this.index] : undefined;
	}

	/** What of the chosen word is still to be typed, where it can stand behind the caret. */
	ghostFor(text: Y.Text): string {
		const { chosen } = this;
		const field = this.#field;
		if (!chosen || field?.text !== text || field.caret !== field.value.length) return '';
		return chosen.name.startsWith(this.prefix) ? chosen.name.slice(this.prefix.length) : '';
	}

	/** The caret moved or something was typed. */
	async follow(field: SharedText): Promise<void> {
		const before = field.value.slice(0, field.caret ?? 0);
		const prefix = NAME.exec(before)?.[0] ?? '';
		const same = this.#field === field && prefix === this.prefix;
		this.#field = field;
		this.prefix = prefix;
		if (same) return;
		this.index = 0;
		const asked = ++this.#asked;
		const found = prefix === '' ? [] : await this.complete(prefix);
		if (asked === this.#asked) this.suggestions = found.filter(({ name }) => name !== prefix);
	}

	leave(text: Y.Text): void {
		if (this.#field?.text !== text) return;
		this.#asked += 1;
		this.#field = null;
		this.prefix = '';
		this.suggestions = [];
	}

	take(suggestion: Suggestion | undefined = this.chosen): void {
		const field = this.#field;
		if (!suggestion || !field) return;
		const end = field.caret ?? field.value.length;
		const word = suggestion.name + (suggestion.kind === 'function' ? '(' : '');
		field.replace(end - this.prefix.length, end, word);
		field.caret = end - this.prefix.length + word.length;
		void this.follow(field);
	}

	pressed(event: KeyboardEvent): void {
		if (!this.chosen || event.altKey || event.ctrlKey || event.metaKey || event.isComposing) return;
		const last = this.suggestions.length - 1;
		if (event.key === 'Tab' && !event.shiftKey) this.take();
		else if (event.key === 'ArrowDown') this.index = this.index === last ? 0 : this.index + 1;
		else if (event.key === 'ArrowUp') this.index = this.index === 0 ? last : this.index - 1;
		else return;
		event.preventDefault();
	}
}
