/**
 * The site, as it is built for production, is killed without warning, again and again, while several
 * people edit. Each client notes what it was told is saved; after every kill all of that must be in the
 * database, and in the note that the next server hands out.
 */
import { afterEach, expect, inject, test } from 'vitest';
import type * as Y from 'yjs';
import type { SignedIn } from '$lib/server/auth/sessions';
import { loadDocument } from '$lib/server/notes/document';
import { addItem, textField } from '$lib/note/document';
import { makeNote, makeProgramme } from '../server/fixtures';
import { eventually, join, type Joined } from '../server/sync-client';
import { serve, type Served } from '../setup/serve';

const KILLS = 5;
const SAVED_BETWEEN_KILLS = 100;

let running: Served | undefined;
afterEach(() => running?.kill());

async function startSite(port?: number): Promise<Served> {
	return (running = await serve(
		{
			DATABASE_URL: process.env.DATABASE_URL!,
			SMTP_URL: process.env.SMTP_URL!,
			...inject('store'),
			LOG_LEVEL: 'error'
		},
		port
	));
}

/** One person who types number after number into a field and notes which were said to be saved. */
class Writer {
	#typed = 0;
	readonly #itemId: string;
	readonly #timer: NodeJS.Timeout;

	constructor(readonly client: Joined) {
		this.#itemId = addItem(client.doc, { kind: 'section' }, { after: null });
		this.#timer = setInterval(() => this.#type(), 4);
	}

	/** How many of the numbers were said to be saved. */
	get saved(): number {
		return Math.max(0, ...this.client.saved);
	}

	get unsaved(): number {
		return this.#typed - this.saved;
	}

	/** Numbers that were said to be saved and are not in the document. */
	missingFrom(doc: Y.Doc): number[] {
		const held = new Set(textField(doc, this.#itemId, 'title')?.toString().split(' ').map(Number));
		return Array.from({ length: this.saved }, (_, index) => index + 1).filter((n) => !held.has(n));
	}

	finish(): void {
		clearInterval(this.#timer);
		this.client.mark(this.#typed);
	}

	leave(): void {
		clearInterval(this.#timer);
		this.client.leave();
	}

	#type(): void {
		const { doc, provider, mark } = this.client;
		const text = textField(doc, this.#itemId, 'title')!;
		text.insert(text.length, `${++this.#typed} `);
		if (provider.synced) mark(this.#typed);
	}
}

const missing = (doc: Y.Doc, writers: Writer[]) =>
	writers.flatMap((writer) => writer.missingFrom(doc));

test('everything that was said to be saved is there after a kill', async () => {
	const { programme, lead, engineer } = await makeProgramme();
	const { id: noteId } = await makeNote(programme.id, lead);
	const site = await startSite();
	const { host, port } = new URL(site.origin);
	const server = { url: `ws://${host}`, origin: site.origin };
	const joined = (person: SignedIn) => join(server, noteId, person);
	const writers: Writer[] = [];
	for (const person of [lead, engineer, engineer]) writers.push(new Writer(await joined(person)));
	const saved = () => writers.reduce((sum, writer) => sum + writer.saved, 0);
	let killedWhileUnsaved = 0;

	for (let kill = 0; kill < KILLS; kill++) {
		const before = saved();
		await eventually(() => expect(saved()).toBeGreaterThan(before + SAVED_BETWEEN_KILLS), 30_000);
		await running!.kill();
		if (writers.some(({ unsaved }) => unsaved > 0)) killedWhileUnsaved += 1;
		expect(missing((await loadDocument(noteId)).doc, writers), `kill ${kill + 1}`).toEqual([]);
		await startSite(Number(port));
		const fresh = await joined(lead);
		expect(missing(fresh.doc, writers)).toEqual([]);
		fresh.leave();
	}
	expect(killedWhileUnsaved, 'kills in the middle of something').toBeGreaterThan(0);

	await eventually(() => {
		for (const { client } of writers) expect(client.provider.synced).toBe(true);
	});
	for (const writer of writers) writer.finish();
	await eventually(() => expect(writers.map(({ unsaved }) => unsaved)).toEqual([0, 0, 0]));
	expect(missing((await loadDocument(noteId)).doc, writers)).toEqual([]);
	for (const writer of writers) writer.leave();
});
