import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { expect, test } from 'vitest';
import { processMark, sameProcess } from './processes';

test('a running process is known by its mark', () => {
	expect(sameProcess(processMark(process.pid))).toBe(true);
});

test('a process that has ended is not taken for running', async () => {
	const child = spawn('true');
	const mark = processMark(child.pid!);
	await once(child, 'exit');
	expect(sameProcess(mark)).toBe(false);
});

test('another process with the same pid is not taken for the first', () => {
	expect(sameProcess(`${process.pid} 1`)).toBe(false);
	expect(sameProcess('')).toBe(false);
});
