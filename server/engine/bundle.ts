/** Bundles the worker of the server's engine pool into one file that needs nothing beside it. */
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

export async function bundleEngineWorker(outfile: string): Promise<void> {
	await build({
		entryPoints: [fileURLToPath(new URL('worker.ts', import.meta.url))],
		outfile,
		bundle: true,
		platform: 'node',
		format: 'esm',
		target: 'node20',
		logLevel: 'warning'
	});
}
