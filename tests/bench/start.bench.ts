/**
 * The engine's start: from a new thread on Node to its first result, with the bundle that a browser gets
 * in a worker; and what that bundle weighs. A browser adds what it takes to fetch it.
 */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { Worker } from 'node:worker_threads';
import { gzipSync } from 'node:zlib';
import { build } from 'esbuild';
import { afterAll, bench, describe } from 'vitest';
import type { ToWorker } from '../../src/lib/evaluation/messages';

const folder = mkdtempSync(join(tmpdir(), 'holdfast-bench-'));
afterAll(() => rmSync(folder, { recursive: true }));

const outfile = join(folder, 'worker.mjs');
await build({
	entryPoints: [resolve('src/lib/evaluation/engine.worker.ts')],
	outfile,
	bundle: true,
	minify: true,
	format: 'esm',
	target: 'es2022',
	alias: { $lib: resolve('src/lib') },
	// What a browser's worker has as its global scope.
	banner: {
		js: `import { parentPort } from 'node:worker_threads';
const self = { postMessage: (message) => parentPort.postMessage(message) };
parentPort.on('message', (data) => self.onmessage({ data }));`
	},
	logLevel: 'warning'
});
const code = readFileSync(outfile);
const kilobytes = (bytes: number) => `${(bytes / 1e3).toFixed(1)} kB`;
console.log(
	`The worker's bundle: ${kilobytes(code.length)}, ${kilobytes(gzipSync(code, { level: 9 }).length)} gzipped`
);

const first: ToWorker = {
	kind: 'apply',
	change: {
		upsert: [
			{ id: 'a', kind: 'given', symbol: 'a', value: '2', unit: 'GPa', uncertainty: '' },
			{ id: 'b', kind: 'calculation', symbol: 'b', expression: 'a / 2', unit: '', digits: '' }
		]
	}
};

describe('the engine starts', () => {
	bench('on Node: new thread, bundle loaded, first result', async () => {
		const worker = new Worker(outfile);
		worker.postMessage(first);
		await new Promise((answered, failed) => worker.once('message', answered).once('error', failed));
		await worker.terminate();
	});
});
