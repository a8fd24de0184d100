import { afterEach, expect, test, vi } from 'vitest';
import { sentMails } from './setup';

const { db } = await import('$lib/server/db');
const { queueMail, startMail, stopMail } = await import('$lib/server/mail/queue');

afterEach(stopMail);

const within = { timeout: 8000, interval: 20 };
const mail = {
	to: 'n.aubert@halden.example',
	subject: 'Baseline B frozen',
	text: 'See CL-DN-004.'
};

test('a mail queued in a transaction arrives after the commit', async () => {
	await startMail();
	await db.transaction((tx) => queueMail(tx, mail));
	await vi.waitFor(
		() => expect(sentMails(mail.to)).toMatchObject([{ ...mail, to: [mail.to] }]),
		within
	);
});

test('a mail whose transaction is rolled back is never sent', async () => {
	const failed = db.transaction(async (tx) => {
		await queueMail(tx, { ...mail, to: 'nobody@halden.example' });
		throw new Error('rolled back');
	});
	await expect(failed).rejects.toThrow('rolled back');

	await startMail();
	await queueMail(db, { ...mail, to: 'after@halden.example' });
	await vi.waitFor(() => expect(sentMails('after@halden.example')).toHaveLength(1), within);
	expect(sentMails('nobody@halden.example')).toEqual([]);
});

test('many mails do not wait for each other', async () => {
	await startMail();
	const to = 'everybody@halden.example';
	for (let n = 0; n < 30; n++) await queueMail(db, { ...mail, to, subject: `Mail ${n}` });
	await vi.waitFor(() => expect(sentMails(to)).toHaveLength(30), within);
});

test('line breaks in a subject add no header', async () => {
	await startMail();
	const to = 'header@halden.example';
	await queueMail(db, { ...mail, to, subject: 'Title\r\nBcc: other@halden.example\r\n\r\nbody' });
	await vi.waitFor(() => expect(sentMails(to)).toHaveLength(1), within);
	expect(sentMails(to)[0]).toMatchObject({
		to: [to],
		subject: 'Title Bcc: other@halden.example body',
		text: mail.text
	});
});

test('an address that names more than one person is refused', async () => {
	const to = 'a@halden.example, b@halden.example';
	await expect(queueMail(db, { ...mail, to })).rejects.toThrow(/email/i);
});
