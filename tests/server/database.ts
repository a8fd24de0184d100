import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { TEMPLATE } from '../setup/postgres';

/** A fresh database, cloned from a template; the usual one has the present schema and no rows. */
export async function cloneDatabase(
	adminUrl: string,
	template = TEMPLATE
): Promise<{ url: string; name: string }> {
	const name = `test_${randomBytes(6).toString('hex')}`;
	await asAdmin(adminUrl, (admin) => admin.query(`create database ${name} template ${template}`));
	const url = new URL(adminUrl);
	url.pathname = `/${name}`;
	return { url: url.href, name };
}

/** Nobody may be connected to it. */
export async function renameDatabase(adminUrl: string, from: string, to: string): Promise<void> {
	await asAdmin(adminUrl, (admin) => admin.query(`alter database ${from} rename to ${to}`));
}

/** Connections that are still open to the database, by what they ran last. */
export async function openConnections(adminUrl: string, name: string): Promise<string[]> {
	return asAdmin(adminUrl, async (admin) => {
		const { rows } = await admin.query<{ query: string }>(
			'select query from pg_stat_activity where datname = $1',
			[name]
		);
		return rows.map((row) => row.query);
	});
}

export async function dropDatabase(adminUrl: string, name: string): Promise<void> {
	await asAdmin(adminUrl, (admin) => admin.query(`drop database ${name} with (force)`));
}

async function asAdmin<T>(adminUrl: string, work: (admin: pg.Client) => Promise<T>): Promise<T> {
	const admin = new pg.Client({ connectionString: adminUrl });
	await admin.connect();
	try {
		return await work(admin);
	} finally {
		await admin.end();
	}
}
