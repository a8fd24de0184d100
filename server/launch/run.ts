import { spawn } from 'node:child_process';

export type Outcome = { code: number; output: string };

/** Runs a program to its end and gives its exit code with what it printed. */
export function run(program: string, args: string[]): Promise<Outcome> {
	return new Promise((resolve, reject) => {
		// In a process group of its own: Ctrl-C in the terminal is for the launcher, which ends things in order.
		const child = spawn(program, args, {
			cwd: '/',
			detached: true,
			stdio: ['ignore', 'pipe', 'pipe']
		});
		let output = '';
		child.stdout.on('data', (text) => (output += text));
		child.stderr.on('data', (text) => (output += text));
		child.once('error', reject);
		// 'exit' and not 'close': a server that the program leaves running may hold its output open.
		child.once('exit', (code) => resolve({ code: code ?? 1, output }));
	});
}
