/**
 * One socket of one person on one note.
 *
 * States:
 * - waiting: the note is being loaded. Nothing is read from the socket, so nothing piles up here.
 * - open: messages are read one by one, in order. A flood is slowed by not reading for a while.
 * - closed: by either side. The room is told once; nothing is sent or read any more.
 *
 * waiting → open when the room is ready; any → closed by the peer, by a message that cannot be read, by
 * a frame too large, by an unanswered ping, by a queue of outgoing bytes too long, or by the server.
 */
import * as decoding from 'lib0/decoding';
import type { RawData, WebSocket } from 'ws';
import { may } from '$lib/server/auth/permissions';
import { CLOSE } from '$lib/sync/close-codes';
import {
	MESSAGE,
	eventMessage,
	readMark,
	refusedMessage,
	type NoteEvent
} from '$lib/sync/protocol';
import type { Admitted } from './admission';
import { Allowance, type Limits } from './limits';
import type { Participant } from './presence';
import { SYNC, awarenessMessage, questionMessage } from './messages';
import type { Room } from './room';

/** How long a peer may take to agree to a close, in milliseconds. */
const CLOSING = 2000;

export class Connection implements Participant {
	clientId: number | null = null;
	readonly closed: Promise<void>;
	#isOpen = true;
	#isAlive = true;
	readonly #allowance: Allowance;
	readonly #pings: NodeJS.Timeout;
	#resting: NodeJS.Timeout | undefined;

	constructor(
		readonly socket: WebSocket,
		public admitted: Admitted,
		private readonly room: Room,
		private readonly limits: Limits
	) {
		this.#allowance = new Allowance(limits.rate, limits.burst);
		socket.pause();
		socket.on('message', (data, isBinary) => this.#receive(data, isBinary));
		socket.on('pong', () => (this.#isAlive = true));
		// The close that follows says all there is to say.
		socket.on('error', () => {});
		this.closed = new Promise((resolve) =>
			socket.once('close', () => {
				this.#isOpen = false;
				clearInterval(this.#pings);
				clearTimeout(this.#resting);
				room.leave(this);
				resolve();
			})
		);
		this.#pings = setInterval(() => this.#ping(), limits.ping);
	}

	get person() {
		return this.admitted.person;
	}

	/** As the origin of a transaction: whose edit it is. */
	get userId(): string {
		return this.admitted.person.id;
	}

	get mayEdit(): boolean {
		return may(this.admitted.role, 'note.edit');
	}

	/** Begins to read. */
	open(): void {
		const others = this.room.presence.all();
		if (others) this.send(awarenessMessage(others));
		this.socket.resume();
	}

	send(message: Uint8Array): void {
		if (!this.#isOpen || this.socket.readyState !== this.socket.OPEN) return;
		if (this.socket.bufferedAmount > this.limits.outgoing) this.socket.terminate();
		else this.socket.send(message);
	}

	close(code: number): void {
		closeSocket(this.socket, code);
	}

	/** Asks the client for what the server lacks. */
	ask(): void {
		this.send(questionMessage(this.room.doc));
	}

	refuse(): void {
		this.send(refusedMessage(REFUSAL(this.admitted.role)));
	}

	tell(event: NoteEvent): void {
		this.send(eventMessage(event));
	}

	#ping(): void {
		if (!this.#isAlive) return this.socket.terminate();
		this.#isAlive = false;
		this.socket.ping();
	}

	#receive(data: RawData, isBinary: boolean): void {
		if (this.socket.readyState !== this.socket.OPEN) return;
		if (!isBinary || !(data instanceof Buffer)) return this.close(CLOSE.UNREADABLE);
		try {
			// A copy of its own: the decoder trusts lengths in the message, and must not be led past its end
			// into what else the library's buffer holds.
			this.#read(decoding.createDecoder(new Uint8Array(data)));
		} catch {
			// Attack stopped here: a frame made to fail inside the decoder. Only its sender is closed.
			return this.close(CLOSE.UNREADABLE);
		}
		const wait = this.#allowance.spend(1 + data.byteLength / 4096);
		if (wait > 0) this.#rest(wait);
	}

	/** Does not read for a while. What the library holds already still comes, and lengthens it. */
	#rest(milliseconds: number): void {
		clearTimeout(this.#resting);
		this.socket.pause();
		this.#resting = setTimeout(() => this.socket.resume(), milliseconds);
	}

	#read(decoder: decoding.Decoder): void {
		switch (decoding.readVarUint(decoder)) {
			case MESSAGE.SYNC:
				return this.#readSync(decoder);
			case MESSAGE.AWARENESS: {
				const update = decoding.readVarUint8Array(decoder);
				if (may(this.admitted.role, 'presence.share')) this.room.presence.hear(this, update);
				return;
			}
			case MESSAGE.QUERY_AWARENESS: {
				const all = this.room.presence.all();
				if (all) this.send(awarenessMessage(all));
				return;
			}
			case MESSAGE.MARK: {
				const count = readMark(decoder);
				if (this.mayEdit) this.room.mark(this, count);
				else this.refuse();
				return;
			}
			default:
				throw new Error('No such type of message');
		}
	}

	#readSync(decoder: decoding.Decoder): void {
		const type = decoding.readVarUint(decoder);
		const content = decoding.readVarUint8Array(decoder);
		switch (type) {
			case SYNC.QUESTION:
				// Asked before it is answered, so that a client that is level has sent what it had. Who may
				// not edit is not asked: an answer carries old deletions and would be refused for nothing.
				if (this.mayEdit) this.ask();
				return this.room.answer(this, content);
			case SYNC.ANSWER:
			case SYNC.UPDATE:
				if (this.mayEdit) this.room.receive(this, content);
				else this.refuse();
				return;
			default:
				throw new Error('No such type of sync message');
		}
	}
}

const REFUSAL = (role: string) =>
	`You are ${role} here and cannot change the note: this edit was not taken. A lead of the programme can change your role.`;

/** Closes, and cuts off a peer that does not agree to it. */
export function closeSocket(socket: WebSocket, code: number): void {
	socket.close(code);
	socket.resume();
	const cut = setTimeout(() => socket.terminate(), CLOSING);
	socket.once('close', () => clearTimeout(cut));
}
