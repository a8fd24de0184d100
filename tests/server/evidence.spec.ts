/**
 * Evidence through its routes, on a real database and an S3-compatible store. What the store holds is
 * read back with an independent client (the npm package `minio`).
 */
import { createHash, randomBytes } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { Client } from 'minio';
import { beforeAll, expect, inject, test } from 'vitest';
import './setup';
import { makeGate, makeNote, makePerson, makeProgramme } from './fixtures';

const { db } = await import('$lib/server/db');
const { baseline, baselineEvidence, evidenceFile } = await import('$lib/server/db/schema');
const { POST } = await import('../../src/routes/api/notes/[note]/evidence/+server');
const { GET, DELETE } = await import('../../src/routes/api/evidence/[file]/+server');
const { HEAD } = await import('$lib/server/evidence/media-type');
const { settings } = await import('$lib/server/settings');
const { log } = await import('$lib/server/log');

type Person = Awaited<ReturnType<typeof makePerson>>;
type Stored = { fileId: string; name: string; mediaType: string; size: number; sha256: string };

const PNG = Buffer.from(
	'89504e470d0a1a0a0000000d49484452000000010000000108060000001f15c489',
	'hex'
);
const store = new Client({
	endPoint: '127.0.0.1',
	port: Number(new URL(settings().S3_ENDPOINT).port),
	useSSL: false,
	accessKey: settings().S3_ACCESS_KEY_ID,
	secretKey: settings().S3_SECRET_ACCESS_KEY
});
const bucket = settings().S3_BUCKET;

let team: Awaited<ReturnType<typeof makeProgramme>>;
let note: Awaited<ReturnType<typeof makeNote>>;

beforeAll(async () => {
	team = await makeProgramme();
	note = await makeNote(team.programme.id, team.engineer);
});

function upload(name: string, body: BodyInit | null, person: Person = team.engineer) {
	const url = new URL(`http://localhost/api/notes/${note.id}/evidence`);
	url.searchParams.set('name', name);
	const headers = { 'content-type': 'application/octet-stream' };
	const request = new Request(url, {
		method: 'POST',
		body,
		headers,
		duplex: 'half'
	} as RequestInit);
	const event = { url, request, params: { note: note.id }, locals: { person } };
	return POST(event as never);
}

async function stored(name: string, body: BodyInit): Promise<Stored> {
	return (await upload(name, body)).json();
}

function event(fileId: string, person: Person, headers: HeadersInit = {}) {
	const request = new Request(`http://localhost/api/evidence/${fileId}`, { headers });
	return { request, params: { file: fileId }, locals: { person } } as never;
}

async function objectsOfNote(): Promise<string[]> {
	const names: string[] = [];
	const list = store.listObjectsV2(bucket, `notes/${note.id}/`, true);
	for await (const { name } of list) if (name) names.push(name);
	return names;
}

/** Uploads in parts that were neither completed nor abandoned; the fake keeps each in a folder. */
const openUploads = () => readdir(join(inject('storeFolder'), bucket, '._S3rver_uploads'));

async function digestInStore(fileId: string): Promise<string> {
	const hash = createHash('sha256');
	const object = await store.getObject(bucket, `notes/${note.id}/${fileId}`);
	for await (const chunk of object) hash.update(chunk);
	return hash.digest('hex');
}

test('a large file reaches the store byte for byte, with the digest that is recorded', async () => {
	// Any start could be taken for some kind of file, noughts for none.
	const bytes = randomBytes(12 * 1024 * 1024 + 17).fill(0, 0, HEAD);
	const file = await stored('coupon run 7.bin', bytes);
	const digest = createHash('sha256').update(bytes).digest('hex');
	expect(file).toEqual({
		fileId: expect.any(String),
		name: 'coupon run 7.bin',
		mediaType: 'application/octet-stream',
		size: bytes.length,
		sha256: digest
	});
	expect(await digestInStore(file.fileId)).toBe(digest);
});

test('the kind of a file is told by its bytes, not by its name', async () => {
	expect((await stored('strange.txt', PNG)).mediaType).toBe('image/png');
	expect((await stored('coupons.csv', 'σ;ε\n1;2\n')).mediaType).toBe('text/csv');
	const latin1 = Buffer.from('5 °C', 'latin1');
	expect((await stored('coupons.csv', latin1)).mediaType).toBe('application/octet-stream');
});

test('programs are refused and leave nothing in the store', async () => {
	const before = await objectsOfNote();
	const windows = Buffer.concat([Buffer.from('MZ'), randomBytes(6 * 1024 * 1024)]);
	await expect(upload('report.pdf', windows)).rejects.toMatchObject({ status: 415 });
	await expect(upload('run.bat', 'del *')).rejects.toMatchObject({ status: 415 });
	expect(await objectsOfNote()).toEqual(before);
});

test('a file over the limit is refused while it streams and leaves nothing', async () => {
	const before = await objectsOfNote();
	const chunk = new Uint8Array(1024 * 1024);
	let sent = 0;
	const endless = new ReadableStream({
		pull(controller) {
			sent++;
			controller.enqueue(chunk);
		}
	});
	await expect(upload('endless.dat', endless)).rejects.toMatchObject({ status: 413 });
	expect(sent).toBeLessThan(settings().EVIDENCE_MAX_MB + 40);
	expect(await objectsOfNote()).toEqual(before);
});

test('an upload that is cut off leaves nothing, neither object nor part nor row', async () => {
	log.level = 'silent';
	const [objects, rows] = [await objectsOfNote(), await db.$count(evidenceFile)];
	let sent = 0;
	const cut = new ReadableStream({
		pull(controller) {
			if (sent++ < 12) controller.enqueue(randomBytes(1024 * 1024));
			else controller.error(new Error('connection reset'));
		}
	});
	await expect(upload('cut.dat', cut)).rejects.toMatchObject({ status: 503 });
	expect(await objectsOfNote()).toEqual(objects);
	expect(await openUploads()).toEqual([]);
	expect(await db.$count(evidenceFile)).toBe(rows);
});

test('an empty file and a file without a name are refused with the reason', async () => {
	await expect(upload('empty.csv', '')).rejects.toMatchObject({ status: 422 });
	await expect(upload(' ', 'x')).rejects.toThrow('The file has no name.');
});

test('a picture is shown in place, a page or drawing with scripts is only saved', async () => {
	const show = async (name: string, body: BodyInit) =>
		(await GET(event((await stored(name, body)).fileId, team.observer))).headers;
	expect((await show('joint.png', PNG)).get('content-disposition')).toMatch(/^inline/);
	for (const name of ['page.html', 'drawing.svg']) {
		const headers = await show(name, '<svg xmlns="http://www.w3.org/2000/svg"></svg>');
		expect(headers.get('content-disposition')).toMatch(/^attachment/);
		expect(headers.get('x-content-type-options')).toBe('nosniff');
		expect(headers.get('content-security-policy')).toContain('sandbox');
	}
});

test('a name with signs of any script arrives whole and adds no header', async () => {
	const { fileId, name } = await stored('C:\\lab\\Prüfung "σ"\r\nX: 1.csv', 'a');
	expect(name).toBe('Prüfung "σ" X: 1.csv');
	const header = (await GET(event(fileId, team.lead))).headers.get('content-disposition')!;
	expect(header).toContain('filename="Pr_fung ___ X: 1.csv"');
	expect(decodeURIComponent(header.split("UTF-8''")[1]!)).toBe(name);
});

test('a part of a file is served as asked, and what the browser has is not sent again', async () => {
	const { fileId, sha256 } = await stored('digits.txt', '0123456789');
	const part = await GET(event(fileId, team.reviewer, { range: 'bytes=2-4' }));
	expect(part.status).toBe(206);
	expect(part.headers.get('content-range')).toBe('bytes 2-4/10');
	expect(await part.text()).toBe('234');
	const beyond = await GET(event(fileId, team.reviewer, { range: 'bytes=10-' }));
	expect(beyond.status).toBe(416);
	const same = await GET(event(fileId, team.reviewer, { 'if-none-match': `"${sha256}"` }));
	expect(same.status).toBe(304);
});

test('reviewers and observers read evidence and neither add nor remove it', async () => {
	const { fileId } = await stored('a.txt', 'a');
	for (const person of [team.reviewer, team.observer]) {
		expect(await (await GET(event(fileId, person))).text()).toBe('a');
		await expect(upload('b.txt', 'b', person)).rejects.toMatchObject({ status: 403 });
		await expect(DELETE(event(fileId, person))).rejects.toMatchObject({ status: 403 });
	}
});

test('somebody outside the programme is told that there is no such file', async () => {
	const { fileId } = await stored('a.txt', 'a');
	const stranger = await makePerson();
	await expect(GET(event(fileId, stranger))).rejects.toMatchObject({ status: 404 });
	await expect(GET(event('no-id', stranger))).rejects.toMatchObject({ status: 404 });
});

test('evidence is removed with its object', async () => {
	const { fileId } = await stored('a.txt', 'a');
	expect((await DELETE(event(fileId, team.engineer))).status).toBe(204);
	await expect(GET(event(fileId, team.engineer))).rejects.toMatchObject({ status: 404 });
	await expect(digestInStore(fileId)).rejects.toThrow();
});

test('evidence that a baseline stands on stays', async () => {
	const { fileId } = await stored('frozen.txt', 'frozen');
	const gate = await makeGate(team.programme.id);
	const [frozen] = await db
		.insert(baseline)
		.values({
			noteId: note.id,
			revision: 'A',
			gateId: gate.id,
			seq: 0,
			state: new Uint8Array(),
			head: '{}',
			content: '{}',
			results: '[]',
			evidence: [],
			waivers: [],
			digest: '0'.repeat(64),
			engineVersion: '1',
			frozenBy: team.lead.id
		})
		.returning();
	await db.insert(baselineEvidence).values({ baselineId: frozen!.id, fileId });
	await expect(DELETE(event(fileId, team.lead))).rejects.toThrow(
		'frozen.txt is evidence of baseline A and stays.'
	);
	expect(await (await GET(event(fileId, team.lead))).text()).toBe('frozen');
});
