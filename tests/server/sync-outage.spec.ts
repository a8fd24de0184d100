import pg from 'pg';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { loadDocument } from '$lib/server/notes/document';
import { db } from '$lib/server/db';
import { announce } from '$lib/server/events';
import { addItem } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import { CLOSE } from '$lib/sync/close-codes';
import { makeNote, makeProgramme } from './fixtures';
import { eventually, join, startServer, type TestServer } from './sync-client';

let server: TestServer;
let admin: pg.Client;
const database = new URL(process.env.DATABASE_URL!).pathname.slice(1);

beforeAll(async () => {
	server = await startServer();
	admin = new pg.Client({ connectionString: inject('adminUrl') });
	await admin.connect();
});
afterAll(async () => {
	await admin.end();
	await server.stop();
});

async function takeDatabaseAway() {
	await admin.query(`alter database ${database} allow_connections false`);
	await admin.query('select pg_terminate_backend(pid) from pg_stat_activity where datname = $1', [
		database
	]);
}
const giveDatabaseBack = () => admin.query(`alter database ${database} allow_connections true`);

test('while the database is away edits go on, and are said to be saved only when it is back', async () => {
	const people = await makeProgramme();
	const { id: noteId } = await makeNote(people.programme.id, people.lead);
	const [a, b] = [
		await join(server, noteId, people.engineer),
		await join(server, noteId, people.lead)
	];
	await takeDatabaseAway();
	try {
		addItem(a.doc, { kind: 'section', title: 'Typed meanwhile' }, { after: null });
		a.mark(1);
		await eventually(() => expect(projectNote(b.doc).items).toHaveLength(1));
		addItem(b.doc, { kind: 'section', title: 'And this' }, { after: null });
		b.mark(1);
		await eventually(() => expect(projectNote(a.doc).items).toHaveLength(2));
		// The commit has been tried at least once by the time both are here.
		expect([...a.saved, ...b.saved]).toEqual([]);
	} finally {
		await giveDatabaseBack();
	}
	await eventually(() => expect([...a.saved, ...b.saved]).toEqual([1, 1]));
	expect(projectNote((await loadDocument(noteId)).doc)).toEqual(projectNote(a.doc));
	// The server listens again, too.
	await eventually(async () => {
		await announce(db, { kind: 'remarks', noteId });
		expect(a.events).toContain('remarks');
	});
	for (const client of [a, b]) client.leave();
});

test('a note cannot be opened while the database is away, and opens by itself when it is back', async () => {
	const people = await makeProgramme();
	const { id: noteId } = await makeNote(people.programme.id, people.lead);
	const a = await join(server, noteId, people.engineer);
	a.provider.disconnect();
	await eventually(() => expect(server.sync.openNotes).not.toContain(noteId));
	await takeDatabaseAway();
	try {
		a.provider.connect();
		await eventually(() => expect(a.closed).toContain(CLOSE.UNAVAILABLE));
		expect(a.provider.synced).toBe(false);
	} finally {
		await giveDatabaseBack();
	}
	await eventually(() => expect(a.provider.synced).toBe(true));
	a.leave();
});
