import { createTransport } from 'nodemailer';
import { settings } from '../settings';
import type { Mail } from './mail';

export type Transport = { deliver(mail: Mail, id: string): Promise<void>; close(): void };

/** Hands mails to the server of SMTP_URL; a mail that is tried again keeps its Message-ID. */
export function openTransport(): Transport {
	const { SMTP_URL, MAIL_FROM, ORIGIN } = settings();
	const transport = createTransport(SMTP_URL, { from: MAIL_FROM });
	return {
		async deliver({ to, subject, text }, id) {
			await transport.sendMail({
				// An object is one address and is never read as a list.
				to: { name: '', address: to },
				subject,
				text,
				messageId: `<${id}@${new URL(ORIGIN).hostname}>`,
				// RFC 3834: answering machines keep quiet.
				headers: { 'Auto-Submitted': 'auto-generated' }
			});
		},
		close: () => transport.close()
	};
}
