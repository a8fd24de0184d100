/**
 * One launcher a checkout. The lock names the launcher and the server it started by pid and start time,
 * so what a killed launcher left is told from a running one, and a server without launcher is ended.
 */
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { DATA } from './installation';
import { processMark, sameProcess } from './processes';

const FILE = join(DATA, 'launcher');

export async function takeLock(): Promise<void> {
	const [launcher, ...started] = readLock();
	if (launcher && sameProcess(launcher))
		throw new Error(
			`Holdfast is already started from this folder (process ${launcher.split(' ')[0]}).`
		);
	for (const mark of started) await endProcess(mark);
	rmSync(FILE, { force: true });
	// Of two launchers that come to this point at once, one fails here.
	writeFileSync(FILE, `${processMark(process.pid)}\n`, { flag: 'wx' });
}

export function noteStarted(pid: number): void {
	writeFileSync(FILE, `${processMark(pid)}\n`, { flag: 'a' });
}

export function releaseLock(): void {
	rmSync(FILE, { force: true });
}

function readLock(): string[] {
	try {
		return readFileSync(FILE, 'utf8').split('\n').filter(Boolean);
	} catch {
		return [];
	}
}

/** Asks the process to end; after five seconds it is made to. */
async function endProcess(mark: string): Promise<void> {
	const pid = Number(mark.split(' ')[0]);
	for (let tenths = 0; sameProcess(mark); tenths++) {
		if (tenths === 0) process.kill(pid, 'SIGTERM');
		if (tenths === 50) process.kill(pid, 'SIGKILL');
		await pause(100);
	}
}
