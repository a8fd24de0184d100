/** Writes the demo programmes in a process of its own. */
import { spawn } from 'node:child_process';

/** Not waited for synchronously: the stores that it writes to may be served by this process. */
export async function runSeed(environment: Record<string, string>): Promise<void> {
	const child = spawn(process.execPath, ['--import', 'tsx', 'server/seed/run.ts'], {
		stdio: ['ignore', 'inherit', 'inherit'],
		env: { ...process.env, ...environment }
	});
	const code = await new Promise((resolve) => child.once('exit', resolve));
	if (code !== 0) throw new Error('The demo programmes cannot be written (see above).');
}
