/** The production build as a process: how it starts, what it refuses, how it ends. */
import { spawn } from 'node:child_process';
import { request } from 'node:http';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, expect, inject, test, vi } from 'vitest';
import { cloneDatabase, dropDatabase } from '../server/database';
import { cookieOf, makeNote, makeProgramme } from '../server/fixtures';
import '../server/setup';
import { serve, type Served } from '../setup/serve';

const { db } = await import('$lib/server/db');
const { evidenceFile } = await import('$lib/server/db/schema');

const services = () => ({
	DATABASE_URL: process.env.DATABASE_URL!,
	SMTP_URL: process.env.SMTP_URL!,
	...inject('store')
});

let site: Served;
let cookie: string;
let uploads: string;

beforeAll(async () => {
	site = await serve(services());
	const { programme, engineer } = await makeProgramme();
	const note = await makeNote(programme.id, engineer);
	cookie = await cookieOf(engineer);
	uploads = `${site.origin}/api/notes/${note.id}/evidence`;
});

afterAll(() => site.stop());

/** What a program says and its exit code, with only the environment given. */
function outcome(script: string, env: Record<string, string>) {
	return new Promise<{ code: number | null; said: string }>((resolve) => {
		const child = spawn(process.execPath, [script], { env });
		let said = '';
		child.stdout.on('data', (text) => (said += text));
		child.stderr.on('data', (text) => (said += text));
		child.once('exit', (code) => resolve({ code, said }));
	});
}

test('a start without its settings is refused and every missing one is named', async () => {
	const { code, said } = await outcome('build/serve.js', { S3_BUCKET: 'evidence' });
	expect(code).toBe(1);
	for (const name of ['DATABASE_URL', 'ORIGIN', 'S3_ENDPOINT', 'S3_ACCESS_KEY_ID', 'SMTP_URL'])
		expect(said).toContain(`${name} is not set`);
	expect(said).not.toContain('S3_BUCKET');
});

test('a start on a database of another version is refused with what to do', async () => {
	const { name, url } = await cloneDatabase(inject('adminUrl'), 'template1');
	const refused = serve({ ...services(), DATABASE_URL: url });
	await expect(refused).rejects.toThrow('run "npm run migrate" first');

	const [one, other] = await Promise.all([
		outcome('build/migrate.js', { DATABASE_URL: url }),
		outcome('build/migrate.js', { DATABASE_URL: url })
	]);
	expect([one.code, other.code]).toEqual([0, 0]);
	const started = await serve({ ...services(), DATABASE_URL: url });
	await started.stop();
	await dropDatabase(inject('adminUrl'), name);
});

test('an orderly end leaves no connection to the database and says that all went well', async () => {
	const { name, url } = await cloneDatabase(inject('adminUrl'));
	const started = await serve({ ...services(), DATABASE_URL: url });
	// Its connection is kept alive and must not hold up the end.
	await (await fetch(`${started.origin}/sign-in`)).text();
	await started.stop();
	expect(started.process.exitCode).toBe(0);
	const admin = new pg.Client({ connectionString: inject('adminUrl') });
	await admin.connect();
	const open = await admin.query('select from pg_stat_activity where datname = $1', [name]);
	await admin.end();
	expect(open.rowCount).toBe(0);
	await dropDatabase(inject('adminUrl'), name);
});

test('the server ends when what started it is gone', async () => {
	const started = await serve(services());
	const exit = new Promise((resolve) => started.process.once('exit', resolve));
	started.process.disconnect();
	expect(await exit).toBe(0);
});

test('answers carry the headers that keep a browser from guessing and framing', async () => {
	const { headers } = await fetch(`${site.origin}/sign-in`);
	expect(headers.get('x-content-type-options')).toBe('nosniff');
	expect(headers.get('referrer-policy')).toBe('same-origin');
	expect(headers.get('content-security-policy')).toContain("frame-ancestors 'none'");
	expect(headers.get('content-security-policy')).not.toMatch(/script-src[^;]*unsafe-inline/);
});

test('a form of a megabyte is refused before it is read', async () => {
	const body = 'email='.padEnd(1024 * 1024, 'a');
	const headers = { origin: site.origin, 'content-type': 'application/x-www-form-urlencoded' };
	const answer = await fetch(`${site.origin}/sign-in`, { method: 'POST', headers, body });
	expect(answer.status).toBe(413);
	expect(await answer.json()).toMatchObject({ title: 'Too large' });
});

test('evidence of many megabytes passes, and its reader gets it byte for byte', async () => {
	const body = new Uint8Array(20 * 1024 * 1024).map((_, at) => at % 251);
	const headers = { cookie, origin: site.origin, 'content-type': 'application/octet-stream' };
	const answer = await fetch(`${uploads}?name=run.dat`, { method: 'POST', headers, body });
	expect(answer.status).toBe(201);
	const { fileId } = await answer.json();
	const back = await fetch(`${site.origin}/api/evidence/${fileId}`, { headers: { cookie } });
	expect(Buffer.from(await back.arrayBuffer()).equals(Buffer.from(body))).toBe(true);
});

test('somebody who uploads a program hears why it is refused', async () => {
	const body = new Uint8Array(8 * 1024 * 1024);
	const headers = { cookie, origin: site.origin, 'content-type': 'application/octet-stream' };
	const answer = await fetch(`${uploads}?name=setup.exe`, { method: 'POST', headers, body });
	expect(answer.status).toBe(415);
	expect(await answer.json()).toMatchObject({
		detail: 'setup.exe is a program; programs are not taken as evidence.'
	});
});

test('an upload whose connection breaks leaves nothing', async () => {
	const rows = await db.$count(evidenceFile);
	const parts = () => readdir(join(inject('storeFolder'), 'evidence', '._S3rver_uploads'));
	const sending = request(`${uploads}?name=cut.dat`, {
		method: 'POST',
		headers: {
			cookie,
			origin: site.origin,
			'content-type': 'application/octet-stream',
			'content-length': 30 * 1024 * 1024
		}
	});
	sending.on('error', () => {});
	sending.write(Buffer.alloc(12 * 1024 * 1024));
	await vi.waitFor(async () => expect(await parts()).toHaveLength(1), { timeout: 10_000 });
	sending.destroy();
	await vi.waitFor(async () => expect(await parts()).toHaveLength(0), { timeout: 10_000 });
	expect(await db.$count(evidenceFile)).toBe(rows);
});
