/**
 * Mail is queued in the transaction of its cause and sent by a worker of the process afterwards: no
 * mail about what was rolled back, none lost when the mail server is away (see `install.ts` for how
 * long it is tried). A process that dies while it sends may send a mail twice, never not at all.
 */
import type PgBoss from 'pg-boss';
import type { Db } from '../db';
import { log } from '../log';
import { MAIL_QUEUE } from './install';
import { boss, inTransaction } from './jobs';
import { mailSchema, type Mail } from './mail';
import { openTransport, type Transport } from './transport';

let transport: Transport | undefined;

export async function queueMail(tx: Db, mail: Mail): Promise<void> {
	await boss.send(MAIL_QUEUE, mailSchema.parse(mail), { db: inTransaction(tx) });
}

/** Once per process, when it starts to serve. */
export async function startMail(): Promise<void> {
	transport = openTransport();
	boss.on('error', (error) => log.error({ error }, 'The job queue reports an error'));
	await boss.start();
	const options: PgBoss.WorkOptions = { batchSize: 1, pollingIntervalSeconds: 1 };
	const worker = await boss.work<Mail>(MAIL_QUEUE, options, async (jobs) => {
		for (const { id, data } of jobs) await deliver(id, data);
		// Look at once whether another waits, instead of after the polling interval.
		boss.notifyWorker(worker);
	});
}

export async function stopMail(): Promise<void> {
	await boss.stop({ timeout: 5000 });
	boss.removeAllListeners('error');
	transport?.close();
	transport = undefined;
}

async function deliver(id: string, mail: Mail): Promise<void> {
	try {
		await transport?.deliver(mail, id);
	} catch (error) {
		log.warn({ error, job: id, to: mail.to }, 'A mail was not taken; it is tried again');
		throw error;
	}
}
