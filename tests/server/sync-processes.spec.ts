import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { eq } from 'drizzle-orm';
import { db } from '$lib/server/db';
import { noteUpdate } from '$lib/server/db/schema';
import { announce } from '$lib/server/events';
import { foldUpdates, loadDocument, updatesSince } from '$lib/server/notes/document';
import { addItem, textField } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { makeNote, makeProgramme } from './fixtures';
import {
	eventually,
	headersOf,
	join,
	rawSocket,
	says,
	startServer,
	type Joined,
	type TestServer
} from './sync-client';

/** Two processes are two sync servers here: nothing is shared between them but the database. */
let servers: [TestServer, TestServer];
let people: Awaited<ReturnType<typeof makeProgramme>>;
let noteId: string;
let a: Joined;
let b: Joined;

beforeAll(async () => {
	servers = [await startServer(), await startServer()];
});
afterAll(() => Promise.all(servers.map((server) => server.stop())));

beforeEach(async () => {
	people = await makeProgramme();
	noteId = (await makeNote(people.programme.id, people.lead)).id;
	a = await join(servers[0], noteId, people.engineer);
	b = await join(servers[1], noteId, people.lead);
	return () => [a, b].forEach((client) => client.leave());
});

describe('Two processes', () => {
	test('hold the same note while both are typed into', async () => {
		const id = addItem(a.doc, { kind: 'given' }, { after: null });
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		for (let count = 0; count < 50; count++) {
			textField(a.doc, id, 'source')!.insert(0, 'a');
			textField(b.doc, id, 'source')!.insert(0, 'b');
			if (count % 10 === 0) await new Promise((resolve) => setImmediate(resolve));
		}
		a.mark(1);
		b.mark(1);
		await eventually(() => {
			expect(a.saved).toEqual([1]);
			expect(b.saved).toEqual([1]);
			expect(textField(a.doc, id, 'source')).toHaveLength(100);
			expect(projectNote(a.doc)).toEqual(projectNote(b.doc));
		});
		expect(projectNote((await loadDocument(noteId)).doc)).toEqual(projectNote(a.doc));
		const seqs = (await updatesSince(noteId, 0)).map(({ seq }) => seq);
		expect(seqs).toEqual(seqs.map((_, index) => index + 1));
	});

	test('go on when one of them folds the log away', async () => {
		addItem(a.doc, { kind: 'section', title: 'Before' }, { after: null });
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		await foldUpdates(noteId);
		expect(await db.select().from(noteUpdate).where(eq(noteUpdate.noteId, noteId))).toEqual([]);
		addItem(b.doc, { kind: 'section', title: 'After' }, { after: null });
		await eventually(() => expect(projectNote(a.doc).items).toHaveLength(2));
		expect(projectNote((await loadDocument(noteId)).doc)).toEqual(projectNote(a.doc));
	});

	test('tell the people on both of an event', async () => {
		await announce(db, { kind: 'remarks', noteId });
		await eventually(() => {
			expect(a.events).toContain('remarks');
			expect(b.events).toContain('remarks');
		});
	});

	test('show the people on both to each other, also to somebody who comes later', async () => {
		const place = (of: Joined, by: Joined) =>
			by.provider.awareness.getStates().get(of.doc.clientID)?.itemId as unknown;
		a.provider.awareness.setLocalState({ itemId: 'x' });
		b.provider.awareness.setLocalState({ itemId: 'y' });
		await eventually(() => expect([place(a, b), place(b, a)]).toEqual(['x', 'y']));
		b.leave();
		await eventually(() => expect(place(b, a)).toBeUndefined());
		await eventually(() => expect(servers[1].sync.openNotes).not.toContain(noteId));
		const later = await join(servers[1], noteId, people.observer);
		await eventually(() => expect(place(a, later)).toBe('x'));
		later.leave();
	});

	test('let nobody speak for a client of the other', async () => {
		a.provider.awareness.setLocalState({ itemId: 'mine' });
		await eventually(() =>
			expect(b.provider.awareness.getStates().get(a.doc.clientID)?.itemId).toBe('mine')
		);
		const raw = await rawSocket(servers[1], `/sync/${noteId}`, await headersOf(people.observer));
		raw.socket.send(says(a.doc.clientID, 1000, { itemId: 'theirs' }));
		raw.socket.send(says(a.doc.clientID, 1001, null));
		// When this has been heard, what came before has been dropped.
		raw.socket.send(says(77, 1, { itemId: 'own' }));
		await eventually(() => expect(b.provider.awareness.getStates().get(77)?.itemId).toBe('own'));
		expect(b.provider.awareness.getStates().get(a.doc.clientID)?.itemId).toBe('mine');
		raw.socket.close();
	});
});
