/** A stand-in for the mail server, for the demo and the tests: takes every mail and delivers none. */
import { randomUUID } from 'node:crypto';
import { mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import PostalMime from 'postal-mime';
import { SMTPServer } from 'smtp-server';

export type CaughtMail = {
	id: string;
	/** ISO 8601. */
	at: string;
	from: string;
	/** Whom the envelope names, whatever the headers say. */
	to: string[];
	subject: string;
	text: string;
};

export type SmtpFake = {
	environment: Record<string, string>;
	/** Oldest first. */
	mails(to?: string): CaughtMail[];
	clear(): Promise<void>;
	stop(): Promise<void>;
};

/** With a folder, caught mails outlive the process. */
export async function startSmtpFake(port: number, folder?: string): Promise<SmtpFake> {
	let caught = folder ? await readKept(folder) : [];

	const server = new SMTPServer({
		authOptional: true,
		disabledCommands: ['STARTTLS'],
		hideSTARTTLS: true,
		disableReverseLookup: true,
		async onData(stream, session, done) {
			const parts: Buffer[] = [];
			for await (const part of stream) parts.push(part as Buffer);
			const parsed = await PostalMime.parse(Buffer.concat(parts));
			const mail: CaughtMail = {
				id: randomUUID(),
				at: new Date().toISOString(),
				from: parsed.from?.address ?? '',
				to: session.envelope.rcptTo.map(({ address }) => address),
				subject: parsed.subject ?? '',
				text: (parsed.text ?? '').trimEnd()
			};
			caught.push(mail);
			if (folder) await writeFile(join(folder, `${mail.id}.json`), JSON.stringify(mail));
			done();
		}
	});
	// A client that hangs up in the middle is its own trouble.
	server.on('error', () => {});
	await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve));
	const address = server.server.address();
	const listening = typeof address === 'object' && address ? address.port : port;

	return {
		environment: { SMTP_URL: `smtp://127.0.0.1:${listening}/?ignoreTLS=true` },
		mails: (to) => (to ? caught.filter((mail) => mail.to.includes(to)) : caught),
		async clear() {
			const gone = caught;
			caught = [];
			if (!folder) return;
			for (const { id } of gone) await rm(join(folder, `${id}.json`), { force: true });
		},
		stop: () => new Promise((resolve) => server.close(resolve))
	};
}

async function readKept(folder: string): Promise<CaughtMail[]> {
	await mkdir(folder, { recursive: true });
	const names = (await readdir(folder)).filter((name) => name.endsWith('.json'));
	const mails = await Promise.all(
		names.map(async (name) => JSON.parse(await readFile(join(folder, name), 'utf8')) as CaughtMail)
	);
	return mails.sort((a, b) => a.at.localeCompare(b.at));
}
