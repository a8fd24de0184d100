/** Who edited which item since somebody last looked. */
import type * as Y from 'yjs';
import type { Item } from '$lib/note/items';
import { projectNote } from '$lib/note/projection';
import { watchNote, type NoteChange } from '$lib/note/watch';

/** The last editor of an item, and the item as it was before anybody edited it. */
export type Touch = { userId: string | null; at: Date; before: Item | null };

export class Touches {
	readonly #known: Map<string, Item>;
	#touched = new Map<string, Touch>();
	/** Ends the following of the document. */
	readonly end: () => void;

	/** Follows the document from here on. Transactions tell whose they are by `origin.userId`. */
	constructor(doc: Y.Doc) {
		this.#known = new Map(projectNote(doc).items.map((item) => [item.id, item]));
		this.end = watchNote(doc, (change, origin) => this.#noticed(change, origin));
	}

	/** What was touched since the last time. */
	take(): Map<string, Touch> {
		const touched = this.#touched;
		this.#touched = new Map();
		return touched;
	}

	/** Puts back what was taken and could not be dealt with. */
	putBack(earlier: ReadonlyMap<string, Touch>): void {
		for (const [id, touch] of earlier)
			this.#touched.set(id, { ...(this.#touched.get(id) ?? touch), before: touch.before });
	}

	#noticed({ upsert, remove }: NoteChange, origin: unknown): void {
		const userId = (origin as { userId?: string | null } | null)?.userId ?? null;
		for (const item of upsert) {
			const before = this.#known.get(item.id) ?? null;
			this.#known.set(item.id, item);
			// Moving an item does not make one its author.
			if (JSON.stringify(before) !== JSON.stringify(item)) this.#touch(item.id, userId, before);
		}
		for (const id of remove) {
			const before = this.#known.get(id);
			this.#known.delete(id);
			if (before) this.#touch(id, userId, before);
		}
	}

	#touch(id: string, userId: string | null, before: Item | null): void {
		const earlier = this.#touched.get(id);
		this.#touched.set(id, { userId, at: new Date(), before: earlier ? earlier.before : before });
	}
}
