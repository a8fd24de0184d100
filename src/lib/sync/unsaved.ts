/**
 * How many edits of this browser have not been acknowledged, kept beside the document in the browser so
 * that a reload while offline still tells the truth. Each tab writes its own count, and a new one takes
 * over what earlier ones left.
 */
export class UnsavedCount {
	/** Edits made, counted over this tab and those it took over. */
	made: number;
	/** Edits known to be committed. */
	saved = 0;
	#prefix: string;
	#own: string;
	#takenOver: string[];

	constructor(noteKey: string, tab: number) {
		this.#prefix = `${noteKey}-unsaved-`;
		this.#own = this.#prefix + tab;
		const left = this.#stored();
		this.#takenOver = left.map(([key]) => key);
		this.made = left.reduce((sum, [, count]) => sum + count, 0);
	}

	get unsaved(): number {
		return this.made - this.saved;
	}

	add(): void {
		this.made += 1;
		storage()?.setItem(this.#own, String(this.unsaved));
	}

	/** Everything up to `count` is committed, so what earlier tabs left is as well. */
	acknowledge(count: number): void {
		this.saved = Math.min(this.made, Math.max(this.saved, count));
		for (const key of this.#takenOver.splice(0)) storage()?.removeItem(key);
		if (this.unsaved > 0) storage()?.setItem(this.#own, String(this.unsaved));
		else storage()?.removeItem(this.#own);
	}

	/** Forgets all counts of the note in this browser. */
	clear(): void {
		for (const [key] of this.#stored()) storage()?.removeItem(key);
	}

	#stored(): [string, number][] {
		const store = storage();
		if (!store) return [];
		return Array.from({ length: store.length }, (_, index) => store.key(index))
			.filter((key): key is string => key?.startsWith(this.#prefix) ?? false)
			.map((key) => [key, Number(store.getItem(key))]);
	}
}

/** Not to be had outside a browser, and refused by some that keep nothing. */
function storage(): Storage | null {
	try {
		return globalThis.localStorage ?? null;
	} catch {
		return null;
	}
}
