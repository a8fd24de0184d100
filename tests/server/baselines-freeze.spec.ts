import { eq } from 'drizzle-orm';
import { afterAll, beforeEach, expect, test } from 'vitest';
import { textField } from '$lib/note/document';
import { freeze } from '$lib/server/baselines/freeze';
import { latestBaseline } from '$lib/server/baselines/read';
import { baselinesWaitingFor, markViewed } from '$lib/server/baselines/waiting';
import { db } from '$lib/server/db';
import { baseline, note as noteTable } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { GET as list, POST as post } from '../../src/routes/api/notes/[note]/baselines/+server';
import { makeGate, makePerson, makeProgramme } from './fixtures';
import { mailsTo } from './mailed';
import { call, edit, writtenNote } from './written-note';

afterAll(closeEngine);

const REASON = 'Accepted until the joints are thickened.';

/** 100 GPa over 2 is 50 GPa; the joint carries 47.2 GPa of it: short by 2.8 GPa, margin −0.056. */
const ITEMS = [
	{ kind: 'section', id: 's', title: 'Sizing' },
	{ kind: 'given', id: 'al', symbol: 'sigma_al', value: '100', unit: 'GPa' },
	{ kind: 'given', id: 'j', symbol: 'sigma_j', value: '47.2', unit: 'GPa' },
	{ kind: 'calculation', id: 'd', symbol: 'sigma_d', expression: 'sigma_al / 2', unit: 'GPa' },
	{ kind: 'check', id: 'c', left: 'sigma_d', relation: 'le', right: 'sigma_j' }
] as const;

let team: Awaited<ReturnType<typeof makeProgramme>>;
let gates: Awaited<ReturnType<typeof makeGate>>[];
let note: Awaited<ReturnType<typeof writtenNote>>;

beforeEach(async () => {
	team = await makeProgramme();
	gates = [
		await makeGate(team.programme.id, { kind: 'SRR', position: 0 }),
		await makeGate(team.programme.id, { kind: 'PDR', position: 1 })
	];
	note = await writtenNote(team.programme.id, team.engineer, [...ITEMS], {
		approverId: team.lead.id,
		gateId: gates[0]!.id
	});
});

type Input = Partial<Parameters<typeof freeze>[0]['input']>;

const waived = { waivers: [{ itemId: 'c', reason: REASON }] };

function frozenBy(person = team.lead, input: Input = {}) {
	const full = { gateId: gates[0]!.id, revision: 'A', seenSeq: 1, waivers: [], ...input };
	return freeze({ note, programme: team.programme, person, input: full });
}

const rows = () => db.select().from(baseline).where(eq(baseline.noteId, note.id));

test('a failing check without a waiver refuses the freeze, and is named', async () => {
	await expect(frozenBy()).rejects.toMatchObject({
		status: 422,
		message: `${note.number} cannot be frozen: 1.4 fails.`,
		details: {
			inTheWay: [{ kind: 'fails', itemId: 'c', reason: 'Short by 2.80\u202fGPa, margin −0.056.' }]
		}
	});
	expect(await rows()).toEqual([]);
});

test('what cannot be computed refuses the freeze, with all that waits for it; no waiver helps', async () => {
	await edit(note.id, team.engineer, (doc) => textField(doc, 'al', 'value')!.delete(0, 3));
	const waivers = [
		{ itemId: 'c', reason: REASON },
		{ itemId: 'd', reason: REASON }
	];
	await expect(frozenBy(team.lead, { seenSeq: 2, waivers })).rejects.toMatchObject({
		status: 422,
		details: {
			inTheWay: [
				{ kind: 'cannot be computed', number: '1.1', reason: 'Nothing is given here yet.' },
				{ kind: 'cannot be computed', number: '1.3', reason: 'Waits for sigma_al.' },
				{ kind: 'cannot be computed', number: '1.4' }
			]
		}
	});
});

test('a waiver is for a failing check only, and says why', async () => {
	const needless = [...waived.waivers, { itemId: 'd', reason: REASON }];
	await expect(frozenBy(team.lead, { waivers: needless })).rejects.toMatchObject({ status: 422 });
	const twice = [...waived.waivers, ...waived.waivers];
	await expect(frozenBy(team.lead, { waivers: twice })).rejects.toMatchObject({ status: 422 });
	const short = { gateId: gates[0]!.id, revision: 'A', seenSeq: 1 };
	await expect(
		call(
			post,
			team.lead,
			{ note: note.id },
			{
				body: { ...short, waivers: [{ itemId: 'c', reason: '  too short  ' }] }
			}
		)
	).rejects.toMatchObject({
		status: 422,
		message: 'A waiver says why, in at least ten characters.'
	});
});

test('a frozen note keeps state, text, results, waiver and title block, and goes on at the next letter', async () => {
	const id = await frozenBy(team.lead, waived);
	const sealed = await latestBaseline(note.id);
	expect(sealed).toMatchObject({
		id,
		revision: 'A',
		waivers: [{ itemId: 'c', reason: REASON }],
		head: {
			note: { number: note.number, creator: team.engineer.name, approver: team.lead.name },
			programme: { code: team.programme.code },
			gate: { kind: 'SRR' },
			seq: 1,
			frozenBy: { id: team.lead.id, name: team.lead.name },
			items: 5,
			figures: 4,
			checks: { holds: 0, thin: 0, fails: 1, waits: 0 }
		}
	});
	expect(sealed!.content.items.map(({ id }) => id)).toEqual(['s', 'al', 'j', 'd', 'c']);
	// The check goes on saying that it fails: 47.2/50 − 1.
	expect(sealed!.results.find(({ id }) => id === 'c')).toMatchObject({
		state: 'fails',
		margin: { value: -0.056 }
	});
	const [after] = await db.select().from(noteTable).where(eq(noteTable.id, note.id));
	expect(after).toMatchObject({ revision: 'B', gateId: gates[1]!.id, seq: 1 });
});

test('the team is mailed and finds the baseline waiting until they have looked; who froze is not', async () => {
	const id = await frozenBy(team.lead, waived);
	const [mail] = await mailsTo(team.observer.email);
	expect(mail!.subject).toBe(`${note.number}: baseline A frozen at SRR`);
	expect(mail!.text).toContain(`/programmes/${team.programme.code}/baselines/${id}`);
	expect(mail!.text).toContain('Failing checks let through by waiver: 1');
	expect(await mailsTo(team.lead.email)).toEqual([]);

	expect(await baselinesWaitingFor(team.observer.id)).toMatchObject([
		{ baselineId: id, noteNumber: note.number, revision: 'A', frozenBy: team.lead.name }
	]);
	await markViewed(id, team.observer.id);
	await markViewed(id, team.observer.id);
	expect(await baselinesWaitingFor(team.observer.id)).toEqual([]);
	expect(await baselinesWaitingFor(team.lead.id)).toEqual([]);
});

test('two leads who freeze at once get one baseline and one clear refusal', async () => {
	const tries = await Promise.allSettled(
		Array.from({ length: 6 }, () => frozenBy(team.lead, waived))
	);
	const refused = tries.filter((one) => one.status === 'rejected');
	expect(refused).toHaveLength(5);
	for (const { reason } of refused) {
		expect(reason).toMatchObject({
			status: 409,
			message: `${note.number} revision A is frozen already; the note is at revision B now.`
		});
	}
	expect(await rows()).toHaveLength(1);
});

test('nothing is frozen unseen: an edit since the lead looked refuses the freeze', async () => {
	await edit(note.id, team.engineer, (doc) => textField(doc, 'j', 'source')!.insert(0, 'Coupons'));
	await expect(frozenBy(team.lead, waived)).rejects.toMatchObject({
		status: 409,
		message: expect.stringContaining('you saw edit 1, it is at edit 2 now'),
		details: { seq: 2 }
	});
	expect(await rows()).toEqual([]);
});

test('an edit committed while the note is computed is not frozen over', async () => {
	const freezing = frozenBy(team.lead, waived).then(
		() => 'frozen',
		({ status }) => status
	);
	const editing = edit(note.id, team.engineer, (doc) =>
		textField(doc, 'j', 'source')!.insert(0, 'Coupons')
	);
	const [outcome] = await Promise.all([freezing, editing]);
	const [sealed] = await rows();
	if (outcome === 'frozen') expect(sealed!.content).not.toContain('Coupons');
	else expect([outcome, sealed]).toEqual([409, undefined]);
});

test('a note without items, and a gate of another programme, are refused', async () => {
	const other = await makeProgramme();
	const foreign = await makeGate(other.programme.id);
	await expect(frozenBy(team.lead, { ...waived, gateId: foreign.id })).rejects.toMatchObject({
		status: 422
	});
	note = await writtenNote(team.programme.id, team.engineer, []);
	await expect(frozenBy(team.lead, { seenSeq: 1 })).rejects.toMatchObject({
		status: 422,
		message: expect.stringContaining('nothing to freeze')
	});
});

test('a file that is not in the programme’s record is in the way', async () => {
	const file = {
		fileId: '6f1c2f7e-3f0c-4b5e-9c61-0f2f3a4b5c6d',
		name: 'coupons.csv',
		mediaType: 'text/csv',
		size: 3,
		sha256: '0'.repeat(64)
	};
	note = await writtenNote(team.programme.id, team.engineer, [
		{ kind: 'evidence', id: 'e', description: 'Coupons', files: [file] }
	]);
	await expect(frozenBy()).rejects.toMatchObject({
		status: 422,
		details: { inTheWay: [{ kind: 'file missing', itemId: 'e' }] }
	});
});

test('only a lead freezes; who is in the programme may read; to others there is no such note', async () => {
	const body = { gateId: gates[0]!.id, revision: 'A', seenSeq: 1, ...waived };
	for (const person of [team.engineer, team.reviewer, team.observer]) {
		await expect(call(post, person, { note: note.id }, { body })).rejects.toMatchObject({
			status: 403
		});
	}
	const stranger = await makePerson();
	await expect(call(post, stranger, { note: note.id }, { body })).rejects.toMatchObject({
		status: 404
	});
	const answer = await call(post, team.lead, { note: note.id }, { body });
	expect(answer.status).toBe(201);
	const listed = await call(list, team.observer, { note: note.id });
	expect(await listed.json()).toMatchObject([{ revision: 'A', waivers: 1 }]);
	await expect(call(list, stranger, { note: note.id })).rejects.toMatchObject({ status: 404 });
});
