/** In development, hands WebSockets on to the live notes as `main.ts` does in production. */
import type { AddressInfo } from 'node:net';
import type { Plugin } from 'vite';
import { provided } from './lifecycle.ts';

export function liveSockets(): Plugin {
	return {
		name: 'holdfast-live-sockets',
		apply: 'serve',
		configureServer({ httpServer }) {
			httpServer?.on('upgrade', async (request, socket, head) => {
				// Vite's own sockets, for hot reload.
				if (request.headers['sec-websocket-protocol']?.startsWith('vite-')) return;
				socket.on('error', () => socket.destroy());
				// SvelteKit runs hooks' `init` with its first request; a page that reconnects may come earlier.
				if (!provided('upgrade')) {
					const { port, address } = httpServer.address() as AddressInfo;
					await fetch(`http://${address}:${port}/sign-in`).catch(() => {});
				}
				const upgrade = provided('upgrade');
				if (upgrade) upgrade(request, socket, head);
				else socket.destroy();
			});
		}
	};
}
