/**
 * Follows what people do to a note, off the way of their typing: a little after an edit it evaluates the
 * note in the engine pool and writes down who wrote which item, what the register shows of the note,
 * and what moved a check. An edit by another process is left to that process, unless it does not come
 * to it.
 */
import type * as Y from 'yjs';
import { EngineLimitError } from '$lib/server/engine/pool';
import { log } from '$lib/server/log';
import { evaluatedSeq, observe } from '$lib/server/notes/observe';
import { Touches } from '$lib/server/notes/touches';
import type { ItemResult } from '$lib/engine/calc/results';
import type { NoteContent } from '$lib/note/items';
import { projectNote } from '$lib/note/projection';

export type Evaluate = (content: NoteContent) => Promise<ItemResult[]>;

/** After the last edit; at the latest after the first; after another process's; after a failure (ms). */
const PAUSE = 300;
const LATEST = 2000;
const ELSEWHERE = 3000;
const AGAIN = 5000;

export class Watcher {
	#touches: Touches | null = null;
	#results: ItemResult[] = [];
	#timer: NodeJS.Timeout | null = null;
	#due = 0;
	#first = 0;
	#running: Promise<void> = Promise.resolve();

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
		this.#touches ??= new Touches(this.doc);
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
		this.#touches?.end();
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

	async #run(): Promise<void> {
		const touched = this.#touches?.take() ?? new Map();
		try {
			const seq = this.seq();
			const content = projectNote(this.doc);
			const results = await this.evaluate(content).catch(beyondLimits);
			await observe(this.noteId, { seq, content, touched, results, earlier: this.#results });
			this.#results = results ?? [];
		} catch (error) {
			log.warn({ error, noteId: this.noteId }, 'a note could not be evaluated yet');
			this.#touches?.putBack(touched);
			this.#runIn(AGAIN);
		}
	}
}

/** A note too heavy for the engine stays so until it is edited: there is no use in trying again. */
function beyondLimits(error: unknown): null {
	if (error instanceof EngineLimitError) return null;
	throw error;
}
