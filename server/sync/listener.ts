/**
 * Hears what other processes, and other parts of this one, tell through PostgreSQL. It has a connection
 * of its own; when that breaks it connects again, and says so, because what was told meanwhile is lost.
 */
import pg from 'pg';
import { CHANNEL, noticeSchema, type Notice } from '$lib/server/events';
import { log } from '$lib/server/log';
import { settings } from '$lib/server/settings';

/** Waits before connecting again, in milliseconds; the last one repeats. */
const RETRIES = [100, 500, 2000, 5000];

export class Listener {
	#client: pg.Client | null = null;
	#retry: NodeJS.Timeout | null = null;
	#failures = 0;
	#ended = false;

	constructor(
		private readonly heard: (notice: Notice) => void,
		/** Called when notices may have been missed. */
		private readonly missed: () => void
	) {}

	async start(): Promise<void> {
		const client = new pg.Client({
			connectionString: settings().DATABASE_URL,
			keepAlive: true,
			application_name: 'holdfast listener'
		});
		this.#client = client;
		client.on('error', () => {});
		client.on('end', () => this.#lost(client));
		client.on('notification', ({ payload }) => this.#hear(payload ?? ''));
		await client.connect();
		await client.query(`listen ${CHANNEL}`);
		this.#failures = 0;
	}

	async stop(): Promise<void> {
		this.#ended = true;
		if (this.#retry) clearTimeout(this.#retry);
		await this.#client?.end().catch(() => {});
	}

	#hear(payload: string): void {
		try {
			this.heard(noticeSchema.parse(JSON.parse(payload)));
		} catch (error) {
			log.warn({ error }, 'a notice could not be read');
		}
	}

	#lost(client: pg.Client): void {
		if (this.#ended || client !== this.#client) return;
		this.#client = null;
		const wait = RETRIES[Math.min(this.#failures, RETRIES.length - 1)]!;
		this.#failures += 1;
		this.#retry = setTimeout(() => void this.#again(), wait);
	}

	async #again(): Promise<void> {
		try {
			await this.start();
			this.missed();
		} catch (error) {
			log.warn({ error }, 'the database cannot be listened to yet');
			// A client that could not connect may not say that it ended.
			if (this.#client) this.#lost(this.#client);
		}
	}
}
