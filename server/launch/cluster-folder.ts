/** Where the private cluster of this checkout lies. */
import { createHash } from 'node:crypto';
import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { DATA } from './installation';
import { reachable, stopAbandoned } from './postgres';

/**
 * In .data; but PostgreSQL does not run as root, and its account cannot reach a checkout in root's
 * home: then in /var/lib, under a name of the checkout. What lies there without .data knowing of it
 * belonged to a .data that was removed, and goes as well.
 */
export async function clusterFolder(): Promise<string> {
	if (await reachable(DATA)) return join(DATA, 'postgres');
	const name = createHash('sha256').update(DATA).digest('hex').slice(0, 12);
	const folder = join('/var/lib/holdfast', name, 'postgres');
	mkdirSync(join(folder, '..'), { recursive: true, mode: 0o711 });
	await stopAbandoned(folder);
	rmSync(folder, { recursive: true, force: true });
	return folder;
}
