import { afterAll, beforeEach, expect, test } from 'vitest';
import { removeItem, textField } from '$lib/note/document';
import { remarksOf } from '$lib/server/remarks/list';
import { remarksWaitingFor } from '$lib/server/remarks/waiting';
import { db } from '$lib/server/db';
import { membership, noteItem } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { and, eq } from 'drizzle-orm';
import { GET as list, POST as pin } from '../../src/routes/api/notes/[note]/remarks/+server';
import { POST as reply } from '../../src/routes/api/remarks/[remark]/replies/+server';
import { PUT as settle } from '../../src/routes/api/remarks/[remark]/settled/+server';
import { makePerson, makeProgramme } from './fixtures';
import { mailsTo } from './mailed';
import { call, edit, writtenNote } from './written-note';

afterAll(closeEngine);

let team: Awaited<ReturnType<typeof makeProgramme>>;
let note: Awaited<ReturnType<typeof writtenNote>>;

beforeEach(async () => {
	team = await makeProgramme();
	note = await writtenNote(team.programme.id, team.lead, [
		{ kind: 'section', id: 's', title: 'Sizing' },
		{
			kind: 'given',
			id: 'al',
			symbol: 'sigma_al',
			description: 'Allowable',
			value: '100',
			unit: 'GPa'
		},
		{ kind: 'calculation', id: 'd', symbol: 'sigma_d', expression: 'sigma_al / 2', unit: 'GPa' },
		{ kind: 'check', id: 'c', left: 'sigma_d', relation: 'le', right: '60 GPa' },
		{ kind: 'calculation', id: 'w', symbol: 'w', expression: 'Phi + 1' }
	]);
	// The engineer wrote the calculation.
	await db.insert(noteItem).values({
		noteId: note.id,
		itemId: 'd',
		kind: 'calculation',
		number: '1.2',
		createdBy: team.engineer.id
	});
});

type Person = Awaited<ReturnType<typeof makePerson>>;

async function pinned(person: Person, itemId: string, body: string): Promise<string> {
	const answer = await call(pin, person, { note: note.id }, { body: { itemId, body } });
	expect(answer.status).toBe(201);
	return (await answer.json()).id;
}

const answered = (person: Person, remark: string, body: string) =>
	call(reply, person, { remark }, { body: { body } });
const settled = (person: Person, remark: string, settled: boolean) =>
	call(settle, person, { remark }, { body: { settled } });
const first = async () => (await remarksOf(note.id))[0]!;

test('a remark keeps the value at that time while the note goes on', async () => {
	await pinned(team.reviewer, 'd', 'Is the factor of safety that of the standard?');
	await edit(note.id, team.engineer, (doc) => textField(doc, 'al', 'value')!.insert(0, '9'));
	// 100 GPa / 2
	expect(await first()).toMatchObject({
		itemId: 'd',
		seq: 1,
		pinned: { number: '1.2', symbol: 'sigma_d', value: 50, unit: 'GPa', state: '' },
		author: { id: team.reviewer.id, name: team.reviewer.name },
		settled: null,
		replies: []
	});
});

test('what it is pinned to is computed here: a figure that a client sends is not believed', async () => {
	const claimed = { number: '9.9', symbol: 'x', value: 1, unit: 't', state: '' };
	const body = { itemId: 'd', body: 'Wrong.', pinned: claimed, seq: 99 };
	await call(pin, team.reviewer, { note: note.id }, { body });
	expect(await first()).toMatchObject({ seq: 1, pinned: { number: '1.2', value: 50 } });
});

test('a check is pinned with margin and state, what has no value with the reason', async () => {
	await pinned(team.reviewer, 'c', 'Thin for a PDR?');
	await pinned(team.reviewer, 'w', 'Where does Φ come from?');
	const [check, waiting] = await remarksOf(note.id);
	// 60/50 − 1
	expect(check!.pinned).toMatchObject({ value: expect.closeTo(0.2, 12), state: 'holds' });
	expect(waiting!.pinned).toMatchObject({ value: null, state: 'cannot be computed' });
});

test('an item that the note does not have cannot be pinned', async () => {
	for (const itemId of ['nowhere', '__proto__', 'constructor']) {
		await expect(
			call(pin, team.reviewer, { note: note.id }, { body: { itemId, body: 'Hm.' } })
		).rejects.toMatchObject({ status: 409 });
	}
});

test('a remark says something, and not too much', async () => {
	for (const body of ['', '  \n ', '\0', 'x'.repeat(4001)]) {
		await expect(
			call(pin, team.reviewer, { note: note.id }, { body: { itemId: 'd', body } })
		).rejects.toMatchObject({ status: 422 });
	}
	await pinned(team.reviewer, 'd', '  <b>a\0b</b>  ');
	expect((await first()).body).toBe('<b>ab</b>');
});

test('the author of the item is mailed, then everybody in the thread but the writer', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	const [mail] = await mailsTo(team.engineer.email);
	expect(mail!.subject).toBe(`${note.number}, 1.2 sigma_d: remark by ${team.reviewer.name}`);
	expect(mail!.text).toContain('When pinned: 50.00 GPa');
	expect(mail!.text).toContain('Is this with the binder?');
	expect(mail!.text).toContain(`/programmes/${team.programme.code}/notes/${note.number}#d`);
	expect(await mailsTo(team.reviewer.email)).toEqual([]);

	await answered(team.engineer, id, 'It is.');
	expect(await mailsTo(team.reviewer.email)).toHaveLength(1);
	expect(await mailsTo(team.engineer.email)).toHaveLength(1);
	expect(await mailsTo(team.lead.email)).toEqual([]);
});

test('who has left the programme is mailed no more', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	await db
		.delete(membership)
		.where(
			and(eq(membership.userId, team.reviewer.id), eq(membership.programmeId, team.programme.id))
		);
	await answered(team.engineer, id, 'It is.');
	expect(await mailsTo(team.reviewer.email)).toEqual([]);
	expect(await remarksWaitingFor(team.reviewer.id)).toEqual([]);
});

test('an item of which nothing is known yet counts as the note creator’s', async () => {
	await pinned(team.reviewer, 'al', 'Which batch?');
	expect(await mailsTo(team.lead.email)).toHaveLength(1);
});

test('a remark waits for whom it concerns as long as the last word is another’s', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	expect(await remarksWaitingFor(team.engineer.id)).toMatchObject([
		{
			remarkId: id,
			programmeCode: team.programme.code,
			noteNumber: note.number,
			itemId: 'd',
			number: '1.2',
			symbol: 'sigma_d',
			words: 'Is this with the binder?',
			writer: team.reviewer.name,
			at: expect.any(Date)
		}
	]);
	expect(await remarksWaitingFor(team.reviewer.id)).toEqual([]);
	expect(await remarksWaitingFor(team.lead.id)).toEqual([]);

	await answered(team.engineer, id, 'It is.');
	expect(await remarksWaitingFor(team.engineer.id)).toEqual([]);
	expect(await remarksWaitingFor(team.reviewer.id)).toMatchObject([{ words: 'It is.' }]);

	await settled(team.reviewer, id, true);
	expect(await remarksWaitingFor(team.reviewer.id)).toEqual([]);
	await settled(team.lead, id, false);
	expect(await remarksWaitingFor(team.reviewer.id)).toHaveLength(1);
});

test('settled says by whom and keeps the first; taken up again it is open', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	await settled(team.engineer, id, true);
	await settled(team.lead, id, true);
	expect((await first()).settled).toMatchObject({ by: team.engineer.name });
	await answered(team.lead, id, 'Good.');
	expect(await first()).toMatchObject({
		settled: { by: team.engineer.name },
		replies: [{ body: 'Good.', author: { name: team.lead.name } }]
	});
	await settled(team.reviewer, id, false);
	expect((await first()).settled).toBeNull();
});

test('removing an item keeps its remarks, with what they were pinned to', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	await edit(note.id, team.lead, (doc) => removeItem(doc, 'd'));
	await db
		.update(noteItem)
		.set({ removedBy: team.lead.id, removedAt: new Date() })
		.where(eq(noteItem.itemId, 'd'));
	await answered(team.engineer, id, 'Gone, and so is the question.');
	expect(await first()).toMatchObject({
		pinned: { number: '1.2', value: 50 },
		itemRemoved: { by: team.lead.name },
		replies: [{}]
	});
});

test('an observer reads remarks and writes none; to strangers there are none', async () => {
	const id = await pinned(team.reviewer, 'd', 'Is this with the binder?');
	const read = await call(list, team.observer, { note: note.id });
	expect(await read.json()).toHaveLength(1);
	const stranger = await makePerson();
	for (const [person, status] of [
		[team.observer, 403],
		[stranger, 404]
	] as const) {
		const refused = { status };
		await expect(
			call(pin, person, { note: note.id }, { body: { itemId: 'd', body: 'x' } })
		).rejects.toMatchObject(refused);
		await expect(answered(person, id, 'x')).rejects.toMatchObject(refused);
		await expect(settled(person, id, true)).rejects.toMatchObject(refused);
	}
	await expect(call(list, stranger, { note: note.id })).rejects.toMatchObject({ status: 404 });
	expect(await first()).toMatchObject({ replies: [], settled: null });
});
