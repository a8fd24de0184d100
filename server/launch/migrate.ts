/**
 * Brings a database to the schema of this version: our tables, then the job queue's.
 *
 * Drizzle's migrator takes no lock, so two processes that start at once would both apply a migration;
 * an advisory lock lets one wait for the other. The lock belongs to the connection: it goes when the
 * process dies.
 */
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import pg from 'pg';
import { installQueues } from '../../src/lib/server/mail/install';

const LOCK = 0x401dfa57;

export async function migrateDatabase(url: string, folder = 'drizzle'): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		await client.query('select pg_advisory_lock($1)', [LOCK]);
		await migrate(drizzle(client), { migrationsFolder: folder });
		await installQueues(client);
	} finally {
		await client.end();
	}
}

/** How many migrations of this version the database has not had; all of them when it is new. */
export async function pendingMigrations(url: string, folder = 'drizzle'): Promise<number> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		const { rows } = await client.query<{ made: boolean }>(
			"select to_regclass('drizzle.__drizzle_migrations') is not null as made"
		);
		const applied = rows[0]?.made
			? (await client.query('select hash from drizzle.__drizzle_migrations')).rows
			: [];
		const hashes = new Set(applied.map((row) => row.hash));
		return readMigrationFiles({ migrationsFolder: folder }).filter(({ hash }) => !hashes.has(hash))
			.length;
	} finally {
		await client.end();
	}
}
