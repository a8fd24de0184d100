/** The sync server of this process, for the hooks to start. */
import { evaluateContent } from '$lib/server/engine/evaluate';
import { provide, provided } from '../lifecycle';
import { SyncServer } from './sync-server';

export async function startSync(): Promise<void> {
	// In development the modules are loaded anew after an edit; the server of the old ones ends.
	await stopSync();
	const server = new SyncServer(evaluateContent);
	await server.start();
	provide('upgrade', (request, socket, head) => server.upgrade(request, socket, head));
	provide('shutdown', () => server.stop());
}

/** Ends the live side after its last commit. */
export async function stopSync(): Promise<void> {
	await provided('shutdown')?.();
}
