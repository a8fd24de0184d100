import pg from 'pg';
import { expect, inject, test } from 'vitest';
import { migrateDatabase, pendingMigrations } from '../../server/launch/migrate';
import { openConnections } from './database';

async function freshDatabase(name: string): Promise<string> {
	const admin = new pg.Client({ connectionString: inject('adminUrl') });
	await admin.connect();
	await admin.query(`create database ${name}`);
	await admin.end();
	const url = new URL(inject('adminUrl'));
	url.pathname = `/${name}`;
	return url.href;
}

test('processes that start at once migrate a database once', async () => {
	const url = await freshDatabase('migrated_at_once');
	expect(await pendingMigrations(url)).toBeGreaterThan(0);
	await Promise.all([migrateDatabase(url), migrateDatabase(url), migrateDatabase(url)]);
	expect(await pendingMigrations(url)).toBe(0);

	const client = new pg.Client({ connectionString: url });
	await client.connect();
	const applied = await client.query('select hash from drizzle.__drizzle_migrations');
	expect(new Set(applied.rows.map((row) => row.hash)).size).toBe(applied.rowCount);
	expect((await client.query('select name from jobs.queue')).rows).toEqual([{ name: 'mail' }]);
	await client.end();
});

test('a migration that is broken off leaves no lock behind', async () => {
	const url = await freshDatabase('migrated_in_vain');
	await expect(migrateDatabase(url, 'no/such/folder')).rejects.toThrow('_journal.json');
	await migrateDatabase(url);
	expect(await openConnections(inject('adminUrl'), 'migrated_in_vain')).toEqual([]);
});
