/** The caught mails over HTTP: a page for people, JSON for tests (GET, DELETE /mails). */
import { createServer } from 'node:http';
import type { CaughtMail, SmtpFake } from './smtp';

export type MailPage = { environment: Record<string, string>; stop(): Promise<void> };

export async function startMailPage(smtp: SmtpFake, port: number): Promise<MailPage> {
	const server = createServer(async (request, response) => {
		const url = new URL(request.url ?? '/', 'http://localhost');
		if (url.pathname === '/mails' && request.method === 'DELETE') {
			await smtp.clear();
			response.writeHead(204).end();
		} else if (url.pathname === '/mails' && request.method === 'GET') {
			const mails = smtp.mails(url.searchParams.get('to') ?? undefined);
			response.writeHead(200, { 'content-type': 'application/json' }).end(JSON.stringify(mails));
		} else if (url.pathname === '/' && request.method === 'GET') {
			response
				.writeHead(200, {
					'content-type': 'text/html; charset=utf-8',
					// Attack stopped here: a mail is text that others wrote; nothing in it may run.
					'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'"
				})
				.end(page(smtp.mails()));
		} else response.writeHead(404).end();
	});
	await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve));
	const address = server.address();
	const listening = typeof address === 'object' && address ? address.port : port;

	return {
		environment: { MAIL_VIEWER_URL: `http://localhost:${listening}` },
		stop() {
			server.closeAllConnections();
			return new Promise((resolve) => server.close(() => resolve()));
		}
	};
}

function page(mails: CaughtMail[]): string {
	const list = [...mails]
		.reverse()
		.map(
			({ at, from, to, subject, text }) =>
				`<article><h2>${escaped(subject)}</h2>` +
				`<p>${escaped(at.slice(0, 16).replace('T', ' '))} UTC · from ${escaped(from)} · to ${escaped(to.join(', '))}</p>` +
				`<pre>${linked(escaped(text))}</pre></article>`
		);
	return `<!doctype html><html lang="en"><meta charset="utf-8"><title>Caught mails · Holdfast</title>
<style>
:root { color-scheme: light dark }
body { font: 15px/1.5 system-ui, sans-serif; max-width: 46rem; margin: 2rem auto; padding: 0 1rem }
article { border-top: 1px solid; margin-top: 1.5rem }
h2 { font-size: 1rem; margin-bottom: 0 }
pre { font: inherit; white-space: pre-wrap; overflow-wrap: anywhere }
</style>
<h1>Caught mails</h1>
<p>No mail leaves this machine: every mail of the demo is kept here, the newest first.</p>
${list.join('') || '<p>None yet.</p>'}</html>`;
}

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const escaped = (text: string) => text.replace(/[&<>"]/g, (sign) => ENTITIES[sign]!);

/** Addresses in text that is already escaped. */
const linked = (text: string) =>
	text.replace(
		/https?:\/\/[^\s<>"]*[^\s<>".,;:)]/g,
		(address) => `<a href="${address}">${address}</a>`
	);
