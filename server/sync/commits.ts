/**
 * The edits of a note that are not in the database yet, and who waits to hear that they are.
 *
 * States:
 * - idle: everything is committed.
 * - gathering: edits came; they are committed together a few milliseconds later.
 * - committing: one transaction at a time, in the room's queue. Edits that come meanwhile wait.
 * - failing: a commit did not go through, or nobody knows whether it did. The edits are kept and tried
 *   again, later each time; an edit stored twice does no harm. Nobody is told that anything is saved.
 * - lost: the note is gone from the database. Nothing is acknowledged any more.
 *
 * A mark is acknowledged when everything received before it has been committed, and never earlier.
 */
import * as Y from 'yjs';
import { log } from '$lib/server/log';
import { appendUpdates, type NewUpdate } from '$lib/server/notes/document';
import { savedMessage } from '$lib/sync/protocol';
import type { Connection } from './connection';

/** Edits within this many milliseconds are committed together. */
const BATCH = 8;
/** Waits before a failed commit is tried again, in milliseconds; the last one repeats. */
const RETRIES = [100, 300, 1000, 2500, 5000];

type Mark = { connection: Connection; count: number; after: number };

export type Numbers = { first: number; last: number; at: Date };

export type CommitsOptions = {
	noteId: string;
	/** Name of this process, told to others with each commit. */
	process: string;
	/** Runs work after what runs already. */
	enqueue(work: () => Promise<void>): void;
	committed(numbers: Numbers): void;
	/** The note is gone from the database. */
	lost(): void;
};

export class Commits {
	/** Bytes of edits that wait. */
	bytes = 0;
	#waiting: NewUpdate[] = [];
	/** Edits received, and how many of them are committed. */
	#received = 0;
	#committed = 0;
	#marks: Mark[] = [];
	#failures = 0;
	#isDue = false;
	#isLost = false;
	#whenIdle: (() => void)[] = [];

	constructor(private readonly options: CommitsOptions) {}

	get isIdle(): boolean {
		return this.#waiting.length === 0;
	}

	/** Resolves when everything is committed. */
	async idle(): Promise<void> {
		if (!this.isIdle) await new Promise<void>((resolve) => this.#whenIdle.push(resolve));
	}

	add(update: Uint8Array, userId: string): void {
		this.#received += 1;
		this.#waiting.push({ update, userId });
		this.bytes += update.byteLength;
		this.#commitIn(BATCH);
	}

	/** Acknowledges the count once everything received so far is committed. */
	mark(connection: Connection, count: number): void {
		const mark = { connection, count, after: this.#received };
		const earlier = this.#marks.filter((one) => one.connection === connection);
		// The first that waits and the newest: so much is enough, however long the database is away.
		if (earlier.length > 1) this.#marks.splice(this.#marks.indexOf(earlier.at(-1)!), 1);
		this.#marks.push(mark);
		this.#acknowledge(new Date());
	}

	forget(connection: Connection): void {
		this.#marks = this.#marks.filter((mark) => mark.connection !== connection);
	}

	#commitIn(milliseconds: number): void {
		if (this.#isDue || this.#failures > 0) return;
		this.#isDue = true;
		setTimeout(() => {
			this.#isDue = false;
			this.options.enqueue(() => this.#commit());
		}, milliseconds);
	}

	async #commit(): Promise<void> {
		const count = this.#waiting.length;
		if (count === 0) return;
		let numbers: Numbers | null;
		try {
			const { noteId, process } = this.options;
			numbers = await appendUpdates(noteId, mergeRuns(this.#waiting), process);
		} catch (error) {
			return this.#failed(error);
		}
		this.#failures = 0;
		this.#isLost ||= numbers === null;
		this.#settle(count);
		if (!numbers) return this.options.lost();
		this.#acknowledge(numbers.at);
		this.options.committed(numbers);
	}

	#settle(count: number): void {
		this.#committed += count;
		for (const { update } of this.#waiting.splice(0, count)) this.bytes -= update.byteLength;
		if (this.isIdle) for (const resolve of this.#whenIdle.splice(0)) resolve();
		else this.#commitIn(0);
	}

	#failed(error: unknown): void {
		const wait = RETRIES[Math.min(this.#failures, RETRIES.length - 1)]!;
		this.#failures += 1;
		log.warn({ error, noteId: this.options.noteId, wait }, 'edits could not be committed yet');
		// Not all notes at once.
		const scattered = wait * (0.75 + Math.random() / 2);
		setTimeout(() => this.options.enqueue(() => this.#commit()), scattered);
	}

	#acknowledge(at: Date): void {
		if (this.#isLost) return;
		const due = this.#marks.filter((mark) => mark.after <= this.#committed);
		this.#marks = this.#marks.filter((mark) => mark.after > this.#committed);
		for (const { connection, count } of due) connection.send(savedMessage(count, at));
	}
}

/** One update for each run of edits by the same person. */
function mergeRuns(updates: NewUpdate[]): NewUpdate[] {
	const runs: { userId: string; parts: Uint8Array[] }[] = [];
	for (const { update, userId } of updates) {
		const run = runs.at(-1);
		if (run?.userId === userId) run.parts.push(update);
		else runs.push({ userId, parts: [update] });
	}
	return runs.map(({ userId, parts }) => ({
		userId,
		update: merged(parts)
	}));
}

/** Yjs takes time as the square of the number of updates, so many are merged by the hundred. */
function merged(parts: Uint8Array[]): Uint8Array {
	if (parts.length === 1) return parts[0]!;
	if (parts.length <= 100) return Y.mergeUpdates(parts);
	const hundreds = Array.from({ length: Math.ceil(parts.length / 100) }, (_, index) =>
		merged(parts.slice(index * 100, (index + 1) * 100))
	);
	return merged(hundreds);
}
