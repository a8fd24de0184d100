/**
 * One open note in this process: its document, and the connections on it.
 *
 * States:
 * - loading: the document is read from the database. Connections wait; none of their messages is read.
 * - live: an edit is applied and sent to the others at once, put with those not yet committed, and
 *   committed with them a few milliseconds later. A mark is acknowledged after the commit of all that
 *   came before it. What other processes committed is fetched and sent on.
 * - failing: a commit did not go through. Edits are kept and go on reaching the others; the commit is
 *   tried again, later each time. Nobody is told that anything is saved.
 * - leaving: nobody is here. What is left is committed, the watcher finishes, the log is folded.
 * - gone: taken out of the registry. Whoever comes next loads the note anew.
 *
 * loading → live, or gone when it cannot be loaded; live ⇄ failing; live → leaving when the last
 * connection ends; leaving → live when one comes meanwhile, else → gone, which is decided in one step
 * with nobody here and nothing uncommitted.
 */
import * as Y from 'yjs';
import { log } from '$lib/server/log';
import {
	appendUpdates,
	foldUpdates,
	updatesSince,
	type NewUpdate
} from '$lib/server/notes/document';
import { CLOSE } from '$lib/sync/close-codes';
import { eventMessage, savedMessage, type NoteEvent } from '$lib/sync/protocol';
import type { Connection } from './connection';
import {
	answerMessage,
	awarenessMessage,
	checkStateVector,
	checkUpdate,
	updateMessage
} from './messages';
import { Presence } from './presence';
import { PresenceRelay } from './presence-relay';
import { Watcher, type Evaluate } from './watcher';

/** Edits within this many milliseconds are committed together. */
const BATCH = 8;
/** Waits before a failed commit is tried again, in milliseconds; the last one repeats. */
const RETRIES = [100, 300, 1000, 2500, 5000];
/** Committed updates after the snapshot at which the log is folded: while live, and when all leave. */
const FOLD_LIVE = 1000;
const FOLD_LEAVING = 50;

type Mark = { connection: Connection; count: number; after: number };

export type RoomOptions = {
	noteId: string;
	/** Name of this process, told to others with each commit. */
	process: string;
	evaluate: Evaluate;
	/** Bytes that may wait for a commit before edits are turned away. */
	uncommitted: number;
	/** Called once, when the room is gone. */
	gone(): void;
};

export class Room {
	readonly doc = new Y.Doc();
	readonly presence: Presence;
	/** Resolves when the document is loaded. */
	readonly ready: Promise<void>;
	readonly #connections = new Set<Connection>();
	readonly #watcher: Watcher;
	readonly #relay: PresenceRelay;
	/** Number of the newest committed update that is in the document with all before it. */
	#seq = 0;
	#uncommitted: NewUpdate[] = [];
	#uncommittedBytes = 0;
	/** Edits received, and how many of them are committed. */
	#received = 0;
	#committed = 0;
	#marks: Mark[] = [];
	#failures = 0;
	#sinceFolding = 0;
	#commitDue = false;
	#leaving: Promise<void> | null = null;
	/** Commits and fetches run one after the other, from when the document is loaded. */
	#queue: Promise<void>;
	#whenCommitted: (() => void)[] = [];

	constructor(private readonly options: RoomOptions) {
		const relay = new PresenceRelay(options.noteId, options.process, (clients) =>
			this.presence.of(clients)
		);
		this.#relay = relay;
		this.presence = new Presence(
			this.doc,
			(update) => this.#broadcast(awarenessMessage(update)),
			(clients) => relay.tell(clients)
		);
		relay.ask();
		this.#watcher = new Watcher(options.noteId, this.doc, () => this.#seq, options.evaluate);
		this.ready = this.#load();
		this.#queue = this.ready.catch(options.gone);
	}

	get connections(): ReadonlySet<Connection> {
		return this.#connections;
	}

	/** Counts the connection in at once; it is opened when the document is there. */
	async join(connection: Connection): Promise<void> {
		this.#connections.add(connection);
		await this.ready;
		if (this.#connections.has(connection)) connection.open();
	}

	leave(connection: Connection): void {
		if (!this.#connections.delete(connection)) return;
		this.presence.leave(connection);
		this.#marks = this.#marks.filter((mark) => mark.connection !== connection);
		if (this.#connections.size === 0) void this.#leave();
	}

	/** Sends a connection what it lacks. */
	answer(connection: Connection, stateVector: Uint8Array): void {
		checkStateVector(stateVector);
		connection.send(answerMessage(this.doc, stateVector));
	}

	/** Takes an edit of somebody who may edit. @throws when it cannot be read. */
	receive(connection: Connection, update: Uint8Array): void {
		checkUpdate(update);
		if (this.#uncommittedBytes > this.options.uncommitted)
			return connection.close(CLOSE.UNAVAILABLE);
		const { pendingStructs, pendingDs } = this.doc.store;
		Y.applyUpdate(this.doc, update, connection);
		if (this.doc.store.pendingStructs === pendingStructs && this.doc.store.pendingDs === pendingDs)
			return;
		// It builds on something that has not come yet: keep it as it is, and ask for the rest.
		this.#keep(update, connection.userId);
		connection.ask();
	}

	/** Acknowledges the count once everything received so far is committed. */
	mark(connection: Connection, count: number): void {
		this.#marks = this.#marks.filter((mark) => mark.connection !== connection);
		this.#marks.push({ connection, count, after: this.#received });
		this.#acknowledge(new Date());
	}

	/** Another process committed up to `seq`. */
	catchUp(seq: number): void {
		if (seq > this.#seq) this.#enqueue(() => this.#fetch());
	}

	/** Fetches what other processes may have committed unheard. */
	fetch(): void {
		this.#enqueue(() => this.#fetch());
	}

	/** Another process opened the note: tells it who is here. */
	tellWhoIsHere(): void {
		this.#relay.tell(this.presence.clientsHere);
	}

	tell(event: NoteEvent): void {
		this.#broadcast(eventMessage(event));
	}

	/** Commits what is left and closes every connection with `code`. Resolves when the room is gone. */
	async end(code: number): Promise<void> {
		for (const connection of this.#connections) connection.close(code);
		await Promise.all([...this.#connections].map((connection) => connection.closed));
		await this.#leave();
	}

	async #load(): Promise<void> {
		const updates = await updatesSince(this.options.noteId, 0);
		const evaluated = await this.#watcher.evaluatedSeq();
		for (const { seq, update, userId } of updates) {
			// What was committed but not looked at when a process ended is looked at now.
			if (seq > evaluated) this.#watcher.begin();
			Y.applyUpdate(this.doc, update, { userId });
			this.#seq = seq;
		}
		this.#watcher.begin();
		this.#sinceFolding = updates.filter(({ userId }) => userId !== null).length;
		this.doc.on('update', (update: Uint8Array, origin: unknown) => this.#updated(update, origin));
		if (this.#seq > evaluated) this.#watcher.wake();
	}

	#updated(update: Uint8Array, origin: unknown): void {
		const from = this.#connections.has(origin as Connection) ? (origin as Connection) : null;
		this.#broadcast(updateMessage(update), from);
		if (from) this.#keep(update, from.userId);
		else this.#watcher.wakeLater();
	}

	#broadcast(message: Uint8Array, except: Connection | null = null): void {
		for (const connection of this.#connections) if (connection !== except) connection.send(message);
	}

	#keep(update: Uint8Array, userId: string): void {
		this.#received += 1;
		this.#uncommitted.push({ update, userId });
		this.#uncommittedBytes += update.byteLength;
		this.#commitIn(BATCH);
	}

	#commitIn(milliseconds: number): void {
		if (this.#commitDue || this.#failures > 0) return;
		this.#commitDue = true;
		setTimeout(() => {
			this.#commitDue = false;
			this.#enqueue(() => this.#commit());
		}, milliseconds);
	}

	#enqueue(work: () => Promise<void>): Promise<void> {
		this.#queue = this.#queue.then(work).catch((error: unknown) => {
			log.error({ error, noteId: this.options.noteId }, 'a step of a live note failed');
		});
		return this.#queue;
	}

	async #commit(): Promise<void> {
		if (this.#uncommitted.length === 0) return;
		const count = this.#uncommitted.length;
		let numbers: Awaited<ReturnType<typeof appendUpdates>>;
		try {
			const batch = mergeRuns(this.#uncommitted);
			numbers = await appendUpdates(this.options.noteId, batch, this.options.process);
		} catch (error) {
			return this.#failed(error);
		}
		this.#settle(count);
		if (!numbers) return this.#noteGone();
		this.#sinceFolding += numbers.last - numbers.first + 1;
		if (numbers.first === this.#seq + 1) this.#seq = numbers.last;
		else this.fetch();
		this.#acknowledge(numbers.at);
		this.#watcher.wake();
		if (this.#sinceFolding >= FOLD_LIVE) await this.#fold();
	}

	/** The first `count` uncommitted edits are committed. */
	#settle(count: number): void {
		this.#failures = 0;
		this.#committed += count;
		for (const { update } of this.#uncommitted.splice(0, count))
			this.#uncommittedBytes -= update.byteLength;
		if (this.#uncommitted.length > 0) this.#commitIn(0);
		else for (const resolve of this.#whenCommitted.splice(0)) resolve();
	}

	#failed(error: unknown): void {
		const wait = RETRIES[Math.min(this.#failures, RETRIES.length - 1)]!;
		this.#failures += 1;
		log.warn({ error, noteId: this.options.noteId, wait }, 'edits could not be committed yet');
		setTimeout(() => this.#enqueue(() => this.#commit()), wait * (0.75 + Math.random() / 2));
	}

	#noteGone(): void {
		for (const connection of this.#connections) connection.close(CLOSE.NO_SUCH_NOTE);
	}

	#acknowledge(at: Date): void {
		const due = this.#marks.filter((mark) => mark.after <= this.#committed);
		this.#marks = this.#marks.filter((mark) => mark.after > this.#committed);
		for (const { connection, count } of due) connection.send(savedMessage(count, at));
	}

	async #fetch(): Promise<void> {
		for (const { seq, update, userId } of await updatesSince(this.options.noteId, this.#seq)) {
			Y.applyUpdate(this.doc, update, { userId });
			this.#seq = seq;
			this.#sinceFolding += 1;
		}
	}

	async #fold(): Promise<void> {
		await foldUpdates(this.options.noteId);
		this.#sinceFolding = 0;
	}

	#leave(): Promise<void> {
		return (this.#leaving ??= this.#empty());
	}

	async #empty(): Promise<void> {
		await this.#queue;
		while (this.#connections.size === 0) {
			if (this.#uncommitted.length > 0)
				await new Promise<void>((resolve) => this.#whenCommitted.push(resolve));
			await this.#watcher.finish();
			await this.#relay.finish();
			if (this.#sinceFolding >= FOLD_LEAVING) await this.#enqueue(() => this.#fold());
			if (this.#connections.size > 0 || this.#uncommitted.length > 0) continue;
			this.#watcher.destroy();
			this.presence.destroy();
			this.doc.destroy();
			return this.options.gone();
		}
		this.#leaving = null;
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
		update: parts.length === 1 ? parts[0]! : Y.mergeUpdates(parts)
	}));
}
