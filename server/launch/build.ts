/**
 * `npm run build`: SvelteKit's build, and beside it the programs around it, each bundled to one file
 * that needs only the production dependencies.
 */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { build } from 'esbuild';
import { bundleEngineWorker } from '../engine/bundle';
import { digestOfSources, stampBuild } from './build-stamp';

/** Source of each program, by its name in build/. */
const PROGRAMS = {
	serve: 'server/main.ts',
	migrate: 'server/launch/migrate-command.ts',
	'make-administrator': 'server/make-administrator.ts',
	'verify-baseline': 'server/verify-baseline.ts'
};

export async function buildAll(): Promise<void> {
	const digest = digestOfSources();
	// A process of its own: Vite decides by its environment and leaves its plugins' state behind.
	const vite = spawnSync(process.execPath, ['node_modules/vite/bin/vite.js', 'build'], {
		stdio: ['ignore', 'pipe', 'pipe'],
		encoding: 'utf8',
		env: { ...process.env, NODE_ENV: 'production' }
	});
	if (vite.status !== 0) throw new Error(`The build failed:\n${vite.stdout}${vite.stderr}`);

	await build({
		entryPoints: PROGRAMS,
		outdir: 'build',
		bundle: true,
		packages: 'external',
		platform: 'node',
		format: 'esm',
		target: 'node20',
		sourcemap: true,
		logLevel: 'warning'
	});
	await bundleEngineWorker(join('build', 'engine-worker.js'));
	stampBuild(digest);
}

if (process.argv[1] === import.meta.filename)
	await buildAll().catch((error: Error) => {
		console.error(error.message);
		process.exitCode = 1;
	});
