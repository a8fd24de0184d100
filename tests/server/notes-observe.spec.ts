import { eq } from 'drizzle-orm';
import { afterAll, describe, expect, test } from 'vitest';
import type * as Y from 'yjs';
import { removeItem, setThinLimit, textField, addItem, moveItem } from '$lib/note/document';
import type { NoteContent } from '$lib/note/items';
import { BLANK } from '$lib/note/items';
import { db } from '$lib/server/db';
import { noteSummary } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { editNote, fillNote } from '$lib/server/notes/edit';
import { authorshipOf, movementsOf } from '$lib/server/notes/written';
import { makeNote, makeProgramme } from './fixtures';

afterAll(() => closeEngine());

const given = (id: string, symbol: string, value: string) =>
	({ ...BLANK.given, id, kind: 'given', symbol, value, description: `Load ${symbol}` }) as const;

/** a = 1, twice = 2 a, b = 5; check: twice ≤ b holds with a margin of 1.5. */
const content: NoteContent = {
	format: 'holdfast-note',
	version: 1,
	thinLimit: '0.10',
	items: [
		{ id: 's', kind: 'section', title: 'Loads' },
		given('a', 'a', '1'),
		given('b', 'b', '5'),
		{ ...BLANK.calculation, id: 'c', kind: 'calculation', symbol: 'twice', expression: '2 * a' },
		{
			...BLANK.check,
			id: 'k',
			kind: 'check',
			description: 'Twice the load is carried',
			left: 'twice',
			relation: 'le',
			right: 'b'
		}
	]
};

const type = (id: string, field: string, text: string) => (doc: Y.Doc) => {
	const held = textField(doc, id, field)!;
	held.delete(0, held.length);
	held.insert(0, text);
};

async function filled() {
	const people = await makeProgramme();
	const { id } = await makeNote(people.programme.id, people.lead);
	await fillNote(id, people.engineer.id, content);
	return { noteId: id, ...people };
}

const summaryOf = async (noteId: string) =>
	(await db.select().from(noteSummary).where(eq(noteSummary.noteId, noteId)))[0]!;

describe('The register', () => {
	test('has the counts of a note and its line after an edit', async () => {
		const { noteId, engineer } = await filled();
		expect(await summaryOf(noteId)).toMatchObject({
			checks: { holds: 1, thin: 0, fails: 0, waits: 0 },
			marks: [{ at: 1, itemId: 'k', state: 'holds', margin: 1.5 }],
			itemCount: 5
		});
		await editNote(noteId, engineer.id, type('a', 'value', '4'));
		expect(await summaryOf(noteId)).toMatchObject({
			checks: { holds: 0, thin: 0, fails: 1, waits: 0 },
			marks: [{ itemId: 'k', state: 'fails', margin: -0.375 }]
		});
	});
});

describe('What moved a check', () => {
	test('is the edit upstream of it, with what it was, by whom', async () => {
		const { noteId, lead } = await filled();
		expect(await movementsOf(noteId)).toEqual([]);
		await editNote(noteId, lead.id, type('a', 'value', '3'));
		expect(await movementsOf(noteId)).toMatchObject([
			{
				itemId: 'k',
				stateBefore: 'holds',
				state: 'fails',
				cause: { itemId: 'a', number: '1.1', symbol: 'a' },
				before: '1',
				after: '3',
				movedBy: { id: lead.id, name: lead.name }
			}
		]);
	});

	test('goes on with the same edit, and is taken back when the edit is', async () => {
		const { noteId, lead } = await filled();
		await editNote(noteId, lead.id, type('a', 'value', '3'));
		await editNote(noteId, lead.id, type('a', 'value', '32'));
		expect(await movementsOf(noteId)).toMatchObject([{ before: '1', after: '32' }]);
		await editNote(noteId, lead.id, type('a', 'value', '1'));
		expect(await movementsOf(noteId)).toEqual([]);
	});

	test('is not an edit of what something is called or where it comes from', async () => {
		const { noteId, lead, engineer } = await filled();
		await editNote(noteId, lead.id, type('a', 'value', '3'));
		await editNote(noteId, lead.id, type('a', 'source', 'Weighed again'));
		await editNote(noteId, engineer.id, type('a', 'description', 'Load at the joint'));
		expect(await movementsOf(noteId)).toMatchObject([
			{ before: '1', after: '3', movedBy: { id: lead.id } }
		]);
	});

	test("is somebody else's when somebody else edits on", async () => {
		const { noteId, lead, engineer } = await filled();
		await editNote(noteId, lead.id, type('a', 'value', '3'));
		await editNote(noteId, engineer.id, type('b', 'value', '9'));
		expect(await movementsOf(noteId)).toMatchObject([
			{
				stateBefore: 'fails',
				state: 'holds',
				cause: { itemId: 'b' },
				before: '5',
				after: '9',
				movedBy: { id: engineer.id }
			}
		]);
	});

	test('has no cause upstream when the check itself was edited', async () => {
		const { noteId, lead } = await filled();
		await editNote(noteId, lead.id, type('k', 'right', '1'));
		expect(await movementsOf(noteId)).toMatchObject([
			{ state: 'fails', cause: null, before: 'twice ≤ b', after: 'twice ≤ 1' }
		]);
	});

	test('is the removal of what it stood on', async () => {
		const { noteId, lead } = await filled();
		await editNote(noteId, lead.id, (doc) => removeItem(doc, 'a'));
		expect(await movementsOf(noteId)).toMatchObject([
			{ state: 'waits', cause: { itemId: 'a', symbol: 'a' }, before: '1', after: '' }
		]);
	});

	test('is nobody when the thin limit was set', async () => {
		const { noteId, lead } = await filled();
		await editNote(noteId, lead.id, (doc) => setThinLimit(doc, '2'));
		expect(await movementsOf(noteId)).toMatchObject([
			{ stateBefore: 'holds', state: 'thin', cause: null, movedBy: null }
		]);
	});
});

describe('Who wrote an item', () => {
	test('is who added it, who changed it last and who removed it', async () => {
		const { noteId, engineer, lead } = await filled();
		await editNote(noteId, lead.id, type('a', 'source', 'coupons'));
		await editNote(noteId, lead.id, (doc) => removeItem(doc, 'b'));
		const items = new Map((await authorshipOf(noteId)).map((item) => [item.itemId, item]));
		expect(items.get('a')).toMatchObject({
			number: '1.1',
			symbol: 'a',
			description: 'Load a',
			createdBy: { id: engineer.id },
			changedBy: { id: lead.id, name: lead.name },
			removedBy: null,
			removedAt: null
		});
		expect(items.get('b')).toMatchObject({
			number: '1.2',
			changedBy: { id: engineer.id },
			removedBy: { id: lead.id }
		});
		expect(items.get('c')).toMatchObject({ number: '1.2', changedBy: { id: engineer.id } });
	});

	test('does not change when an item is moved, only its number', async () => {
		const { noteId, engineer, lead } = await filled();
		await editNote(noteId, lead.id, (doc) => moveItem(doc, 'a', { after: 'k' }));
		const [a] = (await authorshipOf(noteId)).filter((item) => item.itemId === 'a');
		expect(a).toMatchObject({ number: '1.4', changedBy: { id: engineer.id } });
	});

	test('stands again when a removed item is put back', async () => {
		const { noteId, lead } = await filled();
		await editNote(noteId, lead.id, (doc) => removeItem(doc, 'b'));
		await editNote(noteId, lead.id, (doc) => addItem(doc, given('b', 'b', '5'), { after: 'a' }));
		const [b] = (await authorshipOf(noteId)).filter((item) => item.itemId === 'b');
		expect(b).toMatchObject({ removedBy: null, removedAt: null, changedBy: { id: lead.id } });
	});
});
