/** The production build as a process of its own, for tests that need a whole site. */
import { fork, type ChildProcess } from 'node:child_process';
import { freePort } from '../../server/launch/ports';

export type Served = {
	origin: string;
	/** What the process was started with, for commands on the same site. */
	environment: Record<string, string>;
	process: ChildProcess;
	/** Everything the process has written. */
	output(): string;
	/** Orderly, as by SIGTERM. */
	stop(): Promise<void>;
	/** At once, as by a power cut. */
	kill(): Promise<void>;
};

/** `environment` brings DATABASE_URL, S3_* and SMTP_URL; a port is kept to serve there again. */
export async function serve(environment: Record<string, string>, port?: number): Promise<Served> {
	const listenOn = port ?? (await freePort());
	const origin = `http://localhost:${listenOn}`;
	const child = fork('build/serve.js', {
		stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
		execArgv: [],
		env: {
			...process.env,
			NODE_ENV: 'production',
			HOST: '127.0.0.1',
			PORT: `${listenOn}`,
			ORIGIN: origin,
			ENGINE_WORKER: 'build/engine-worker.js',
			...environment
		}
	});
	let output = '';
	child.stdout!.on('data', (text) => (output += text));
	child.stderr!.on('data', (text) => (output += text));
	const exited = new Promise<void>((resolve) => child.once('exit', () => resolve()));

	const listening = new Promise<true>((resolve) => child.once('message', () => resolve(true)));
	if (!(await Promise.race([listening, exited])))
		throw new Error(`The server did not start:\n${output}`);

	const end = (signal: 'SIGTERM' | 'SIGKILL') => {
		child.kill(signal);
		return exited;
	};
	return {
		origin,
		environment: { ORIGIN: origin, ENGINE_WORKER: 'build/engine-worker.js', ...environment },
		process: child,
		output: () => output,
		stop: () => end('SIGTERM'),
		kill: () => end('SIGKILL')
	};
}
