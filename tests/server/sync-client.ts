/** A sync server on a port of its own, and clients of it: raw sockets, the stock provider, the page's session. */
import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { vi } from 'vitest';
import { WebSocket } from 'ws';
import { WebsocketProvider } from 'y-websocket';
import * as Y from 'yjs';
import type { SignedIn } from '$lib/server/auth/sessions';
import { MESSAGE, markMessage, readEvent, readRefused, readSaved } from '$lib/sync/protocol';
import type { Limits } from '$server/sync/limits';
import { SyncServer } from '$server/sync/sync-server';
import type { Evaluate } from '$server/sync/watcher';
import { cookieOf } from './fixtures';

const ORIGIN = process.env.ORIGIN!;

export async function startServer(
	limits: Partial<Limits> = {},
	evaluate: Evaluate = () => Promise.resolve([]),
	/** That of a server that was stopped, to take its place. */
	port = 0
) {
	const sync = new SyncServer(evaluate, limits);
	await sync.start();
	const http = createServer();
	http.on('upgrade', (request, socket, head) => sync.upgrade(request, socket, head));
	await new Promise<void>((resolve) => http.listen(port, '127.0.0.1', resolve));
	return {
		sync,
		url: `ws://127.0.0.1:${(http.address() as AddressInfo).port}`,
		async stop() {
			await sync.stop();
			await new Promise((resolve) => http.close(resolve));
		}
	};
}

export type TestServer = Awaited<ReturnType<typeof startServer>>;

/** A socket that carries headers as a browser of this person would. */
export function socketWith(headers: Record<string, string>): typeof globalThis.WebSocket {
	return class extends WebSocket {
		constructor(url: string) {
			super(url, { headers });
		}
	} as unknown as typeof globalThis.WebSocket;
}

export async function headersOf(person: SignedIn, origin = ORIGIN) {
	return { cookie: await cookieOf(person), origin };
}

/** The stock provider with a document of its own, as any client of the protocol would be. */
export async function join(
	server: { url: string; origin?: string },
	noteId: string,
	person: SignedIn
) {
	const doc = new Y.Doc();
	const provider = new WebsocketProvider(`${server.url}/sync`, noteId, doc, {
		WebSocketPolyfill: socketWith(await headersOf(person, server.origin)),
		disableBc: true
	});
	const saved: number[] = [];
	const refused: string[] = [];
	const events: string[] = [];
	const closed: number[] = [];
	provider.messageHandlers[MESSAGE.SAVED] = (_, decoder) => saved.push(readSaved(decoder).count);
	provider.messageHandlers[MESSAGE.REFUSED] = (_, decoder) => refused.push(readRefused(decoder));
	provider.messageHandlers[MESSAGE.EVENT] = (_, decoder) => events.push(readEvent(decoder).kind);
	provider.on('connection-close', (event) => event && closed.push(event.code));
	await new Promise<void>((resolve) => provider.on('sync', (level) => level && resolve()));
	return {
		doc,
		provider,
		saved,
		refused,
		events,
		closed,
		mark: (count: number) => provider.ws!.send(markMessage(count)),
		leave() {
			provider.destroy();
			doc.destroy();
		}
	};
}

export type Joined = Awaited<ReturnType<typeof join>>;

/** A bare socket. `received` are whole messages by type; `code` is how it was closed. */
export async function rawSocket(server: TestServer, path: string, headers: Record<string, string>) {
	const socket = new WebSocket(server.url + path, { headers });
	const received: { type: number; body: decoding.Decoder }[] = [];
	let code: number | undefined;
	let status: number | undefined;
	socket.on('message', (data: Buffer) => {
		const body = decoding.createDecoder(new Uint8Array(data));
		received.push({ type: decoding.readVarUint(body), body });
	});
	socket.on('close', (closeCode) => (code = closeCode));
	socket.on('unexpected-response', (_request, response) => {
		status = response.statusCode;
		socket.terminate();
	});
	socket.on('error', () => {});
	await vi.waitUntil(() => socket.readyState !== WebSocket.CONNECTING, { interval: 5 });
	return {
		socket,
		received,
		code: () => code,
		status: () => status,
		/** The socket is closed; the answer is its code. */
		closed: () => vi.waitUntil(() => code, { timeout: 4000, interval: 5 }),
		of: (type: number) => received.filter((message) => message.type === type)
	};
}

export function frame(...parts: (number | Uint8Array)[]): Uint8Array {
	const encoder = encoding.createEncoder();
	for (const part of parts) {
		if (typeof part === 'number') encoding.writeVarUint(encoder, part);
		else encoding.writeVarUint8Array(encoder, part);
	}
	return encoding.toUint8Array(encoder);
}

/** A presence message: what a client says of itself, or of another. */
export function says(clientId: number, clock: number, state: unknown): Uint8Array {
	const encoder = encoding.createEncoder();
	encoding.writeVarUint(encoder, 1);
	encoding.writeVarUint(encoder, clientId);
	encoding.writeVarUint(encoder, clock);
	encoding.writeVarString(encoder, JSON.stringify(state));
	return frame(MESSAGE.AWARENESS, encoding.toUint8Array(encoder));
}

/** Waits until something is so; no fixed time. */
export const eventually = (assertion: () => void | Promise<void>, timeout = 8000) =>
	vi.waitFor(assertion, { timeout, interval: 10 });
