import { describe, expect, test } from 'vitest';
import { randomUUID } from 'node:crypto';
import { documentFrom } from '$lib/note/interchange';
import { createNote } from '$lib/server/notes/create';
import { appendUpdates, foldUpdates, loadDocument, updatesSince } from '$lib/server/notes/document';
import { listNotes } from '$lib/server/notes/list';
import { noteForPage } from '$lib/server/notes/page';
import { changeTitleBlock, titleBlockSchema } from '$lib/server/notes/title-block';
import { addItem } from '$lib/note/document';
import { projectNote } from '$lib/note/projection';
import * as Y from 'yjs';
import { makeGate, makePerson, makeProgramme } from './fixtures';

const CODE = () => `N${randomUUID().slice(0, 6).toUpperCase()}`;
const made = () => makeProgramme({}, { code: CODE() });

describe('A new note', () => {
	test('takes the next number of its programme', async () => {
		const { programme, lead } = await made();
		const create = () => createNote(programme, lead.id, { title: 'Line sizing' });
		expect((await create()).number).toBe(`${programme.code}-DN-001`);
		await createNote(programme, lead.id, { title: 'Given', number: `${programme.code}-dn-009` });
		expect((await create()).number).toBe(`${programme.code}-DN-010`);
	});

	test('has a number of its own when several are created at once', async () => {
		const { programme, lead } = await made();
		const notes = await Promise.all(
			Array.from({ length: 8 }, () => createNote(programme, lead.id, { title: 'Sizing' }))
		);
		expect(new Set(notes.map(({ number }) => number)).size).toBe(8);
	});

	test('is refused a number that is taken, and told by what', async () => {
		const { programme, lead } = await made();
		const number = `${programme.code}-DN-004`;
		await createNote(programme, lead.id, { title: 'Primary line', number });
		await expect(
			createNote(programme, lead.id, { title: 'Another', number })
		).rejects.toMatchObject({
			status: 409,
			message: `${number} is taken: "Primary line".`
		});
	});

	test('is refused a number of another programme, an approver and a gate from outside', async () => {
		const { programme, lead } = await made();
		const stranger = await makePerson();
		const other = await made();
		const gate = await makeGate(other.programme.id);
		const create = (values: object) =>
			createNote(programme, lead.id, { title: 'Sizing', ...values });
		await expect(create({ number: 'ZZ-DN-001' })).rejects.toMatchObject({ status: 422 });
		await expect(create({ approverId: stranger.id })).rejects.toMatchObject({ status: 422 });
		await expect(create({ gateId: gate.id })).rejects.toMatchObject({ status: 422 });
		expect(await listNotes([programme.id])).toEqual([]);
	});
});

describe('The title block', () => {
	test('is changed and read with names', async () => {
		const { programme, lead, engineer } = await made();
		const gate = await makeGate(programme.id);
		const note = await createNote(programme, engineer.id, { title: 'Sizing' });
		await changeTitleBlock(
			note,
			titleBlockSchema.parse({
				title: ' Primary line sizing ',
				department: 'Line structures',
				approverId: lead.id,
				gateId: gate.id
			})
		);
		expect(await noteForPage(note)).toMatchObject({
			number: note.number,
			title: 'Primary line sizing',
			department: 'Line structures',
			technicalReference: '',
			creator: { id: engineer.id, name: engineer.name },
			approver: { id: lead.id, name: lead.name },
			gate: { id: gate.id, kind: 'PDR' },
			status: 'Draft',
			baseline: null,
			seq: 0
		});
	});

	test('takes an empty choice of a form for none', () => {
		expect(titleBlockSchema.parse({ title: 'x', approverId: '', gateId: '' })).toMatchObject({
			approverId: null,
			gateId: null
		});
	});
});

describe('The register of notes', () => {
	test('lists the notes of the programmes asked for, by number', async () => {
		const { programme, lead } = await made();
		const other = await made();
		await createNote(programme, lead.id, { title: 'First' });
		await createNote(programme, lead.id, { title: 'Second' });
		await createNote(other.programme, other.lead.id, { title: 'Elsewhere' });
		expect(await listNotes([programme.id])).toMatchObject([
			{ title: 'First', gate: null, baseline: null, openRemarks: 0, status: 'Draft' },
			{ title: 'Second', changedBy: lead.name, itemCount: 0, marks: [] }
		]);
		expect(await listNotes([])).toEqual([]);
	});
});

describe("A note's document in the database", () => {
	const edit = (doc: Y.Doc, title: string) => {
		const before = Y.encodeStateVector(doc);
		addItem(doc, { kind: 'section', title }, { after: null });
		return Y.encodeStateAsUpdate(doc, before);
	};

	test('numbers updates without a gap, whoever appends at once', async () => {
		const { programme, lead } = await made();
		const { id } = await createNote(programme, lead.id, { title: 'Sizing' });
		const append = () =>
			appendUpdates(id, [{ update: edit(new Y.Doc(), 'x'), userId: lead.id }], 'test');
		await Promise.all(Array.from({ length: 10 }, append));
		const seqs = (await updatesSince(id, 0)).map(({ seq }) => seq);
		expect(seqs).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
		expect((await updatesSince(id, 7)).map(({ seq }) => seq)).toEqual([8, 9, 10]);
	});

	test('is the same after its updates were folded, also for who has some of them', async () => {
		const { programme, lead } = await made();
		const { id } = await createNote(programme, lead.id, { title: 'Sizing' });
		const doc = new Y.Doc();
		const holder = new Y.Doc();
		for (const title of ['a', 'b', 'c', 'd']) {
			const update = edit(doc, title);
			await appendUpdates(id, [{ update, userId: lead.id }], 'test');
			if (title < 'c') Y.applyUpdate(holder, update);
		}
		await Promise.all([foldUpdates(id), foldUpdates(id)]);
		await appendUpdates(id, [{ update: edit(doc, 'e'), userId: lead.id }], 'test');
		const loaded = await loadDocument(id);
		expect(loaded.seq).toBe(5);
		expect(projectNote(loaded.doc)).toEqual(projectNote(doc));
		const missing = await updatesSince(id, 2);
		expect(missing.map(({ seq }) => seq)).toEqual([4, 5]);
		for (const { update } of missing) Y.applyUpdate(holder, update);
		expect(projectNote(holder)).toEqual(projectNote(doc));
	});

	test('cannot be appended to when the note is gone', async () => {
		const { lead } = await made();
		const update = edit(
			documentFrom({ format: 'holdfast-note', version: 1, thinLimit: '', items: [] }),
			'x'
		);
		expect(await appendUpdates(randomUUID(), [{ update, userId: lead.id }], 'test')).toBeNull();
	});
});
