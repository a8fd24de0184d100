import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import { loadDocument, updatesSince } from '$lib/server/notes/document';
import { db } from '$lib/server/db';
import { note } from '$lib/server/db/schema';
import { addItem, textField } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { eq } from 'drizzle-orm';
import { makeNote, makeProgramme } from './fixtures';
import { eventually, join, startServer, type TestServer } from './sync-client';

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

describe('An edit', () => {
	test('reaches others on the note, and somebody who opens it later', async () => {
		const { noteId, engineer, lead, observer } = await opened();
		const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
		const id = addItem(a.doc, { kind: 'given', symbol: 'rho', value: '1520' }, { after: null });
		await eventually(() => expect(projectNote(b.doc)).toEqual(projectNote(a.doc)));
		textField(b.doc, id, 'unit')!.insert(0, 'kg/m^3');
		await eventually(() => expect(textField(a.doc, id, 'unit')!.toString()).toBe('kg/m^3'));
		const c = await join(server, noteId, observer);
		expect(projectNote(c.doc)).toEqual(projectNote(a.doc));
		for (const client of [a, b, c]) client.leave();
	});

	test('is committed, with its author, when it is said to be saved', async () => {
		const { noteId, engineer } = await opened();
		const a = await join(server, noteId, engineer);
		addItem(a.doc, { kind: 'section', title: 'Givens' }, { after: null });
		a.mark(1);
		await eventually(() => expect(a.saved).toEqual([1]));
		const { doc, seq } = await loadDocument(noteId);
		expect(projectNote(doc)).toEqual(projectNote(a.doc));
		expect((await updatesSince(noteId, 0)).map(({ userId }) => userId)).toEqual([engineer.id]);
		const [row] = await db.select().from(note).where(eq(note.id, noteId));
		expect(row).toMatchObject({ seq, changedBy: engineer.id });
		a.leave();
	});

	test('that the server had already is acknowledged without being stored again', async () => {
		const { noteId, engineer } = await opened();
		const a = await join(server, noteId, engineer);
		addItem(a.doc, { kind: 'section' }, { after: null });
		a.mark(1);
		await eventually(() => expect(a.saved).toEqual([1]));
		a.provider.disconnect();
		a.provider.connect();
		await eventually(() => expect(a.provider.synced).toBe(true));
		a.mark(1);
		await eventually(() => expect(a.saved).toEqual([1, 1]));
		expect(await updatesSince(noteId, 0)).toHaveLength(1);
		a.leave();
	});

	test('made offline is sent on return, and merges with what others did meanwhile', async () => {
		const { noteId, engineer, lead } = await opened();
		const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
		const id = addItem(a.doc, { kind: 'given', source: 'coupons' }, { after: null });
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		a.provider.disconnect();
		textField(a.doc, id, 'source')!.insert(0, 'own ');
		textField(b.doc, id, 'source')!.insert(7, ', batch 7');
		a.provider.connect();
		await eventually(() => {
			expect(textField(a.doc, id, 'source')!.toString()).toBe('own coupons, batch 7');
			expect(textField(b.doc, id, 'source')!.toString()).toBe('own coupons, batch 7');
		});
		for (const client of [a, b]) client.leave();
	});

	test('that builds on one which never came is kept, and the missing one asked for', async () => {
		const { noteId, engineer, lead } = await opened();
		const a = await join(server, noteId, engineer);
		const b = await join(server, noteId, lead);
		const elsewhere = new Y.Doc();
		const updates: Uint8Array[] = [];
		elsewhere.on('update', (update: Uint8Array) => updates.push(update));
		const id = addItem(elsewhere, { kind: 'section' }, { after: null });
		textField(elsewhere, id, 'title')!.insert(0, 'Sizing');
		// The provider does not send what it is given as its own: only the second one goes out.
		Y.applyUpdate(a.doc, updates[0]!, a.provider);
		Y.applyUpdate(a.doc, updates[1]!, 'elsewhere');
		a.mark(1);
		await eventually(() => expect(a.saved).toEqual([1]));
		await eventually(() => expect(projectNote(b.doc).items).toMatchObject([{ title: 'Sizing' }]));
		await eventually(async () =>
			expect(projectNote((await loadDocument(noteId)).doc)).toEqual(projectNote(b.doc))
		);
		for (const client of [a, b]) client.leave();
	});
});
