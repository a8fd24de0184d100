/** Tells a process from a later one that was given the same pid. */
import { readFileSync } from 'node:fs';

/** "pid start-time": on one boot of the machine the pair names one process. */
export function processMark(pid: number): string {
	return `${pid} ${startTime(pid)}`;
}

/** Whether the process of the mark still runs. */
export function sameProcess(mark: string): boolean {
	const pid = Number(mark.split(' ')[0]);
	return startTime(pid) !== null && processMark(pid) === mark.trim();
}

/** Field 22 of /proc/pid/stat, in clock ticks since boot; null when there is no such process. */
function startTime(pid: number): string | null {
	try {
		const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
		// The second field is the program's name in parentheses and may hold blanks.
		const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
		return fields[0] === 'Z' ? null : (fields[19] ?? null);
	} catch {
		return null;
	}
}
