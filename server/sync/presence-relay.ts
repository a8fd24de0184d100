/**
 * Tells other processes who is on a note here, and asks who is there. Gathered for a moment, so that a
 * moving caret does not notify at every key; what a process that ended told last times out by itself.
 */
import { db } from '$lib/server/db';
import { notify, type Notice } from '$lib/server/events';
import { log } from '$lib/server/log';

/** How long changes are gathered, in milliseconds. */
const GATHER = 100;

export class PresenceRelay {
	readonly #changed = new Set<number>();
	#timer: NodeJS.Timeout | null = null;
	#sending: Promise<unknown> = Promise.resolve();

	constructor(
		private readonly noteId: string,
		private readonly process: string,
		private readonly stateOf: (clients: number[]) => Uint8Array
	) {}

	tell(clients: number[]): void {
		for (const client of clients) this.#changed.add(client);
		if (clients.length > 0) this.#timer ??= setTimeout(() => this.#send(), GATHER);
	}

	ask(): void {
		this.#notify({ kind: 'who is there', noteId: this.noteId, from: this.process });
	}

	/** Tells what is left to tell. */
	async finish(): Promise<void> {
		if (this.#timer) this.#send();
		await this.#sending;
	}

	#send(): void {
		if (this.#timer) clearTimeout(this.#timer);
		this.#timer = null;
		// One notice a client: PostgreSQL takes no more than 8 000 bytes in one.
		for (const client of this.#changed)
			this.#notify({
				kind: 'presence',
				noteId: this.noteId,
				from: this.process,
				update: Buffer.from(this.stateOf([client])).toString('base64')
			});
		this.#changed.clear();
	}

	#notify(notice: Notice): void {
		this.#sending = this.#sending.then(() =>
			notify(db, notice).catch((error: unknown) => {
				log.debug({ error, noteId: this.noteId }, 'other processes do not hear who is on a note');
			})
		);
	}
}
