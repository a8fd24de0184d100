/**
 * Before each file of tests that need a database: its own database, its own mail server and the
 * environment that the code under test reads when it is imported. After it: nothing may be left open.
 */
import { afterAll, expect, inject, vi } from 'vitest';
import { startSmtpFake } from '../../server/fakes/smtp';
import { cloneDatabase, dropDatabase, openConnections } from './database';

const adminUrl = inject('adminUrl');
const database = await cloneDatabase(adminUrl);
const smtp = await startSmtpFake(0);

Object.assign(process.env, inject('store'), smtp.environment, {
	DATABASE_URL: database.url,
	ENGINE_WORKER: inject('engineWorker'),
	ORIGIN: 'http://127.0.0.1:4173'
});

/** Mails that the code under test has sent, oldest first. */
export const sentMails = smtp.mails;

afterAll(async () => {
	const { pool } = await import('../../src/lib/server/db');
	// A query of the mail worker may be under way; a client that was forgotten stays away.
	await vi.waitFor(() => {
		const borrowed = pool.totalCount - pool.idleCount;
		expect(borrowed, 'database clients that were taken and not given back').toBe(0);
	}, 2000);
	await pool.end();
	await smtp.stop();
	// The server notices a closed connection a moment later.
	await vi.waitFor(async () => expect(await openConnections(adminUrl, database.name)).toEqual([]), {
		timeout: 2000
	});
	await dropDatabase(adminUrl, database.name);
});
