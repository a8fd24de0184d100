/** `npm run dev`: the demo's services, and Vite with hot reload in place of the build. */
import { spawn } from 'node:child_process';
import { bundleEngineWorker } from '../engine/bundle';
import { launch } from './launch';
import { noteStarted } from './lock';
import { startServices } from './services';

const ENGINE_WORKER = '.svelte-kit/engine-worker.js';

await launch(async (onEnd) => {
	await bundleEngineWorker(ENGINE_WORKER);
	const { environment, mailsAddress } = await startServices(ENGINE_WORKER, onEnd);
	const vite = spawn(
		process.execPath,
		[
			...['node_modules/vite/bin/vite.js', 'dev', '--strictPort'],
			...['--host', environment.HOST!, '--port', environment.PORT!]
		],
		{ stdio: 'inherit', env: { ...process.env, ...environment } }
	);
	noteStarted(vite.pid!);
	const ended = new Promise<string>((resolve) => vite.once('exit', () => resolve('Vite ended.')));
	onEnd(async () => {
		vite.kill('SIGTERM');
		await ended;
	});
	console.log(`Holdfast in development: ${environment.ORIGIN}   Caught mails: ${mailsAddress}`);
	return { ended };
});
