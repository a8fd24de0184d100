import { expect, test, vi } from 'vitest';
import { startSmtpFake } from '../../server/fakes/smtp';
import { freePort } from '../../server/launch/ports';
import './setup';

const port = await freePort();
process.env.SMTP_URL = `smtp://127.0.0.1:${port}/?ignoreTLS=true`;
const { db } = await import('$lib/server/db');
const { log } = await import('$lib/server/log');
const { queueMail, startMail, stopMail } = await import('$lib/server/mail/queue');

test('a mail waits while the mail server is away and goes out when it is back', async () => {
	log.level = 'silent';
	const within = { timeout: 8000, interval: 20 };
	const to = 'n.aubert@halden.example';
	await startMail();
	await queueMail(db, { to, subject: 'Invitation', text: 'Open the link.' });

	const states = async () => (await db.execute('select state from jobs.job')).rows;
	await vi.waitFor(async () => expect(await states()).toEqual([{ state: 'retry' }]), within);

	const smtp = await startSmtpFake(port);
	// The next try is due in 20 s or more; it is brought forward here.
	await db.execute('update jobs.job set start_after = now()');
	await vi.waitFor(() => expect(smtp.mails(to)).toHaveLength(1), within);
	await vi.waitFor(async () => expect(await states()).toEqual([{ state: 'completed' }]), within);

	await stopMail();
	await smtp.stop();
});
