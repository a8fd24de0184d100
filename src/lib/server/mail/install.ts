/** The job queue's own tables and our queues in it; part of migrating the database. */
import PgBoss from 'pg-boss';
import type { ClientBase } from 'pg';

export const QUEUE_SCHEMA = 'jobs';
export const MAIL_QUEUE = 'mail';

/** Safe to repeat; `client` holds the migration lock. */
export async function installQueues(client: ClientBase): Promise<void> {
	const boss = new PgBoss({
		schema: QUEUE_SCHEMA,
		db: { executeSql: (text, values) => client.query(text, values) },
		supervise: false,
		schedule: false
	});
	await boss.start();
	await boss.createQueue(MAIL_QUEUE, {
		name: MAIL_QUEUE,
		// 20 s, doubling with jitter: tries for about eleven hours before it is given up.
		retryLimit: 11,
		retryDelay: 20,
		retryBackoff: true,
		expireInSeconds: 120
	});
	await boss.stop({ graceful: false });
}
