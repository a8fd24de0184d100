/** The job queue over the same database as everything else. */
import PgBoss from 'pg-boss';
import { sql, type SQL } from 'drizzle-orm';
import { pool, type Db } from '../db';
import { QUEUE_SCHEMA } from './install';

export const boss = new PgBoss({
	schema: QUEUE_SCHEMA,
	db: { executeSql: (text, values) => pool.query(text, values) },
	// Tables are made when the database is migrated.
	migrate: false,
	schedule: false,
	// Mails carry tokens: what is done is not kept for long.
	archiveCompletedAfterSeconds: 3600,
	deleteAfterHours: 24
});

/** Lets the queue write within a transaction of ours: the job exists only if its cause does. */
export function inTransaction(tx: Db): PgBoss.Db {
	return { executeSql: async (text, values) => tx.execute(withValues(text, values)) };
}

/** Text with $1, $2 … as Drizzle's query, which numbers its parameters itself. */
function withValues(text: string, values: unknown[]): SQL {
	const chunks = text
		.split(/\$(\d+)/)
		// Every other piece is the number of a parameter.
		.map((piece, at) => (at % 2 ? sql`${sql.param(values[Number(piece) - 1])}` : sql.raw(piece)));
	return sql.join(chunks);
}
