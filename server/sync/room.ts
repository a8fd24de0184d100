/**
 * One open note in this process: its document, and the connections on it.
 *
 * States:
 * - loading: the document is read from the database. Connections wait; none of their messages is read.
 * - live: an edit is applied and sent to the others at once, and committed a few milliseconds later (see
 *   `commits.ts`). What other processes committed is fetched and sent on.
 * - leaving: nobody is here. What is left is committed, the watcher finishes, the log is folded.
 * - gone: taken out of the registry. Whoever comes next loads the note anew.
 *
 * loading → live, or gone when it cannot be loaded; live → leaving when the last connection ends;
 * leaving → live when one comes meanwhile, else → gone, which is decided in one step with nobody here
 * and nothing uncommitted.
 */
import * as Y from 'yjs';
import { log } from '$lib/server/log';
import { foldUpdates, updatesSince } from '$lib/server/notes/document';
import { CLOSE } from '$lib/sync/close-codes';
import { eventMessage, type NoteEvent } from '$lib/sync/protocol';
import { Commits, type Numbers } from './commits';
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

/** Committed updates after the snapshot at which the log is folded: while live, and when all leave. */
const FOLD_LIVE = 1000;
const FOLD_LEAVING = 50;

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
	readonly #commits: Commits;
	readonly #watcher: Watcher;
	readonly #relay: PresenceRelay;
	/** Number of the newest committed update that is in the document with all before it. */
	#seq = 0;
	#sinceFolding = 0;
	#leaving: Promise<void> | null = null;
	/** Commits and fetches run one after the other, from when the document is loaded. */
	#queue: Promise<void>;

	constructor(private readonly options: RoomOptions) {
		const { noteId, process } = options;
		this.presence = new Presence(
			this.doc,
			(update) => this.#broadcast(awarenessMessage(update)),
			(clients) => this.#relay.tell(clients)
		);
		this.#relay = new PresenceRelay(noteId, process, (clients) => this.presence.of(clients));
		this.#relay.ask();
		this.#commits = new Commits({
			noteId,
			process,
			enqueue: (work) => this.#enqueue(work),
			committed: (numbers) => this.#committed(numbers),
			lost: () => this.#closeAll(CLOSE.NO_SUCH_NOTE)
		});
		this.#watcher = new Watcher(noteId, this.doc, () => this.#seq, options.evaluate);
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
		this.#commits.forget(connection);
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
		if (this.#commits.bytes > this.options.uncommitted) return connection.close(CLOSE.UNAVAILABLE);
		const { pendingStructs, pendingDs } = this.doc.store;
		Y.applyUpdate(this.doc, update, connection);
		if (this.doc.store.pendingStructs === pendingStructs && this.doc.store.pendingDs === pendingDs)
			return;
		// It builds on something that has not come yet: keep it as it is, and ask for the rest.
		this.#commits.add(update, connection.userId);
		connection.ask();
	}

	/** Acknowledges the count once everything received so far is committed. */
	mark(connection: Connection, count: number): void {
		this.#commits.mark(connection, count);
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
		this.#closeAll(code);
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
		if (from) this.#commits.add(update, from.userId);
		else this.#watcher.wakeLater();
	}

	#broadcast(message: Uint8Array, except: Connection | null = null): void {
		for (const connection of this.#connections) if (connection !== except) connection.send(message);
	}

	#closeAll(code: number): void {
		for (const connection of this.#connections) connection.close(code);
	}

	#enqueue(work: () => Promise<void>): Promise<void> {
		this.#queue = this.#queue.then(work).catch((error: unknown) => {
			log.error({ error, noteId: this.options.noteId }, 'a step of a live note failed');
		});
		return this.#queue;
	}

	#committed({ first, last }: Numbers): void {
		this.#sinceFolding += last - first + 1;
		if (first === this.#seq + 1) this.#seq = last;
		else this.fetch();
		this.#watcher.wake();
		if (this.#sinceFolding >= FOLD_LIVE) this.#enqueue(() => this.#fold());
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
			await this.#commits.idle();
			await this.#watcher.finish();
			await this.#relay.finish();
			if (this.#sinceFolding >= FOLD_LEAVING) await this.#enqueue(() => this.#fold());
			if (this.#connections.size > 0 || !this.#commits.isIdle) continue;
			this.#watcher.destroy();
			this.presence.destroy();
			this.doc.destroy();
			return this.options.gone();
		}
		this.#leaving = null;
	}
}
