import { afterAll, beforeAll, expect, test } from 'vitest';
import { eq } from 'drizzle-orm';
import * as Y from 'yjs';
import { db } from '$lib/server/db';
import { noteSummary } from '$lib/server/db/schema';
import { closeEngine, evaluateContent } from '$lib/server/engine/evaluate';
import { EngineLimitError } from '$lib/server/engine/pool';
import { appendUpdates } from '$lib/server/notes/document';
import { authorshipOf, movementsOf } from '$lib/server/notes/written';
import { addItem, addItems, removeItem, textField } from '$lib/note/document';
import { makeNote, makeProgramme } from './fixtures';
import { eventually, join, startServer, type TestServer } from './sync-client';

let server: TestServer;
beforeAll(async () => {
	server = await startServer({}, evaluateContent);
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

const summaryOf = async (noteId: string) =>
	(await db.select().from(noteSummary).where(eq(noteSummary.noteId, noteId)))[0]!;

const given = { id: 'a', kind: 'given', symbol: 'a', value: '1' } as const;
const check = { id: 'k', kind: 'check', left: 'a', right: '2' } as const;

test('what people type is written down: authors, register, and what moved a check', async () => {
	const { noteId, engineer, lead } = await opened();
	const [a, b] = [await join(server, noteId, engineer), await join(server, noteId, lead)];
	addItems(a.doc, [given, check], { after: null });
	await eventually(async () => expect((await summaryOf(noteId)).checks.holds).toBe(1));
	await eventually(() => expect(textField(b.doc, 'a', 'value')!.toString()).toBe('1'));
	textField(b.doc, 'a', 'value')!.insert(0, '3');
	await eventually(async () =>
		expect(await movementsOf(noteId)).toMatchObject([
			{ itemId: 'k', state: 'fails', before: '1', after: '31', movedBy: { id: lead.id } }
		])
	);
	await eventually(() => expect(a.events).toContain('movements'));
	expect(await authorshipOf(noteId)).toMatchObject([
		{ itemId: 'a', createdBy: { id: engineer.id }, changedBy: { id: lead.id } },
		{ itemId: 'k', createdBy: { id: engineer.id }, changedBy: { id: engineer.id } }
	]);
	for (const client of [a, b]) client.leave();
});

test('everything is written down before a note that nobody is on leaves memory', async () => {
	const { noteId, engineer } = await opened();
	const a = await join(server, noteId, engineer);
	addItems(a.doc, [given, check], { after: null });
	a.mark(1);
	await eventually(() => expect(a.saved).toEqual([1]));
	removeItem(a.doc, 'a');
	a.leave();
	await eventually(() => expect(server.sync.openNotes).not.toContain(noteId));
	expect(await summaryOf(noteId)).toMatchObject({ checks: { waits: 1 }, itemCount: 1 });
	expect(await authorshipOf(noteId)).toMatchObject([
		{ itemId: 'k', createdBy: { id: engineer.id } }
	]);
});

test('what a process committed but did not live to write down is written when the note is opened', async () => {
	const { noteId, engineer, observer } = await opened();
	const doc = new Y.Doc();
	addItems(doc, [given, check], { after: null });
	const update = Y.encodeStateAsUpdate(doc);
	await appendUpdates(noteId, [{ update, userId: engineer.id }], 'a process that ended');
	const a = await join(server, noteId, observer);
	await eventually(async () => expect((await summaryOf(noteId)).checks.holds).toBe(1));
	expect(await authorshipOf(noteId)).toMatchObject([
		{ itemId: 'a', createdBy: { id: engineer.id } },
		{ itemId: 'k', createdBy: { id: engineer.id } }
	]);
	a.leave();
});

test('a note too heavy for the engine is still written, with its authors', async () => {
	const { noteId, engineer } = await opened();
	const own = await startServer({}, () => Promise.reject(new EngineLimitError('too heavy')));
	const a = await join(own, noteId, engineer);
	addItem(a.doc, given, { after: null });
	a.mark(1);
	await eventually(() => expect(a.saved).toEqual([1]));
	await eventually(async () =>
		expect(await authorshipOf(noteId)).toMatchObject([{ createdBy: { id: engineer.id } }])
	);
	a.leave();
	await own.stop();
});
