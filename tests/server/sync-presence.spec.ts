import { afterAll, beforeAll, describe, expect, test } from 'vitest';
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

let server: TestServer;
beforeAll(async () => {
	server = await startServer();
});
afterAll(() => server.stop());

async function opened() {
	const people = await makeProgramme();
	const { id } = await makeNote(people.programme.id, people.lead);
	return { ...people, noteId: id };
}

/** What one client sees of another. */
const seen = (by: Joined, of: Joined) =>
	by.provider.awareness.getStates().get(of.doc.clientID) as Record<string, unknown> | undefined;

describe('Presence', () => {
	test('tells others who is on the note, where, and doing what, an observer among them', async () => {
		const { noteId, engineer, observer } = await opened();
		const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, observer)];
		a.provider.awareness.setLocalState({ itemId: 'x', activity: 'types' });
		await eventually(() =>
			expect(seen(b, a)).toEqual({
				itemId: 'x',
				activity: 'types',
				cursor: null,
				user: { id: engineer.id, name: engineer.name }
			})
		);
		b.provider.awareness.setLocalState({});
		await eventually(() =>
			expect(seen(a, b)).toMatchObject({ user: { name: observer.name }, activity: 'reads' })
		);
		for (const client of [a, b]) client.leave();
	});

	test('has the name that the server knows, whatever the client says', async () => {
		const { noteId, engineer, observer, lead } = await opened();
		const [a, b] = [await join(server, noteId, observer), await join(server, noteId, engineer)];
		a.provider.awareness.setLocalState({
			itemId: 'x',
			user: { id: lead.id, name: lead.name },
			html: '<script>'
		});
		await eventually(() => expect(seen(b, a)?.itemId).toBe('x'));
		expect(seen(b, a)).toEqual({
			itemId: 'x',
			activity: 'reads',
			cursor: null,
			user: { id: observer.id, name: observer.name }
		});
		for (const client of [a, b]) client.leave();
	});

	test('cannot be changed or taken away by another client', async () => {
		const { noteId, engineer, observer } = await opened();
		const a = await join(server, noteId, engineer);
		a.provider.awareness.setLocalState({ itemId: 'mine', activity: 'types' });
		const witness = await join(server, noteId, engineer);
		await eventually(() => expect(seen(witness, a)?.itemId).toBe('mine'));
		const raw = await rawSocket(server, `/sync/${noteId}`, await headersOf(observer));
		raw.socket.send(says(a.doc.clientID, 1000, { itemId: 'theirs' }));
		raw.socket.send(says(a.doc.clientID, 1001, null));
		raw.socket.send(says(77, 1, { itemId: 'own' }));
		await eventually(() =>
			expect(witness.provider.awareness.getStates().get(77)).toMatchObject({ itemId: 'own' })
		);
		raw.socket.send(says(78, 1, { itemId: 'a second self' }));
		raw.socket.send(says(77, 2, { itemId: 'moved' }));
		await eventually(() =>
			expect(witness.provider.awareness.getStates().get(77)).toMatchObject({ itemId: 'moved' })
		);
		expect(seen(witness, a)).toMatchObject({ itemId: 'mine', user: { id: engineer.id } });
		expect(witness.provider.awareness.getStates().has(78)).toBe(false);
		raw.socket.close();
		for (const client of [a, witness]) client.leave();
	});

	test('ends with the socket, also when it breaks', async () => {
		const { noteId, engineer, observer } = await opened();
		const b = await join(server, noteId, engineer);
		const raw = await rawSocket(server, `/sync/${noteId}`, await headersOf(observer));
		raw.socket.send(says(77, 1, { itemId: 'x' }));
		await eventually(() => expect(b.provider.awareness.getStates().has(77)).toBe(true));
		raw.socket.terminate();
		await eventually(() => expect(b.provider.awareness.getStates().has(77)).toBe(false));
		b.leave();
	});

	test('too long to be a place is dropped, and nothing else', async () => {
		const { noteId, engineer, observer } = await opened();
		const b = await join(server, noteId, engineer);
		const raw = await rawSocket(server, `/sync/${noteId}`, await headersOf(observer));
		raw.socket.send(says(77, 1, { itemId: 'x', cursor: { anchor: 'y'.repeat(5000), head: 0 } }));
		raw.socket.send(says(77, 2, { itemId: 'z' }));
		await eventually(() =>
			expect(b.provider.awareness.getStates().get(77)).toMatchObject({ itemId: 'z' })
		);
		raw.socket.close();
		b.leave();
	});
});
