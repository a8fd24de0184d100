import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import type { Role } from '$lib/server/auth/permissions';
import { db } from '$lib/server/db';
import { membership } from '$lib/server/db/schema';
import { announce } from '$lib/server/events';
import { updatesSince } from '$lib/server/notes/document';
import { addItem, removeItem } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { MESSAGE, markMessage } from '$lib/sync/protocol';
import { SYNC } from '$server/sync/messages';
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

async function changeRole(programmeId: string, userId: string, role: Role) {
	await db.transaction(async (tx) => {
		await tx
			.update(membership)
			.set({ role })
			.where(and(eq(membership.programmeId, programmeId), eq(membership.userId, userId)));
		await announce(tx, { kind: 'access', userId, programmeId });
	});
}

const anEdit = () => {
	const doc = new Y.Doc();
	addItem(doc, { kind: 'section', title: 'Slipped in' }, { after: null });
	return Y.encodeStateAsUpdate(doc);
};

describe.each(['reviewer', 'observer'] as const)('A %s', (role) => {
	test('cannot change the note by any message of a raw socket, and is told so', async () => {
		const people = await opened();
		const { noteId, engineer } = people;
		const writer = await join(server, noteId, engineer);
		const raw = await rawSocket(server, `/sync/${noteId}`, await headersOf(people[role]));
		raw.socket.send(frame(MESSAGE.SYNC, SYNC.UPDATE, anEdit()));
		raw.socket.send(frame(MESSAGE.SYNC, SYNC.ANSWER, anEdit()));
		raw.socket.send(markMessage(1));
		await eventually(() => expect(raw.of(MESSAGE.REFUSED)).toHaveLength(3));
		expect(raw.of(MESSAGE.SAVED)).toEqual([]);
		expect(raw.code()).toBeUndefined();
		expect(projectNote(writer.doc).items).toEqual([]);
		expect(await updatesSince(noteId, 0)).toEqual([]);
		raw.socket.close();
		writer.leave();
	});

	test('reads along, and is refused nothing for only reading', async () => {
		const people = await opened();
		const { noteId, engineer } = people;
		const writer = await join(server, noteId, engineer);
		const id = addItem(writer.doc, { kind: 'section' }, { after: null });
		const reader = await join(server, noteId, people[role]);
		removeItem(writer.doc, id);
		await eventually(() => expect(projectNote(reader.doc).items).toEqual([]));
		// Coming back with old deletions in the document is no edit either.
		reader.provider.disconnect();
		reader.provider.connect();
		await eventually(() => expect(reader.provider.synced).toBe(true));
		expect(reader.refused).toEqual([]);
		for (const client of [writer, reader]) client.leave();
	});
});

describe('A role that changes while somebody is on the note', () => {
	test('takes effect on the next edit', async () => {
		const { noteId, engineer, lead, programme } = await opened();
		const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
		await changeRole(programme.id, engineer.id, 'observer');
		await eventually(() => expect(a.events).toContain('people'));
		addItem(a.doc, { kind: 'section' }, { after: null });
		a.mark(1);
		await eventually(() => expect(a.refused).toHaveLength(2));
		expect(a.refused[0]).toMatch(/observer/);
		expect(a.saved).toEqual([]);
		expect(projectNote(b.doc).items).toEqual([]);
		for (const client of [a, b]) client.leave();
	});

	test('lets edits in that were turned away before, once it allows them', async () => {
		const { noteId, engineer, observer, programme } = await opened();
		const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, observer)];
		addItem(b.doc, { kind: 'section', title: 'Early' }, { after: null });
		await eventually(() => expect(b.refused).toHaveLength(1));
		await changeRole(programme.id, observer.id, 'engineer');
		await eventually(() => expect(projectNote(a.doc).items).toMatchObject([{ title: 'Early' }]));
		for (const client of [a, b]) client.leave();
	});
});
