/** A sync server alone in a process of its own, for killing. Tells its parent when it listens. */
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { SyncServer } from '$server/sync/sync-server';

const sync = new SyncServer(() => Promise.resolve([]));
await sync.start();
const http = createServer();
http.on('upgrade', (request, socket, head) => sync.upgrade(request, socket, head));
http.listen(Number(process.env.PORT), '127.0.0.1', () =>
	process.send!((http.address() as AddressInfo).port)
);
