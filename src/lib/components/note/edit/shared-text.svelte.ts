/**
 * A text area bound to a shared text. What is typed goes into the text as the least change; what others
 * type comes into the area with the caret kept on its letter. While an input method composes, others'
 * edits wait, because writing into the area would end the composition.
 */
import * as Y from 'yjs';
import { shift, spliceOf, type Delta } from './splice';

export class SharedText {
	value = $state('');
	/** Own caret; null while the area has no focus. */
	caret = $state<number | null>(null);

	#area: HTMLTextAreaElement | null = null;
	/** What the area held when it was last level with the text. */
	#level = '';
	#composing = false;
	#waiting: Delta[] = [];
	#writing = false;

	constructor(
		readonly text: Y.Text,
		readonly origin: unknown
	) {
		this.#level = this.value = text.toString();
	}

	/** Binds an area; returns what unbinds it. */
	bind(area: HTMLTextAreaElement): () => void {
		this.#area = area;
		area.value = this.#level = this.value = this.text.toString();
		this.text.observe(this.#changed);
		return () => {
			this.text.unobserve(this.#changed);
			this.#area = null;
		};
	}

	composing(on: boolean): void {
		this.#composing = on;
		if (!on) this.typed();
	}

	/** The area was written into. */
	typed(): void {
		const area = this.#area;
		if (!area) return;
		this.value = area.value;
		if (this.#composing) return;
		const written = area.value.replace(/[\r\n]+/g, ' ');
		const splice = spliceOf(this.#level, written, area.selectionStart);
		let [from, to] = splice ? [splice.at, splice.at + splice.removed] : [0, 0];
		for (const delta of this.#waiting) [from, to] = [shift(from, delta), shift(to, delta)];
		this.#waiting = [];
		if (splice) this.#write(from, to, splice.inserted);
		this.#show(splice ? from + splice.inserted.length : area.selectionStart);
	}

	/** Puts a word in place of [from, to) and the caret behind it. */
	replace(from: number, to: number, word: string): void {
		this.#write(from, to, word);
		this.#show(from + word.length);
		this.#area?.focus();
	}

	#write(from: number, to: number, inserted: string): void {
		this.#writing = true;
		this.text.doc?.transact(() => {
			if (to > from) this.text.delete(from, to - from);
			if (inserted !== '') this.text.insert(from, inserted);
		}, this.origin);
		this.#writing = false;
	}

	#changed = ({ delta }: Y.YTextEvent): void => {
		if (this.#writing) return;
		if (this.#composing) {
			this.#waiting.push(delta as Delta);
			return;
		}
		const area = this.#area!;
		this.#show(
			shift(area.selectionStart, delta as Delta),
			shift(area.selectionEnd, delta as Delta)
		);
	};

	#show(start: number, end = start): void {
		const area = this.#area;
		this.#level = this.value = this.text.toString();
		if (!area || area.value === this.#level) return;
		area.value = this.#level;
		// Setting a selection would take the focus to this field in some browsers.
		if (document.activeElement === area) area.setSelectionRange(start, end);
	}
}
