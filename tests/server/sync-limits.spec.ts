import { sql } from 'drizzle-orm';
import { afterAll, afterEach, describe, expect, test } from 'vitest';
import { db } from '$lib/server/db';
import { addItem, textField } from '$lib/note/document';
import { CLOSE } from '$lib/sync/close-codes';
import { MESSAGE } from '$lib/sync/protocol';
import type { Limits } from '$server/sync/limits';
import { makeNote, makeProgramme } from './fixtures';
import {
	eventually,
	frame,
	headersOf,
	join,
	rawSocket,
	startServer,
	type TestServer
} from './sync-client';

let server: TestServer | undefined;
afterEach(async () => {
	await server?.stop();
	server = undefined;
});
afterAll(() => server?.stop());

async function opened(limits: Partial<Limits>) {
	server = await startServer(limits);
	const people = await makeProgramme();
	const { id } = await makeNote(people.programme.id, people.lead);
	return { ...people, server, noteId: id };
}

describe('One person', () => {
	test('may have so many sockets and no more, and again when one is closed', async () => {
		const { server, noteId, engineer, lead } = await opened({ socketsPerPerson: 3 });
		const headers = await headersOf(engineer);
		const sockets = await Promise.all(
			[1, 2, 3].map(() => rawSocket(server, `/sync/${noteId}`, headers))
		);
		const fourth = await rawSocket(server, `/sync/${noteId}`, headers);
		expect(await fourth.closed()).toBe(CLOSE.TOO_MANY);
		const other = await rawSocket(server, `/sync/${noteId}`, await headersOf(lead));
		other.socket.send(frame(MESSAGE.SYNC, 0, new Uint8Array([0])));
		await eventually(() => expect(other.of(MESSAGE.SYNC).length).toBeGreaterThan(0));
		sockets[0]!.socket.close();
		await sockets[0]!.closed();
		await eventually(async () => {
			const again = await rawSocket(server, `/sync/${noteId}`, headers);
			again.socket.send(frame(MESSAGE.SYNC, 0, new Uint8Array([0])));
			await eventually(() => expect(again.of(MESSAGE.SYNC).length).toBeGreaterThan(0), 500);
		});
	});
});

describe('One address', () => {
	test('may have so many requests decided at once, before anybody is signed in', async () => {
		const { server, noteId } = await opened({ undecidedPerAddress: 5 });
		const headers = { origin: process.env.ORIGIN!, cookie: 'holdfast_session=abc' };
		const ask = () => rawSocket(server, `/sync/${noteId}`, headers);
		const tries: ReturnType<typeof ask>[] = [];
		await db.transaction(async (tx) => {
			// Nothing can be decided while the sessions cannot be read.
			await tx.execute(sql`lock table session in access exclusive mode`);
			for (let count = 0; count < 5; count++) tries.push(ask());
			await eventually(async () => expect((await ask()).status()).toBe(429));
		});
		for (const decided of await Promise.all(tries))
			expect([CLOSE.SIGNED_OUT, undefined]).toContain(await decided.code());
		const later = await ask();
		expect(await later.closed()).toBe(CLOSE.SIGNED_OUT);
	});
});

describe('A flood of messages', () => {
	test('is slowed down, loses nothing, and does not hold others up', async () => {
		const { server, noteId, engineer, lead } = await opened({ rate: 800, burst: 100 });
		const [flood, other] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
		const id = addItem(flood.doc, { kind: 'section' }, { after: null });
		const started = Date.now();
		for (let count = 0; count < 2600; count++) textField(flood.doc, id, 'title')!.insert(0, 'x');
		addItem(other.doc, { kind: 'given', symbol: 'prompt' }, { after: null });
		other.mark(1);
		await eventually(() => expect(other.saved).toEqual([1]));
		expect(textField(other.doc, id, 'title')!.length, 'of the flood by then').toBeLessThan(2600);
		await eventually(() => expect(textField(other.doc, id, 'title')).toHaveLength(2600));
		expect(Date.now() - started).toBeGreaterThan(1500);
		expect(flood.closed).toEqual([]);
		for (const client of [flood, other]) client.leave();
	});
});

describe('A client', () => {
	test('that does not answer a ping is gone, and its note is left', async () => {
		const { server, noteId, engineer } = await opened({ ping: 50 });
		const raw = await rawSocket(server, `/sync/${noteId}`, await headersOf(engineer));
		raw.socket.pause();
		await eventually(() => expect(server.sync.openNotes).toEqual([]));
		raw.socket.terminate();
	});

	test('that does not read is cut off before what waits for it fills the memory', async () => {
		const { server, noteId, engineer, lead } = await opened({
			outgoing: 100_000,
			socketsPerPerson: 1
		});
		const headers = await headersOf(lead);
		const slow = await rawSocket(server, `/sync/${noteId}`, headers);
		slow.socket.pause();
		const writer = await join(server, noteId, engineer);
		await eventually(async () => {
			addItem(writer.doc, { kind: 'section', title: 'x'.repeat(1_000_000) }, { after: null });
			// Taken only when the slow one is gone.
			const next = await rawSocket(server, `/sync/${noteId}`, headers);
			next.socket.send(frame(MESSAGE.SYNC, 0, new Uint8Array([0])));
			await eventually(() => expect(next.of(MESSAGE.SYNC).length).toBeGreaterThan(0), 100);
		});
		writer.leave();
		slow.socket.terminate();
	});
});
