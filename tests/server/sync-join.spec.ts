import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { endSession, sessionFromCookie } from '$lib/server/auth/sessions';
import { db } from '$lib/server/db';
import { membership, note } from '$lib/server/db/schema';
import { announce } from '$lib/server/events';
import { addItem } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { CLOSE } from '$lib/sync/close-codes';
import { cookieOf, makeNote, makePerson, makeProgramme } from './fixtures';
import {
	eventually,
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

describe('A socket is refused', () => {
	test('to a page of another site, whoever is signed in', async () => {
		const { noteId, lead } = await opened();
		for (const origin of ['https://elsewhere.example', 'null', 'http://127.0.0.1:4174']) {
			const { status } = await rawSocket(server, `/sync/${noteId}`, await headersOf(lead, origin));
			expect(status()).toBe(403);
		}
		const { status } = await rawSocket(server, `/sync/${noteId}`, {
			cookie: await cookieOf(lead)
		});
		expect(status(), 'without an Origin').toBe(403);
	});

	test('to somebody without a session', async () => {
		const { noteId } = await opened();
		for (const cookie of ['', 'holdfast_session=made-up']) {
			const raw = await rawSocket(server, `/sync/${noteId}`, {
				origin: process.env.ORIGIN!,
				cookie
			});
			expect(await raw.closed()).toBe(CLOSE.SIGNED_OUT);
			expect(raw.received).toEqual([]);
		}
	});

	test('in the same way for a note of another programme, none, and nonsense', async () => {
		const { noteId } = await opened();
		const headers = await headersOf(await makePerson());
		for (const id of [noteId, randomUUID(), 'x', "'; drop table note; --"]) {
			const raw = await rawSocket(server, `/sync/${encodeURIComponent(id)}`, headers);
			expect(await raw.closed()).toBe(CLOSE.NO_SUCH_NOTE);
			expect(raw.received).toEqual([]);
		}
	});

	test('at any other address', async () => {
		const { lead } = await opened();
		const { status } = await rawSocket(server, '/elsewhere', await headersOf(lead));
		expect(status()).toBe(404);
	});
});

describe('Somebody on a note', () => {
	test('is closed out when the session ends', async () => {
		const { noteId, engineer } = await opened();
		const headers = await headersOf(engineer);
		const raw = await rawSocket(server, `/sync/${noteId}`, headers);
		await endSession((await sessionFromCookie(headers.cookie))!.sessionId);
		await announce(db, { kind: 'access', userId: engineer.id });
		expect(await raw.closed()).toBe(CLOSE.SIGNED_OUT);
	});

	test('is closed out when they leave the programme, and others stay', async () => {
		const { noteId, engineer, lead, programme } = await opened();
		const [gone, stays] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
		await db.transaction(async (tx) => {
			await tx.delete(membership).where(eq(membership.userId, engineer.id));
			await announce(tx, { kind: 'access', userId: engineer.id, programmeId: programme.id });
		});
		await eventually(() => expect(gone.closed).toEqual([CLOSE.NO_SUCH_NOTE]));
		expect(stays.provider.wsconnected).toBe(true);
		for (const client of [gone, stays]) client.leave();
	});

	test('is closed out when the note is gone, and what they typed is not said to be saved', async () => {
		const { noteId, engineer } = await opened();
		const a = await join(server, noteId, engineer);
		await db.delete(note).where(eq(note.id, noteId));
		addItem(a.doc, { kind: 'section' }, { after: null });
		a.mark(1);
		await eventually(() => expect(a.closed).toEqual([CLOSE.NO_SUCH_NOTE]));
		expect(a.saved).toEqual([]);
		a.leave();
	});

	test('is told of what changes beside the document, on that note or in its programme', async () => {
		const { noteId, engineer, programme } = await opened();
		const a = await join(server, noteId, engineer);
		const elsewhere = await opened();
		const b = await join(server, elsewhere.noteId, elsewhere.engineer);
		await announce(db, { kind: 'remarks', noteId });
		await announce(db, { kind: 'people', programmeId: programme.id });
		await announce(db, { kind: 'baselines', noteId: elsewhere.noteId });
		await eventually(() => {
			expect(a.events).toEqual(['remarks', 'people']);
			expect(b.events).toEqual(['baselines']);
		});
		for (const client of [a, b]) client.leave();
	});

	test('is not told of a change that was rolled back', async () => {
		const { noteId, engineer } = await opened();
		const a = await join(server, noteId, engineer);
		await db
			.transaction(async (tx) => {
				await announce(tx, { kind: 'baselines', noteId });
				throw new Error('rolled back');
			})
			.catch(() => {});
		await announce(db, { kind: 'remarks', noteId });
		await eventually(() => expect(a.events).toEqual(['remarks']));
		a.leave();
	});
});

describe('A note that nobody is on any more', () => {
	test('is taken out of memory after its last commit, and loaded as it was', async () => {
		const { noteId, engineer } = await opened();
		const a = await join(server, noteId, engineer);
		expect(server.sync.openNotes).toContain(noteId);
		addItem(a.doc, { kind: 'section', title: 'Left at once' }, { after: null });
		const left = projectNote(a.doc);
		a.leave();
		await eventually(() => expect(server.sync.openNotes).not.toContain(noteId));
		const b = await join(server, noteId, engineer);
		expect(projectNote(b.doc)).toEqual(left);
		b.leave();
	});

	test('stays open for somebody who comes while it is being left', async () => {
		const { noteId, engineer, lead } = await opened();
		const a = await join(server, noteId, engineer);
		const late = join(server, noteId, lead);
		addItem(a.doc, { kind: 'section', title: 'On the way out' }, { after: null });
		a.leave();
		const b = await late;
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		expect(server.sync.openNotes).toContain(noteId);
		b.leave();
		await eventually(() => expect(server.sync.openNotes).not.toContain(noteId));
	});
});
