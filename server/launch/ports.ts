import { createServer } from 'node:net';

/** `preferred` when nobody listens there on loopback, else a port the system says is free. */
export async function freePort(preferred = 0): Promise<number> {
	return (await tryPort(preferred)) ?? (await tryPort(0))!;
}

function tryPort(port: number): Promise<number | null> {
	return new Promise((resolve) => {
		const probe = createServer();
		probe.once('error', () => resolve(null));
		probe.listen(port, '127.0.0.1', () => {
			const address = probe.address();
			probe.close(() => resolve(typeof address === 'object' && address ? address.port : null));
		});
	});
}
