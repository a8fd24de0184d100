/**
 * Follows what people do to a note, off the way of their typing: a little after an edit it evaluates the
 * note in the engine pool and writes down who wrote which item, what the register shows of the note,
 * and what moved a check. An edit by another process is left to that process, unless it does not come
 * to it.
 */
import type * as Y from 'yjs';
import { log } from '$lib/server/log';
import { evaluatedSeq, observe, type Touch } from '$lib/server/notes/observe';
import type { ItemResult } from '$lib/engine/calc/results';
import type { Item, NoteContent } from '$lib/note/items';
import { projectNote } from '$lib/note/projection';
import { watchNote, type NoteChange } from '$lib/note/watch';

export type Evaluate = (content: NoteContent) => Promise<ItemResult[]>;

/** After the last edit; at the latest after the first; after another process's; after a failure (ms). */
const PAUSE = 300;
const LATEST = 2000;
const ELSEWHERE = 3000;
const AGAIN = 5000;

export class Watcher {
	/** Items as last seen; null until `begin`. */
	#known: Map<string, Item> | null = null;
	#touched = new Map<string, Touch>();
	#results: ItemResult[] = [];
	#timer: NodeJS.Timeout | null = null;
	#due = 0;
	#first = 0;
	#running: Promise<void> = Promise.resolve();
	#end = () => {};

	constructor(
		private readonly noteId: string,
		private readonly doc: Y.Doc,
		private readonly seq: () => number,
		private readonly evaluate: Evaluate
	) {}

	/** The newest update that has been looked at, by whichever process. */
	evaluatedSeq(): Promise<number> {
		return evaluatedSeq(this.noteId);
	}

	/** From here on, changes of the document are somebody's edits. */
	begin(): void {
		if (this.#known) return;
		const content = projectNote(this.doc);
		this.#known = new Map(content.items.map((item) => [item.id, item]));
		this.#end = watchNote(this.doc, (change, origin) => this.#noticed(change, origin));
	}

	wake(): void {
		this.#runIn(PAUSE);
	}

	wakeLater(): void {
		if (!this.#timer) this.#runIn(ELSEWHERE);
	}

	/** Looks at what has not been looked at yet. */
	async finish(): Promise<void> {
		if (this.#timer) this.#start();
		await this.#running;
	}

	destroy(): void {
		if (this.#timer) clearTimeout(this.#timer);
		this.#timer = null;
		this.#end();
	}

	#runIn(milliseconds: number): void {
		const now = Date.now();
		if (this.#timer) clearTimeout(this.#timer);
		else this.#first = now;
		this.#due = Math.min(now + milliseconds, this.#first + Math.max(LATEST, milliseconds));
		this.#timer = setTimeout(() => this.#start(), this.#due - now);
	}

	#start(): void {
		if (this.#timer) clearTimeout(this.#timer);
		this.#timer = null;
		this.#running = this.#running.then(() => this.#run());
	}

	#noticed({ upsert, remove }: NoteChange, origin: unknown): void {
		const userId = (origin as { userId?: string | null } | null)?.userId ?? null;
		const at = new Date();
		const touch = (id: string, before: Item | null) =>
			this.#touched.set(id, { userId, at, before: this.#touched.get(id)?.before ?? before });
		const known = this.#known!;
		for (const item of upsert) {
			const before = known.get(item.id) ?? null;
			known.set(item.id, item);
			// Moving an item does not make one its author.
			if (JSON.stringify(before) !== JSON.stringify(item)) touch(item.id, before);
		}
		for (const id of remove) {
			touch(id, known.get(id) ?? null);
			known.delete(id);
		}
	}

	async #run(): Promise<void> {
		const touched = this.#touched;
		this.#touched = new Map();
		try {
			const seq = this.seq();
			const content = projectNote(this.doc);
			const results = await this.evaluate(content);
			await observe(this.noteId, { seq, content, touched, results, earlier: this.#results });
			this.#results = results;
		} catch (error) {
			log.warn({ error, noteId: this.noteId }, 'a note could not be evaluated yet');
			for (const [id, touch] of touched)
				this.#touched.set(id, { ...(this.#touched.get(id) ?? touch), before: touch.before });
			this.#runIn(AGAIN);
		}
	}
}
