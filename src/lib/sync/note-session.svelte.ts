/**
 * One person's live work on one note, as the page sees it.
 *
 * States (`status`):
 * - joining: opened, not yet brought level with the server. The page's own copy can be read meanwhile.
 * - saved: level with the server; every edit made here is committed.
 * - saving: connected; `unsaved` edits have not been acknowledged.
 * - offline: no connection. Edits go on, are kept in the browser and merge on return.
 * - refused: the server does not take this person's edits (`refusal` says why). They stay here until
 *   they are taken out as text (`unsavedText`) or discarded.
 * - closed: the server closed for good (signed out, no longer in the programme); `refusal` says why.
 *
 * joining → saved or saving on the first exchange; saved ⇄ saving with each edit and acknowledgement;
 * any of them → offline when the connection goes, and back by the same exchange; refused and closed on
 * the server's word, refused back to saved when it takes the edits after all.
 *
 * "Saved" is only ever the server's word: an edit counts as unsaved from the moment it is made until
 * the server acknowledges a mark that was sent after it.
 */
import { fromBase64 } from 'lib0/buffer';
import { SvelteDate, SvelteSet } from 'svelte/reactivity';
import * as Y from 'yjs';
import { numberItems } from '../note/numbering';
import { projectNote } from '../note/projection';
import { readableItem } from '../note/readable';
import { createUndo } from '../note/undo';
import { watchNote } from '../note/watch';
import { NoteLink } from './link';
import { sharedStateSchema, type Activity, type PersonHere } from './presence';
import type { NoteEvent } from './protocol';

export type NoteStatus = 'joining' | 'saved' | 'saving' | 'offline' | 'refused' | 'closed';

export type NoteSessionOptions = {
	noteId: string;
	userId: string;
	/** Base64 of the document's state as the page was given it. */
	state?: string;
	/** When the note was last saved, as the page was given it. */
	savedAt?: Date;
	/** Address of the site's sockets, e.g. "wss://holdfast.example". */
	server: string;
	/** The socket to use in place of the browser's own. */
	WebSocket?: typeof WebSocket;
};

/** How long "types" and "remarks" stand after the last key, in milliseconds. */
const ACTIVE_FOR = 4000;

const INITIAL = Symbol('state given with the page');

export class NoteSession {
	readonly doc = new Y.Doc();
	/** Origin of one's own edits: every edit made through the page is a transaction with it. */
	readonly origin = Symbol('own edit');
	readonly undoManager = createUndo(this.doc, this.origin);

	unsaved = $state(0);
	savedAt = $state.raw<Date | null>(null);
	offlineSince = $state.raw<Date | null>(null);
	refusal = $state<string | null>(null);
	people = $state.raw<PersonHere[]>([]);
	canUndo = $state(false);
	canRedo = $state(false);

	#connection = $state<'none' | 'level' | 'lost' | 'closed'>('none');
	readonly status = $derived.by((): NoteStatus => {
		if (this.#connection === 'closed') return 'closed';
		if (this.refusal !== null) return 'refused';
		if (this.#connection === 'none') return 'joining';
		if (this.#connection === 'lost') return 'offline';
		return this.unsaved > 0 ? 'saving' : 'saved';
	});

	readonly #link: NoteLink;
	readonly #userId: string;
	/** Items with unsaved edits. */
	readonly #touched = new SvelteSet<string>();
	/** Edits from before this page was opened: which items they touched is not known. */
	#olderEdits: boolean;
	readonly #listeners = new SvelteSet<(event: NoteEvent) => void>();
	readonly #endings: (() => void)[] = [];
	#activeTimer: ReturnType<typeof setTimeout> | undefined;

	constructor({ noteId, userId, state, savedAt, server, WebSocket }: NoteSessionOptions) {
		this.#userId = userId;
		this.savedAt = savedAt ?? null;
		if (state) Y.applyUpdate(this.doc, fromBase64(state), INITIAL);
		this.#link = new NoteLink(
			this.doc,
			{ key: `holdfast-${userId}-${noteId}`, noteId, server, WebSocket, foreign: [INITIAL] },
			this.#listener()
		);
		this.unsaved = this.#link.unsaved;
		this.#olderEdits = this.unsaved > 0;
		this.#watch();
		this.#listenToBrowser();
	}

	/** Where everybody is, for the prose editor's carets. */
	get awareness() {
		return this.#link.awareness;
	}

	/** Says where this person is and what they do there. */
	here(itemId: string | null, activity: Activity = 'reads'): void {
		clearTimeout(this.#activeTimer);
		this.#setHere(itemId, activity);
		if (activity !== 'reads')
			this.#activeTimer = setTimeout(() => this.#setHere(itemId, 'reads'), ACTIVE_FOR);
	}

	#setHere(itemId: string | null, activity: Activity): void {
		const state = this.awareness.getLocalState();
		if (state?.itemId === itemId && state?.activity === activity) return;
		this.awareness.setLocalState({ ...state, itemId, activity });
	}

	/** Calls `listener` when something changed beside the document; returns what ends it. */
	on(_: 'event', listener: (event: NoteEvent) => void): () => void {
		this.#listeners.add(listener);
		return () => this.#listeners.delete(listener);
	}

	undo(): void {
		this.undoManager.undo();
	}

	redo(): void {
		this.undoManager.redo();
	}

	/** The items that hold unsaved edits, as text to keep elsewhere. */
	unsavedText(): string {
		const { items } = projectNote(this.doc);
		const numbers = numberItems(items);
		return items
			.filter((item) => this.#olderEdits || this.#touched.has(item.id))
			.map((item) => readableItem(item, numbers.get(item.id) ?? ''))
			.join('\n\n');
	}

	/** Gives up the edits kept in this browser. The page is to be loaded anew after it. */
	async discard(): Promise<void> {
		await this.#link.discard();
		this.destroy();
	}

	destroy(): void {
		clearTimeout(this.#activeTimer);
		for (const end of this.#endings.splice(0)) end();
		this.#link.destroy();
		this.undoManager.destroy();
		this.doc.destroy();
	}

	#listener() {
		return {
			counted: (unsaved: number) => {
				this.unsaved = unsaved;
				if (unsaved > 0) return;
				this.#touched.clear();
				this.#olderEdits = false;
			},
			saved: (at: Date) => {
				this.savedAt = at;
				this.refusal = null;
			},
			refused: (reason: string) => {
				this.refusal = reason;
			},
			level: () => {
				this.#connection = 'level';
				this.offlineSince = null;
			},
			lost: () => {
				if (this.#connection === 'closed' || this.#connection === 'lost') return;
				this.#connection = 'lost';
				this.offlineSince = new SvelteDate();
			},
			closed: (reason: string) => {
				this.#connection = 'closed';
				this.refusal = reason;
			},
			event: (event: NoteEvent) => {
				for (const listener of this.#listeners) listener(event);
			}
		};
	}

	#watch(): void {
		this.#endings.push(
			watchNote(this.doc, ({ upsert }, origin) => {
				if (this.#link.isOwn(origin)) for (const { id } of upsert) this.#touched.add(id);
			})
		);
		// In a moment: an editor that goes away tells its caret while the page is being changed.
		this.awareness.on('change', () => queueMicrotask(() => (this.people = this.#readPeople())));
		for (const change of ['stack-item-added', 'stack-item-popped', 'stack-cleared'] as const)
			this.undoManager.on(change, () => {
				this.canUndo = this.undoManager.canUndo();
				this.canRedo = this.undoManager.canRedo();
			});
	}

	#listenToBrowser(): void {
		if (typeof window === 'undefined') return;
		const listen = (type: string, listener: (event: Event) => void) => {
			window.addEventListener(type, listener);
			this.#endings.push(() => window.removeEventListener(type, listener));
		};
		const reconnect = () => {
			if (this.#connection !== 'closed') this.#link.reconnect();
		};
		listen('online', reconnect);
		// A socket over a network that is gone stays silent for long; a new one tells at once.
		listen('offline', reconnect);
		listen('beforeunload', (event) => {
			if (this.unsaved > 0 && !this.#link.isKept) event.preventDefault();
		});
	}

	#readPeople(): PersonHere[] {
		return [...this.awareness.getStates()].flatMap(([clientId, state]) => {
			const parsed = sharedStateSchema.safeParse(state);
			if (!parsed.success || parsed.data.user.id === this.#userId) return [];
			const { user, itemId, activity } = parsed.data;
			return [{ clientId, userId: user.id, name: user.name, itemId, activity }];
		});
	}
}
