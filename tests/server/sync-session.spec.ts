/** The page's session against a real server: what it says of itself is true. */
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import type { SignedIn } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { membership } from '$lib/server/db/schema';
import { announce } from '$lib/server/events';
import { loadDocument } from '$lib/server/notes/document';
import { fillNote } from '$lib/server/notes/edit';
import { noteForPage } from '$lib/server/notes/page';
import { closeEngine } from '$lib/server/engine/evaluate';
import { addItem, textField } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { NoteSession } from '$lib/sync/note-session.svelte';
import { makeNote, makeProgramme } from './fixtures';
import { eventually, headersOf, socketWith, startServer, type TestServer } from './sync-client';

let server: TestServer;
beforeAll(async () => {
	server = await startServer();
});
afterAll(async () => {
	await server.stop();
	await closeEngine();
});

async function opened() {
	const people = await makeProgramme();
	const { id } = await makeNote(people.programme.id, people.lead);
	return { ...people, noteId: id };
}

async function session(noteId: string, person: SignedIn, at: TestServer = server) {
	const { state, changedAt } = await noteForPage({ id: noteId });
	return new NoteSession({
		noteId,
		userId: person.id,
		state,
		savedAt: new Date(changedAt),
		server: at.url,
		WebSocket: socketWith(await headersOf(person))
	});
}

const add = ({ doc, origin }: NoteSession, title: string) =>
	addItem(doc, { kind: 'section', title }, { after: null, origin });

describe('A session', () => {
	test('shows the note before the socket is up, then joins', async () => {
		const { noteId, engineer } = await opened();
		await fillNote(noteId, engineer.id, {
			format: 'holdfast-note',
			version: 1,
			thinLimit: '0.1',
			items: [{ id: 's', kind: 'section', title: 'Givens' }]
		});
		const a = await session(noteId, engineer);
		expect(a.status).toBe('joining');
		expect(projectNote(a.doc).items).toHaveLength(1);
		await eventually(() => expect(a.status).toBe('saved'));
		expect(a.unsaved).toBe(0);
		a.destroy();
	});

	test('is saving until the commit, then saved at the time of the commit', async () => {
		const { noteId, engineer } = await opened();
		const a = await session(noteId, engineer);
		await eventually(() => expect(a.status).toBe('saved'));
		add(a, 'One');
		add(a, 'Two');
		expect([a.status, a.unsaved]).toEqual(['saving', 2]);
		await eventually(() => expect(a.status).toBe('saved'));
		const loaded = await loadDocument(noteId);
		expect(projectNote(loaded.doc)).toEqual(projectNote(a.doc));
		expect(a.savedAt!.toISOString()).toBe((await noteForPage({ id: noteId })).changedAt);
		a.destroy();
	});

	test("does not count other people's edits as unsaved ones of its own", async () => {
		const { noteId, engineer, lead } = await opened();
		const [a, b] = [await session(noteId, engineer), await session(noteId, lead)];
		await eventually(() => expect([a.status, b.status]).toEqual(['saved', 'saved']));
		add(a, 'Theirs');
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		expect([b.status, b.unsaved]).toEqual(['saved', 0]);
		b.undo();
		expect(projectNote(b.doc).items).toHaveLength(1);
		for (const one of [a, b]) one.destroy();
	});

	test('is offline with its count while the server is away, and merges on return', async () => {
		const { noteId, engineer } = await opened();
		const mine = await startServer();
		const a = await session(noteId, engineer, mine);
		await eventually(() => expect(a.status).toBe('saved'));
		await mine.stop();
		await eventually(() => expect(a.status).toBe('offline'));
		expect(a.offlineSince).toBeInstanceOf(Date);
		add(a, 'Offline');
		add(a, 'Still');
		expect([a.status, a.unsaved]).toEqual(['offline', 2]);
		expect((await loadDocument(noteId)).seq).toBe(0);
		const port = Number(new URL(mine.url).port);
		const back = await startServer({}, undefined, port);
		await eventually(() => expect([a.status, a.unsaved]).toEqual(['saved', 0]));
		expect(a.offlineSince).toBeNull();
		expect(projectNote((await loadDocument(noteId)).doc)).toEqual(projectNote(a.doc));
		a.destroy();
		await back.stop();
	});

	test('keeps refused edits and gives them as text; is saved again once they are taken', async () => {
		const { noteId, engineer, programme } = await opened();
		const a = await session(noteId, engineer);
		await eventually(() => expect(a.status).toBe('saved'));
		const change = (role: 'observer' | 'engineer') =>
			db.transaction(async (tx) => {
				await tx
					.update(membership)
					.set({ role })
					.where(and(eq(membership.userId, engineer.id), eq(membership.programmeId, programme.id)));
				await announce(tx, { kind: 'access', userId: engineer.id, programmeId: programme.id });
			});
		const kept = add(a, 'Taken');
		await eventually(() => expect(a.status).toBe('saved'));
		const people = new Promise((resolve) => a.on('event', resolve));
		await change('observer');
		expect(await people).toEqual({ kind: 'people' });
		a.doc.transact(() => textField(a.doc, kept, 'title')!.insert(0, 'Not '), a.origin);
		await eventually(() => expect(a.status).toBe('refused'));
		expect(a.refusal).toMatch(/observer/);
		expect(a.unsavedText()).toBe('1 Section\n  title: Not Taken');
		await change('engineer');
		await eventually(() => expect([a.status, a.unsaved]).toEqual(['saved', 0]));
		expect(projectNote((await loadDocument(noteId)).doc).items).toMatchObject([
			{ title: 'Not Taken' }
		]);
		a.destroy();
	});

	test('is closed, with the reason, when the person leaves the programme', async () => {
		const { noteId, engineer } = await opened();
		const a = await session(noteId, engineer);
		await eventually(() => expect(a.status).toBe('saved'));
		await db.delete(membership).where(eq(membership.userId, engineer.id));
		await announce(db, { kind: 'access', userId: engineer.id });
		await eventually(() => expect(a.status).toBe('closed'));
		expect(a.refusal).toMatch(/no longer in the programme/);
		a.destroy();
	});

	test('shows other people, where they are and what they do', async () => {
		const { noteId, engineer, reviewer } = await opened();
		const [a, b] = [await session(noteId, engineer), await session(noteId, reviewer)];
		b.here('x', 'remarks');
		await eventually(() =>
			expect(a.people).toMatchObject([
				{ userId: reviewer.id, name: reviewer.name, itemId: 'x', activity: 'remarks' }
			])
		);
		expect(b.people.map(({ userId }) => userId)).toEqual([engineer.id]);
		b.destroy();
		await eventually(() => expect(a.people).toEqual([]));
		a.destroy();
	});

	test('is still seen by others after its connection came back', async () => {
		const { noteId, engineer, reviewer } = await opened();
		const [mine, port] = await (async () => {
			const started = await startServer();
			return [started, Number(new URL(started.url).port)] as const;
		})();
		const [a, b] = [await session(noteId, engineer, mine), await session(noteId, reviewer, mine)];
		b.here('x');
		await eventually(() => expect(a.people).toMatchObject([{ itemId: 'x' }]));
		await mine.stop();
		await eventually(() => expect([a.status, a.people]).toEqual(['offline', []]));
		const back = await startServer({}, undefined, port);
		await eventually(() => expect(a.people).toMatchObject([{ itemId: 'x' }]));
		for (const one of [a, b]) one.destroy();
		await back.stop();
	});

	test('takes back its own edits, and tells whether it can', async () => {
		const { noteId, engineer } = await opened();
		const a = await session(noteId, engineer);
		expect([a.canUndo, a.canRedo]).toEqual([false, false]);
		add(a, 'Mine');
		expect(a.canUndo).toBe(true);
		a.undo();
		expect(projectNote(a.doc).items).toEqual([]);
		expect([a.canUndo, a.canRedo]).toEqual([false, true]);
		a.redo();
		await eventually(() => expect(a.status).toBe('saved'));
		expect(Y.encodeStateVector((await loadDocument(noteId)).doc)).toEqual(
			Y.encodeStateVector(a.doc)
		);
		a.destroy();
	});
});
