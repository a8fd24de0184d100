/**
 * Who is on a note and where. A client may speak only for itself, under the client id that it used
 * first, and who it is is written by the server. Attack stopped here: somebody typing under another
 * person's name, or taking others off the note.
 */
import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import {
	Awareness,
	applyAwarenessUpdate,
	encodeAwarenessUpdate,
	removeAwarenessStates
} from 'y-protocols/awareness';
import type * as Y from 'yjs';
import type { SignedIn } from '$lib/server/auth/sessions';
import { ownStateSchema, type SharedState } from '$lib/sync/presence';

/** Longest state that one client may share, in characters of JSON. */
const LONGEST_STATE = 4000;

/** Origin of what another process told. */
const ELSEWHERE = Symbol('another process');

export type Participant = { readonly person: SignedIn; clientId: number | null };

export class Presence {
	readonly #awareness: Awareness;
	readonly #participants = new Map<number, Participant>();

	constructor(
		doc: Y.Doc,
		/** Sends to everybody on the note in this process. */
		broadcast: (update: Uint8Array) => void,
		/** Tells other processes of clients of this one. */
		changedHere: (clients: number[]) => void
	) {
		this.#awareness = new Awareness(doc);
		this.#awareness.setLocalState(null);
		this.#awareness.on(
			'update',
			(
				{ added, updated, removed }: Record<'added' | 'updated' | 'removed', number[]>,
				origin: unknown
			) => {
				const clients = [...added, ...updated, ...removed];
				broadcast(this.of(clients));
				if (origin !== ELSEWHERE) changedHere(clients);
			}
		);
	}

	/** What these clients say of themselves, or that they are gone. */
	of(clients: number[]): Uint8Array {
		return encodeAwarenessUpdate(this.#awareness, clients);
	}

	/** The clients that are here through this process. */
	get clientsHere(): number[] {
		return [...this.#participants.keys()].filter((client) =>
			this.#awareness.getStates().has(client)
		);
	}

	/** Takes what another process tells of its clients; it has stamped them. */
	hearElsewhere(update: Uint8Array): void {
		applyAwarenessUpdate(this.#awareness, update, ELSEWHERE);
	}

	/** Everybody's states, for a newcomer; null when nobody is there. */
	all(): Uint8Array | null {
		const clients = [...this.#awareness.getStates().keys()];
		return clients.length > 0 ? this.of(clients) : null;
	}

	/** Takes what a client says of itself. What it says of others (stock clients repeat it) is dropped. */
	hear(participant: Participant, update: Uint8Array): void {
		const decoder = decoding.createDecoder(update);
		const count = decoding.readVarUint(decoder);
		for (let entry = 0; entry < count; entry++) {
			const clientId = decoding.readVarUint(decoder);
			const clock = decoding.readVarUint(decoder);
			const json = decoding.readVarString(decoder);
			if (json.length > LONGEST_STATE || !this.#speaksAs(participant, clientId)) continue;
			const state: unknown = JSON.parse(json);
			this.#apply(clientId, clock, state === null ? null : stamped(state, participant.person));
		}
	}

	leave(participant: Participant): void {
		const { clientId } = participant;
		if (clientId === null || this.#participants.get(clientId) !== participant) return;
		this.#participants.delete(clientId);
		removeAwarenessStates(this.#awareness, [clientId], null);
	}

	destroy(): void {
		this.#awareness.destroy();
	}

	#speaksAs(participant: Participant, clientId: number): boolean {
		if (clientId === this.#awareness.clientID) return false;
		if (participant.clientId !== null) return participant.clientId === clientId;
		const holder = this.#awareness.getStates().get(clientId) as SharedState | undefined;
		// The same person coming back before the old socket was seen to be gone takes it over.
		if (holder && holder.user.id !== participant.person.id) return false;
		this.#participants.set(clientId, participant);
		participant.clientId = clientId;
		return true;
	}

	#apply(clientId: number, clock: number, state: SharedState | null): void {
		const encoder = encoding.createEncoder();
		encoding.writeVarUint(encoder, 1);
		encoding.writeVarUint(encoder, clientId);
		encoding.writeVarUint(encoder, clock);
		encoding.writeVarString(encoder, JSON.stringify(state));
		applyAwarenessUpdate(this.#awareness, encoding.toUint8Array(encoder), null);
	}
}

function stamped(state: unknown, { id, name }: SignedIn): SharedState {
	const own = ownStateSchema.safeParse(state);
	const said = own.success ? own.data : ownStateSchema.parse({});
	return { ...said, user: { id, name } };
}
