/**
 * The production process: an HTTP server around SvelteKit's handler, which also hands on WebSockets.
 *
 * It starts to listen only when its settings are whole and the database has this version's schema. On
 * SIGTERM or SIGINT it takes no new connection, lets live notes commit and close, then the requests
 * that still run, then the database. When its launcher dies, it ends as well.
 */
import { createServer } from 'node:http';
import { bodyRefusal } from './body-limits';
import { pendingMigrations } from './launch/migrate';
import { provided } from './lifecycle';
import { settings } from '../src/lib/server/settings';

/** How long an orderly end may take, in milliseconds. */
const GRACE = 8000;

async function start(): Promise<void> {
	const { DATABASE_URL, EVIDENCE_MAX_MB } = settings();
	const pending = await pendingMigrations(DATABASE_URL);
	if (pending > 0)
		throw new Error(
			`The database lacks ${pending} of this version's migrations: run "npm run migrate" first.`
		);

	// The adapter knows one limit for every route; the smaller ones are kept here.
	process.env.BODY_SIZE_LIMIT = `${EVIDENCE_MAX_MB}M`;
	const { handler } = await import(new URL('./handler.js', import.meta.url).href);

	let ending = false;
	const server = createServer((request, response) => {
		response.setHeader('x-content-type-options', 'nosniff');
		response.setHeader('referrer-policy', 'same-origin');
		response.setHeader('cross-origin-opener-policy', 'same-origin');
		if (ending) response.setHeader('connection', 'close');
		const refusal = bodyRefusal(request, EVIDENCE_MAX_MB);
		if (refusal) return refusal.send(response);
		handler(request, response, () => response.writeHead(404).end());
	});
	// A large file over a slow line takes its time; headers do not.
	server.requestTimeout = 20 * 60 * 1000;
	server.headersTimeout = 20 * 1000;

	server.on('upgrade', (request, socket, head) => {
		socket.on('error', () => socket.destroy());
		const upgrade = provided('upgrade');
		if (upgrade && !ending) upgrade(request, socket, head);
		else socket.end('HTTP/1.1 503 Service Unavailable\r\nconnection: close\r\n\r\n');
	});

	async function end(): Promise<void> {
		if (ending) return;
		ending = true;
		setTimeout(() => process.exit(1), GRACE).unref();
		const closed = new Promise((resolve) => server.close(resolve));
		await provided('shutdown')?.();
		server.closeIdleConnections();
		setTimeout(() => server.closeAllConnections(), GRACE / 2).unref();
		await closed;
		await provided('close')?.();
		process.exit(0);
	}
	process.on('SIGTERM', end);
	process.on('SIGINT', end);
	process.on('disconnect', end);

	const host = process.env.HOST ?? '0.0.0.0';
	const port = Number(process.env.PORT ?? 3000);
	server.once('error', fail);
	server.listen(port, host, () => {
		process.send?.('listening');
		console.log(`Holdfast listens on ${host}:${port}`);
	});
}

function fail(error: Error): void {
	console.error(error.message);
	process.exit(1);
}

start().catch(fail);
