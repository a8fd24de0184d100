/** `npm start`: everything the demo needs, then the production build on it, until Ctrl-C. */
import { fork, type ChildProcess } from 'node:child_process';
import { openSync } from 'node:fs';
import { join } from 'node:path';
import { address, DEMO_PASSWORD, PEOPLE } from '../seed/people';
import { buildAll } from './build';
import { buildIsCurrent } from './build-stamp';
import { DATA } from './installation';
import { launch } from './launch';
import { noteStarted } from './lock';
import { startServices } from './services';

await launch(async (onEnd) => {
	if (!buildIsCurrent()) {
		console.log('Building …');
		await buildAll();
	}
	const services = await startServices('build/engine-worker.js', onEnd);

	const log = join(DATA, 'server.log');
	const output = openSync(log, 'w', 0o600);
	const server = fork('build/serve.js', {
		stdio: ['ignore', output, output, 'ipc'],
		env: { ...process.env, ...services.environment, NODE_ENV: 'production' }
	});
	noteStarted(server.pid!);
	onEnd(() => ended(server));
	const exit = new Promise<string>((resolve) =>
		server.once('exit', () => resolve(`The server has ended: see ${log}`))
	);
	const listening = new Promise<null>((resolve) => server.once('message', () => resolve(null)));
	const failure = await Promise.race([listening, exit]);
	if (failure) throw new Error(failure);

	welcome(services.environment.ORIGIN!, services.mailsAddress, log);
	return { ended: exit };
});

async function ended(server: ChildProcess): Promise<void> {
	if (server.exitCode !== null || server.signalCode !== null) return;
	const exit = new Promise((resolve) => server.once('exit', resolve));
	server.kill('SIGTERM');
	await exit;
}

function welcome(origin: string, mails: string, log: string): void {
	const people = PEOPLE.map(({ key, roles, administrator }) => {
		const held = Object.entries(roles).map(([code, { role }]) => `${role} in ${code}`);
		const does = administrator ? 'administrator of the site' : held.join(', ');
		return `    ${address(key).padEnd(30)} ${does}`;
	});
	console.log(`
Holdfast is ready:  ${origin}

  Sign in as one of these, all with the password "${DEMO_PASSWORD}":
${people.join('\n')}

  Caught mails:  ${mails}
  Log:           ${log}
  Ctrl-C ends Holdfast and its database; what was written stays in ${DATA}.
`);
}
