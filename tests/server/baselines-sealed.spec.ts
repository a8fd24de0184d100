/** What was frozen cannot be changed; where somebody with the rights to do so did, verifying shows it. */
import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import pg from 'pg';
import { afterAll, beforeAll, beforeEach, expect, inject, test } from 'vitest';
import { freeze } from '$lib/server/baselines/freeze';
import { digestOf } from '$lib/server/baselines/digest';
import { findBaseline } from '$lib/server/baselines/read';
import { verifyBaseline } from '$lib/server/baselines/verify';
import { canonicalJson } from '$lib/note/canonical';
import { db } from '$lib/server/db';
import { baseline, baselineEvidence, evidenceFile, note as noteTable } from '$lib/server/db/schema';
import { closeEngine } from '$lib/server/engine/evaluate';
import { deleteObject, putObject } from '$lib/server/evidence/store';
import { POST as verifyRoute } from '../../src/routes/api/baselines/[baseline]/verify/+server';
import { makeGate, makePerson, makeProgramme } from './fixtures';
import { call, writtenNote } from './written-note';

afterAll(closeEngine);

const FILE = 'specimen,strength\n1,110.2\n';
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');

let team: Awaited<ReturnType<typeof makeProgramme>>;
let note: Awaited<ReturnType<typeof writtenNote>>;
let file: typeof evidenceFile.$inferSelect;
let id: string;

beforeAll(async () => {
	team = await makeProgramme();
});

beforeEach(async () => {
	const holder = await writtenNote(team.programme.id, team.engineer, []);
	const objectKey = `test/${crypto.randomUUID()}`;
	await putObject(
		objectKey,
		(async function* () {
			yield Buffer.from(FILE);
		})()
	);
	[file] = (await db
		.insert(evidenceFile)
		.values({
			noteId: holder.id,
			name: 'coupons.csv',
			mediaType: 'text/csv',
			size: FILE.length,
			sha256: sha256(FILE),
			objectKey,
			uploadedBy: team.engineer.id
		})
		.returning()) as [typeof evidenceFile.$inferSelect];
	const gate = await makeGate(team.programme.id);
	note = await writtenNote(team.programme.id, team.engineer, [
		{ kind: 'given', id: 'g', symbol: 'rho', value: '1520', unit: 'kg/m^3' },
		{ kind: 'calculation', id: 'v', symbol: 'v', expression: '1/rho', unit: 'm^3/kg' },
		{
			kind: 'evidence',
			id: 'e',
			description: 'Coupons',
			files: [
				{ fileId: file.id, name: file.name, mediaType: 'text/csv', size: 1, sha256: 'as typed' }
			]
		}
	]);
	const input = { gateId: gate.id, revision: 'A', seenSeq: 1, waivers: [] };
	id = await freeze({ note, programme: team.programme, person: team.lead, input });
});

const verified = async () => verifyBaseline((await findBaseline(id))!);

/** As somebody who may switch triggers off in the database. */
async function tamper(work: (admin: pg.Client) => Promise<unknown>) {
	const url = new URL(inject('adminUrl'));
	url.pathname = new URL(process.env.DATABASE_URL!).pathname;
	const admin = new pg.Client({ connectionString: url.href });
	await admin.connect();
	await admin.query('set session_replication_role = replica');
	await work(admin);
	await admin.end();
}

test('a digest is the SHA-256 of the five texts, one to a line', () => {
	// printf '{"a":1}\n{"items":[]}\n[]\n[]\n[{"itemId":"c","reason":"…"}]' | sha256sum
	const texts = {
		head: '{"a":1}',
		content: '{"items":[]}',
		results: '[]',
		evidence: '[]',
		waivers: '[{"itemId":"c","reason":"…"}]'
	};
	expect(digestOf(texts)).toBe('cefd44a91a33db850415a467df228fffa9443a550d2789a49c35c8d6bfdc319f');
});

test('a baseline just frozen holds in every part', async () => {
	expect(await verified()).toMatchObject({
		holds: true,
		quantities: { agree: 2, of: 2, kinds: { givens: 1, calculations: 1, outputs: 0, checks: 0 } },
		text: { agree: 5, of: 5 },
		evidence: { agree: 1, of: 1 },
		titleBlock: { differ: [] },
		digest: { agrees: true }
	});
});

test('a baseline sealed before an item had all fields of today still holds', async () => {
	const row = (await findBaseline(id))!;
	const content = row.content.replace('"taken":"",', '');
	expect(content).not.toBe(row.content);
	const head = row.head.replace('"revision":"A"', '"revision":"Z"');
	const texts = { ...row, head, content, evidence: canonicalJson(row.evidence), waivers: '[]' };
	const [older] = await db
		.insert(baseline)
		.values({ ...row, id: undefined, revision: 'Z', head, content, digest: digestOf(texts) })
		.returning();
	expect(await verifyBaseline(older!)).toMatchObject({
		holds: true,
		quantities: { agree: 2, of: 2 },
		text: { agree: 5, of: 5 },
		digest: { agrees: true }
	});
});

test('the stored texts are canonical, and sha256sum finds the same digest', async () => {
	const row = (await findBaseline(id))!;
	expect(row.content).toBe(
		'{"format":"holdfast-note","items":[' +
			'{"description":"","id":"g","kind":"given","source":"","symbol":"rho","taken":"","uncertainty":"","unit":"kg/m^3","value":"1520"},' +
			'{"description":"","digits":"","expression":"1/rho","id":"v","kind":"calculation","symbol":"v","unit":"m^3/kg"},' +
			`{"description":"Coupons","files":[{"fileId":"${file.id}","mediaType":"text/csv","name":"coupons.csv","sha256":"as typed","size":1}],"id":"e","kind":"evidence"}` +
			'],"thinLimit":"0.10","version":1}'
	);
	// 1/1520 at twelve significant digits.
	expect(row.results).toContain('"si":0.000657894736842');
	const evidence = `[{"fileId":"${file.id}","name":"coupons.csv","sha256":"${sha256(FILE)}","size":${FILE.length}}]`;
	const input = [row.head, row.content, row.results, evidence, '[]'].join('\n');
	const [found] = execFileSync('sha256sum', { input }).toString().split(' ');
	expect(row.digest).toBe(found);
});

test('the database refuses to change, delete or empty baselines and their evidence', async () => {
	const refused = (statement: ReturnType<typeof sql>) =>
		expect(db.execute(statement)).rejects.toMatchObject({
			cause: { code: '23001', message: expect.stringContaining('cannot be changed') }
		});
	await refused(sql`update baseline set digest = digest where id = ${id}`);
	await refused(sql`update baseline set revision = 'Z'`);
	await refused(sql`delete from baseline where id = ${id}`);
	await refused(sql`truncate baseline cascade`);
	await refused(sql`update baseline_evidence set file_id = file_id where baseline_id = ${id}`);
	await refused(sql`delete from baseline_evidence where baseline_id = ${id}`);
	await refused(sql`truncate baseline_evidence`);
	expect((await verified()).holds).toBe(true);
});

test('neither the evidence nor the note nor the programme that a baseline stands on can be removed', async () => {
	const stands = { cause: { code: expect.stringMatching(/^23(001|503)$/) } };
	await expect(db.delete(evidenceFile).where(eq(evidenceFile.id, file.id))).rejects.toMatchObject(
		stands
	);
	await expect(db.delete(noteTable).where(eq(noteTable.id, note.id))).rejects.toMatchObject(stands);
	await expect(
		db.execute(sql`delete from programme where id = ${team.programme.id}`)
	).rejects.toMatchObject(stands);
	expect(
		await db.select().from(baselineEvidence).where(eq(baselineEvidence.baselineId, id))
	).toHaveLength(1);
});

test.each([
	// One unit in the twelfth digit is within what platforms differ by; the digest tells it all the same.
	['results', '0.000657894736842', '0.000657894736843', { quantities: { differ: [] } }],
	['content', '"value":"1520"', '"value":"1521"', { text: { differ: ['0.1'] } }],
	['head', '"revision":"A"', '"revision":"B"', { titleBlock: { differ: ['revision'] } }]
])('one digit changed in the stored %s is found', async (column, was, is, found) => {
	await tamper((admin) =>
		admin.query(`update baseline set ${column} = replace(${column}, $1, $2) where id = $3`, [
			was,
			is,
			id
		])
	);
	expect(await verified()).toMatchObject({ holds: false, digest: { agrees: false }, ...found });
});

test('a figure that was changed, with a new digest over it, is found by recomputing', async () => {
	const row = (await findBaseline(id))!;
	const results = row.results.replaceAll('0.000657894736842', '0.000667894736842');
	expect(results).not.toBe(row.results);
	const digest = digestOf({
		head: row.head,
		content: row.content,
		results,
		evidence: `[{"fileId":"${file.id}","name":"coupons.csv","sha256":"${sha256(FILE)}","size":${FILE.length}}]`,
		waivers: '[]'
	});
	await tamper((admin) =>
		admin.query('update baseline set results = $1, digest = $2 where id = $3', [
			results,
			digest,
			id
		])
	);
	expect(await verified()).toMatchObject({
		holds: false,
		digest: { agrees: true },
		quantities: { agree: 1, of: 2, differ: ['0.2 v'] }
	});
});

test('a column that no longer says what was sealed is found', async () => {
	await tamper((admin) =>
		admin.query(`update baseline set revision = 'F', seq = 7 where id = $1`, [id])
	);
	expect(await verified()).toMatchObject({
		holds: false,
		digest: { agrees: true },
		titleBlock: { differ: ['revision', 'edit'] }
	});
});

test('a waiver slipped in afterwards, and texts that cannot be read any more, are found', async () => {
	await tamper((admin) =>
		admin.query(
			`update baseline set waivers = '[{"itemId":"v","reason":"slipped in"}]' where id = $1`,
			[id]
		)
	);
	expect((await verified()).digest.agrees).toBe(false);
	await tamper((admin) =>
		admin.query(`update baseline set content = '{"items"', state = '\\x00ff' where id = $1`, [id])
	);
	expect(await verified()).toMatchObject({ holds: false, text: { differ: ['cannot be read'] } });
});

test('evidence that was exchanged in the store, or is gone from it, is found', async () => {
	await putObject(
		file.objectKey,
		(async function* () {
			yield Buffer.from(FILE.replace('110.2', '112.2'));
		})()
	);
	expect((await verified()).evidence).toEqual({ agree: 0, of: 1, differ: ['coupons.csv'] });
	await putObject(
		file.objectKey,
		(async function* () {
			yield Buffer.from(`${FILE}2,109.0\n`);
		})()
	);
	expect((await verified()).evidence.differ).toEqual(['coupons.csv']);
	await deleteObject(file.objectKey);
	expect(await verified()).toMatchObject({
		holds: false,
		evidence: { differ: ['coupons.csv (not in the store)'] }
	});
});

test('another version of the engine is told, and is no fault where the figures agree', async () => {
	await tamper((admin) =>
		admin.query(`update baseline set engine_version = '0' where id = $1`, [id])
	);
	expect(await verified()).toMatchObject({
		engine: { frozenWith: '0' },
		titleBlock: { differ: ['engine version'] }
	});
});

test('a baseline of the first engine, which told no uncertainty of what follows, still holds', async () => {
	const gate = await makeGate(team.programme.id);
	const other = await writtenNote(team.programme.id, team.engineer, [
		{ kind: 'given', id: 'g', symbol: 'rho', value: '1520', unit: 'kg/m^3', uncertainty: '20' },
		{ kind: 'calculation', id: 'v', symbol: 'v', expression: '1/rho', unit: 'm^3/kg' }
	]);
	const input = { gateId: gate.id, revision: 'A', seenSeq: 1, waivers: [] };
	id = await freeze({ note: other, programme: team.programme, person: team.lead, input });
	const row = (await findBaseline(id))!;
	// 20/1520², at twelve significant digits.
	expect(row.results).toContain('"uncertainty":0.00000865650969529');
	const older = {
		head: row.head.replace(/"engineVersion":"\d+"/, '"engineVersion":"1"'),
		content: row.content,
		results: row.results.replace('0.00000865650969529', 'null'),
		evidence: '[]',
		waivers: '[]'
	};
	await tamper((admin) =>
		admin.query(
			`update baseline set head = $1, results = $2, digest = $3, engine_version = '1' where id = $4`,
			[older.head, older.results, digestOf(older), id]
		)
	);
	expect(await verified()).toMatchObject({ holds: true, engine: { frozenWith: '1' } });
	const without = {
		...older,
		results: older.results.replace('"uncertainty":20', '"uncertainty":21')
	};
	await tamper((admin) =>
		admin.query('update baseline set results = $1, digest = $2 where id = $3', [
			without.results,
			digestOf(without),
			id
		])
	);
	expect(await verified()).toMatchObject({ holds: false, quantities: { differ: ['0.1 rho'] } });
});

test('everybody in the programme may verify; to others there is no such baseline', async () => {
	const answer = await call(verifyRoute, team.observer, { baseline: id });
	expect(await answer.json()).toMatchObject({ holds: true });
	for (const [person, params] of [
		[await makePerson(), { baseline: id }],
		[team.lead, { baseline: crypto.randomUUID() }],
		[team.lead, { baseline: "' or 1=1" }]
	] as const) {
		await expect(call(verifyRoute, person, params)).rejects.toMatchObject({ status: 404 });
	}
	await expect(call(verifyRoute, null, { baseline: id })).rejects.toMatchObject({ status: 401 });
});

test('at a terminal it ends with 0 when the baseline holds, 1 when it does not, 2 when there is none', async () => {
	const run = (which: string) => {
		try {
			const options = { env: process.env, encoding: 'utf8', stdio: 'pipe' } as const;
			return {
				code: 0,
				out: execFileSync('npx', ['tsx', 'server/verify-baseline.ts', which], options)
			};
		} catch (error) {
			const { status, stdout, stderr } = error as {
				status: number;
				stdout: string;
				stderr: string;
			};
			return { code: status, out: stdout + stderr };
		}
	};
	const holds = run(`${note.number}/A`);
	expect(holds.out).toContain(`${note.number}/A: holds`);
	expect(holds.out).toContain('Quantities  2 of 2 agree');
	expect(holds.code).toBe(0);
	await tamper((admin) => admin.query(`update baseline set seq = 7 where id = $1`, [id]));
	const broken = run(id);
	expect(broken.out).toContain('DOES NOT HOLD');
	expect(broken.out).toContain('differ: edit');
	expect(broken.code).toBe(1);
	expect(run('CL-DN-999/A')).toEqual({ code: 2, out: 'There is no baseline CL-DN-999/A.\n' });
}, 60_000);
