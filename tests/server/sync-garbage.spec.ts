import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import { updatesSince } from '$lib/server/notes/document';
import { addItem } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { CLOSE } from '$lib/sync/close-codes';
import { MESSAGE } from '$lib/sync/protocol';
import { SYNC } from '$server/sync/messages';
import { makeNote, makeProgramme } from './fixtures';
import {
	eventually,
	frame,
	headersOf,
	join,
	rawSocket,
	startServer,
	type Joined,
	type TestServer
} from './sync-client';

let server: TestServer;
let noteId: string;
let headers: Record<string, string>;
let witness: Joined;

beforeAll(async () => {
	server = await startServer({ frame: 200_000 });
	const people = await makeProgramme();
	noteId = (await makeNote(people.programme.id, people.lead)).id;
	headers = await headersOf(people.engineer);
	witness = await join(server, noteId, people.lead);
});
afterAll(async () => {
	witness.leave();
	await server.stop();
});

/** Others on the note go on: an edit is taken, committed and acknowledged. */
async function roomGoesOn() {
	const before = witness.saved.length;
	addItem(witness.doc, { kind: 'section' }, { after: null });
	witness.mark(before + 1);
	await eventually(() => expect(witness.saved.length).toBe(before + 1));
}

const edit = (() => {
	const doc = new Y.Doc();
	addItem(doc, { kind: 'given', symbol: 'broken off' }, { after: null });
	return Y.encodeStateAsUpdate(doc);
})();

describe('A message that cannot be read closes its sender, and the note goes on:', () => {
	test.each<[string, Uint8Array | string]>([
		['nothing at all', new Uint8Array()],
		['text', 'hello'],
		['an unknown type', frame(77)],
		['an unknown sync message', frame(MESSAGE.SYNC, 9, new Uint8Array())],
		['an edit of noise', frame(MESSAGE.SYNC, SYNC.UPDATE, new Uint8Array(64).fill(0xfe))],
		['an edit that breaks off', frame(MESSAGE.SYNC, SYNC.UPDATE, edit.slice(0, -3))],
		['a length beyond the end', new Uint8Array([MESSAGE.SYNC, SYNC.UPDATE, 0xff, 0x7f, 1])],
		['a count without end', frame(MESSAGE.SYNC, SYNC.UPDATE, new Uint8Array([255, 255, 255, 127]))],
		['a state vector of noise', frame(MESSAGE.SYNC, SYNC.QUESTION, new Uint8Array([9, 1]))],
		['a presence that is no JSON', frame(MESSAGE.AWARENESS, new Uint8Array([1, 7, 1, 1, 123]))],
		['a mark without a count', frame(MESSAGE.MARK)]
	])('%s', async (_, message) => {
		const raw = await rawSocket(server, `/sync/${noteId}`, headers);
		raw.socket.send(message);
		expect(await raw.closed()).toBe(CLOSE.UNREADABLE);
		await roomGoesOn();
		expect(JSON.stringify(projectNote(witness.doc))).not.toContain('broken off');
	});

	test('a frame larger than the server takes', async () => {
		const raw = await rawSocket(server, `/sync/${noteId}`, headers);
		raw.socket.send(new Uint8Array(200_001));
		expect(await raw.closed()).toBe(CLOSE.TOO_LARGE);
		await roomGoesOn();
	});

	test('any bytes', async () => {
		const before = projectNote(witness.doc);
		await fc.assert(
			fc.asyncProperty(
				fc.array(
					fc.oneof(
						fc.uint8Array({ minLength: 1, maxLength: 60 }),
						fc
							.tuple(fc.nat(2), fc.uint8Array({ maxLength: 60 }))
							.map(([kind, bytes]) => frame(MESSAGE.SYNC, kind, bytes)),
						fc
							.tuple(fc.nat(edit.length - 1), fc.nat(255))
							.map(([at, byte]) =>
								frame(MESSAGE.SYNC, SYNC.UPDATE, edit.slice(0, at + 1).with(at, byte))
							)
					),
					{ minLength: 1, maxLength: 10 }
				),
				async (messages) => {
					const raw = await rawSocket(server, `/sync/${noteId}`, headers);
					for (const message of messages) raw.socket.send(message);
					raw.socket.close();
					await raw.closed();
				}
			),
			{ numRuns: 60 }
		);
		await roomGoesOn();
		// What got through is readable, or changed nothing.
		expect(projectNote(witness.doc).items.length).toBeGreaterThan(before.items.length);
		for (const { update } of await updatesSince(noteId, 0)) Y.applyUpdate(new Y.Doc(), update);
	});
});
