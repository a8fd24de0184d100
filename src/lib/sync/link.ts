/**
 * The note's document between this page, the browser's own store and the server, and the count of edits
 * that the server has not acknowledged. What it learns it tells its listener; `note-session.svelte.ts`
 * says what that means to a person.
 */
import { IndexeddbPersistence, storeState } from 'y-indexeddb';
import { WebsocketProvider } from 'y-websocket';
import type * as Y from 'yjs';
import { CLOSE_WORDS, isFinal } from './close-codes';
import {
	MESSAGE,
	markMessage,
	readEvent,
	readRefused,
	readSaved,
	type NoteEvent
} from './protocol';
import { UnsavedCount } from './unsaved';

export type LinkListener = {
	/** The number of unsaved edits changed. */
	counted(unsaved: number): void;
	/** The server acknowledged edits, committed at that time. */
	saved(at: Date): void;
	refused(reason: string): void;
	/** Level with the server: all it had is here, and all that was here has been sent. */
	level(): void;
	lost(): void;
	closed(reason: string): void;
	event(event: NoteEvent): void;
};

export type LinkOptions = {
	/** Name of the document in this browser: the person and the note. */
	key: string;
	noteId: string;
	/** Address of the site's sockets, e.g. "wss://holdfast.example". */
	server: string;
	/** The socket to use in place of the browser's own. */
	WebSocket?: typeof WebSocket;
	/** Origins of transactions that are no edits made here. */
	foreign: unknown[];
};

/** Longest wait between two tries to connect, in milliseconds. */
const LONGEST_WAIT = 5000;
/** A browser that refuses storage never answers: go on without after this many milliseconds. */
const STORAGE_WAIT = 2000;

export class NoteLink {
	readonly #provider: WebsocketProvider;
	#persistence: IndexeddbPersistence | null = null;
	/** Whether what the browser kept has been read, so that a mark covers it. */
	#restored = false;
	readonly #count: UnsavedCount;
	#markDue = false;
	#ended = false;

	constructor(
		readonly doc: Y.Doc,
		private readonly options: LinkOptions,
		private readonly listener: LinkListener
	) {
		this.#count = new UnsavedCount(options.key, doc.clientID);
		this.#provider = new WebsocketProvider(`${options.server}/sync`, options.noteId, doc, {
			connect: false,
			disableBc: true,
			maxBackoffTime: LONGEST_WAIT,
			shouldReconnect: (event) => !isFinal(event.code),
			...(options.WebSocket && { WebSocketPolyfill: options.WebSocket })
		});
		this.#listen();
		void this.#restore().then(() => {
			if (!this.#ended) this.#provider.connect();
		});
	}

	get awareness() {
		return this.#provider.awareness;
	}

	get unsaved(): number {
		return this.#count.unsaved;
	}

	/** Whether this browser keeps the document, so that nothing is lost when the page goes. */
	get isKept(): boolean {
		return this.#persistence?.synced ?? false;
	}

	/** Whether a transaction with this origin is an edit made here. */
	isOwn(origin: unknown): boolean {
		return (
			origin !== this.#provider &&
			origin !== this.#persistence &&
			!this.options.foreign.includes(origin)
		);
	}

	/** Connects anew at once. */
	reconnect(): void {
		this.#provider.disconnect();
		this.#provider.wsUnsuccessfulReconnects = 0;
		this.#provider.connect();
	}

	/** Ends the link and removes what this browser kept of the note. */
	async discard(): Promise<void> {
		this.#count.clear();
		const persistence = this.#persistence;
		this.#persistence = null;
		this.destroy();
		await persistence?.clearData();
	}

	destroy(): void {
		this.#ended = true;
		this.#provider.destroy();
		void this.#persistence?.destroy();
	}

	async #restore(): Promise<void> {
		if (typeof indexedDB === 'undefined') {
			this.#restored = true;
			return;
		}
		const persistence = new IndexeddbPersistence(this.options.key, this.doc);
		this.#persistence = persistence;
		const read = persistence.whenSynced.then(() => {
			this.#restored = true;
			this.#mark();
			// One state in place of the updates of earlier visits.
			return storeState(persistence);
		});
		await Promise.race([read, new Promise((resolve) => setTimeout(resolve, STORAGE_WAIT))]);
	}

	#listen(): void {
		const provider = this.#provider;
		const { listener } = this;
		provider.messageHandlers[MESSAGE.SAVED] = (_encoder, decoder) => {
			const { count, at } = readSaved(decoder);
			this.#count.acknowledge(count);
			listener.counted(this.unsaved);
			listener.saved(at);
		};
		provider.messageHandlers[MESSAGE.REFUSED] = (_encoder, decoder) =>
			listener.refused(readRefused(decoder));
		provider.messageHandlers[MESSAGE.EVENT] = (_encoder, decoder) =>
			listener.event(readEvent(decoder));

		provider.on('sync', (level) => {
			if (!level) return;
			listener.level();
			this.#mark();
		});
		provider.on('status', ({ status }) => {
			// Others forgot this client when its last socket closed: a new clock makes them look again.
			if (status === 'connected') this.awareness.setLocalState(this.awareness.getLocalState());
		});
		provider.on('connection-close', () => listener.lost());
		provider.on('closed', ({ code }) =>
			listener.closed(CLOSE_WORDS[code] ?? 'The server closed this note. Reload the page.')
		);
		this.doc.on('update', (_update: Uint8Array, origin: unknown) => {
			if (this.isOwn(origin)) this.#edited();
		});
	}

	#edited(): void {
		this.#count.add();
		this.listener.counted(this.unsaved);
		if (this.#markDue) return;
		this.#markDue = true;
		// After the provider has sent the edit itself.
		queueMicrotask(() => {
			this.#markDue = false;
			this.#mark();
		});
	}

	/** Asks to be told when all edits so far are committed; later, if not all have been sent yet. */
	#mark(): void {
		const { ws, synced } = this.#provider;
		if (!ws || !synced || !this.#restored || this.unsaved === 0) return;
		ws.send(markMessage(this.#count.made));
	}
}
