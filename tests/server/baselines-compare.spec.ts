import { afterAll, beforeAll, expect, test } from 'vitest';
import { addItem, removeItem, textField } from '$lib/note/document';
import { changesBefore } from '$lib/server/baselines/before';
import { freeze } from '$lib/server/baselines/freeze';
import { parametersOf } from '$lib/server/baselines/parameters';
import { findBaseline, latestBaseline, opened } from '$lib/server/baselines/read';
import { compareSides } from '$lib/server/baselines/sides';
import { db } from '$lib/server/db';
import { noteItem } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { GET as compareRoute } from '../../src/routes/api/notes/[note]/compare/+server';
import { GET as latestRoute } from '../../src/routes/api/notes/[note]/baselines/latest/+server';
import { GET as parametersRoute } from '../../src/routes/api/programmes/[programme]/parameters.csv/+server';
import { GET as quantitiesRoute } from '../../src/routes/api/baselines/[baseline]/quantities/+server';
import { makeGate, makePerson, makeProgramme } from './fixtures';
import { call, edit, writtenNote } from './written-note';

afterAll(closeEngine);

let team: Awaited<ReturnType<typeof makeProgramme>>;
let note: Awaited<ReturnType<typeof writtenNote>>;
let ids: string[];

async function frozen(revision: string, seenSeq: number) {
	const gate = await makeGate(team.programme.id);
	const input = { gateId: gate.id, revision, seenSeq, waivers: [] };
	note = { ...note, revision };
	return freeze({ note, programme: team.programme, person: team.lead, input });
}

const given = (id: string, symbol: string, value: string, unit: string) =>
	({ kind: 'given', id, symbol, value, unit }) as const;

beforeAll(async () => {
	team = await makeProgramme();
	note = await writtenNote(team.programme.id, team.engineer, [
		given('m', 'm', '20', 't'),
		given('x', 'x', '1', ''),
		{ kind: 'calculation', id: 'w', symbol: 'w', expression: 'm * 2', unit: 't' },
		{ kind: 'calculation', id: 'v', symbol: 'v', expression: 'm * 2', unit: 'kg' }
	]);
	ids = [await frozen('A', 1)];
	await edit(note.id, team.engineer, (doc) => {
		const value = textField(doc, 'm', 'value')!;
		value.delete(0, value.length);
		value.insert(0, '25');
		textField(doc, 'm', 'description')!.insert(0, '=climber');
	});
	ids.push(await frozen('B', 2));
	note = { ...note, revision: 'C' };
	await edit(note.id, team.engineer, (doc) => {
		removeItem(doc, 'x');
		addItem(doc, given('y', 'y', '3', 'km'), { after: null });
	});
	await db.insert(noteItem).values([
		{ noteId: note.id, itemId: 'y', kind: 'given', number: '0.1', createdBy: team.engineer.id },
		{
			noteId: note.id,
			itemId: 'x',
			kind: 'given',
			number: '0.2',
			createdBy: team.engineer.id,
			removedBy: team.lead.id,
			removedAt: new Date()
		}
	]);
});

test('two baselines are held against each other', async () => {
	const { from, to, comparison } = await compareSides(note, 'A', 'B');
	expect([from, to]).toMatchObject([
		{ kind: 'frozen', revision: 'A', id: ids[0] },
		{ kind: 'frozen', revision: 'B', id: ids[1] }
	]);
	// 20 t to 25 t, and twice that: each 25 % more.
	expect(
		comparison.movements.map(({ after, change, cause }) => [after.itemId, change, cause.kind])
	).toEqual([
		['m', expect.closeTo(0.25, 12), 'typed'],
		['w', expect.closeTo(0.25, 12), 'upstream'],
		['v', expect.closeTo(0.25, 12), 'upstream']
	]);
	expect(comparison.unchanged).toBe(1);
});

test('a baseline is held against the note as it is now, with who added and removed', async () => {
	const { to, comparison, authors } = await compareSides(note, 'B', 'now');
	expect(to).toMatchObject({ kind: 'now', revision: 'C', seq: 3 });
	expect(comparison.movements).toEqual([]);
	expect(comparison.added.map(({ item }) => item.id)).toEqual(['y']);
	expect(comparison.removed.map(({ item }) => item.id)).toEqual(['x']);
	expect(authors.y?.added?.by).toBe(team.engineer.name);
	expect(authors.x?.removed?.by).toBe(team.lead.name);
});

test('the newest baseline is served for the live note; a note without one has none', async () => {
	const answer = await call(latestRoute, team.observer, { note: note.id });
	expect(await answer.json()).toMatchObject({
		id: ids[1],
		revision: 'B',
		digest: expect.stringMatching(/^[0-9a-f]{64}$/),
		content: { items: [{ id: 'm' }, { id: 'x' }, { id: 'w' }, { id: 'v' }] },
		results: expect.any(Array)
	});
	const empty = await writtenNote(team.programme.id, team.engineer, []);
	expect(await latestBaseline(empty.id)).toBeNull();
	const none = await call(latestRoute, team.observer, { note: empty.id });
	expect(await none.json()).toBeNull();
});

test('a frozen sheet says what changed since the baseline before it; the first has none before', async () => {
	const [first, second] = await Promise.all(ids.map((id) => findBaseline(id)));
	expect(await changesBefore(note.id, first!.frozenAt, opened(first!))).toBeNull();
	const before = await changesBefore(note.id, second!.frozenAt, opened(second!));
	expect(before).toMatchObject({ revision: 'A', changes: { changed: 3, added: 0, removed: [] } });
});

test('the parameters of a programme are the quantities of the latest baselines, and no later ones', async () => {
	const parameters = await parametersOf(team.programme.id);
	expect(
		parameters.map(({ symbol, revision, baselineId, noteNumber, outcome }) => [
			...[symbol, revision, baselineId, noteNumber],
			outcome.state === 'value' && outcome.quantity.si
		])
	).toEqual([
		['m', 'B', ids[1], note.number, 25_000],
		['x', 'B', ids[1], note.number, 1],
		['w', 'B', ids[1], note.number, 50_000],
		['v', 'B', ids[1], note.number, 50_000]
	]);
	const other = await makeProgramme();
	expect(await parametersOf(other.programme.id)).toEqual([]);
	const params = { programme: team.programme.code };
	const lines = (await (await call(parametersRoute, team.observer, params)).text()).split('\r\n');
	expect(lines[2]).toBe(`m,'=climber,25,t,,,${note.number},B,0.1`);
});

test('a comparison is taken away as CSV that no spreadsheet runs', async () => {
	const answer = await call(
		compareRoute,
		team.observer,
		{ note: note.id },
		{ query: '?from=A&to=B' }
	);
	expect(answer.headers.get('content-type')).toBe('text/csv; charset=utf-8');
	const lines = (await answer.text()).split('\r\n');
	expect(lines[0]).toContain('Preliminary design data. Not for construction or operation.');
	expect(lines[2]).toBe(`0.1,m,'=climber,20,t,25,t,0.25,given,,,,`);
});

test('the quantities of a baseline are taken away as CSV', async () => {
	const answer = await call(quantitiesRoute, team.observer, { baseline: ids[0]! });
	const lines = (await answer.text()).split('\r\n');
	expect(lines.slice(2)).toEqual([
		'0.1,m,,20,t,,,,',
		'0.2,x,,1,,,,,',
		'0.3,w,,40,t,,,,',
		'0.4,v,,40000,kg,,,,',
		''
	]);
});

test('a side that is not there is said, and strangers are told of no note', async () => {
	const compared = (query: string, person = team.lead) =>
		call(compareRoute, person, { note: note.id }, { query });
	await expect(compared('?from=K')).rejects.toMatchObject({
		status: 404,
		message: `${note.number} has no baseline K.`
	});
	await expect(compared('?to=now')).rejects.toMatchObject({ status: 422 });
	await expect(compared('?from=A', await makePerson())).rejects.toMatchObject({ status: 404 });
});
