/** Notes and methods computed on the server, by the same engine as in the browser, off the request's thread. */
import { resolve } from 'node:path';
import type { ItemResult } from '$lib/engine/calc/results';
import type { Answer } from '$lib/engine/methods/method';
import { noteTask, type EngineTask } from '$lib/engine-task';
import type { NoteContent } from '$lib/note/items';
import { EnginePool, type Limits } from './pool';

export { EngineLimitError } from './pool';

type Pool = EnginePool<EngineTask, unknown>;

/** A note waits for nobody's study: they have threads of their own. */
const LIMITS = {
	notes: { subject: 'The note', milliseconds: 2000, megabytes: 256, threads: 2 },
	methods: { subject: 'The method', milliseconds: 10_000, megabytes: 256, threads: 2 }
} as const satisfies Record<string, Omit<Limits, 'worker'>>;

const pools = new Map<keyof typeof LIMITS, Pool>();

function poolFor(which: keyof typeof LIMITS): Pool {
	let pool = pools.get(which);
	if (!pool) {
		const worker = resolve(process.env.ENGINE_WORKER ?? 'build/engine-worker.js');
		pools.set(which, (pool = new EnginePool({ ...LIMITS[which], worker })));
	}
	return pool;
}

/** @throws EngineLimitError when time or memory ran out. */
export const evaluateContent = (content: NoteContent) =>
	poolFor('notes').run(noteTask(content)) as Promise<ItemResult[]>;

/**
 * A method of the catalogue on an input as it came in.
 * @throws EngineLimitError when time or memory ran out.
 */
export const runMethod = (name: string, input: unknown) =>
	poolFor('methods').run({ kind: 'method', name, input }) as Promise<Answer>;

/** Ends the threads; the next evaluation starts them again. */
export async function closeEngine(): Promise<void> {
	const closing = [...pools.values()];
	pools.clear();
	await Promise.all(closing.map((pool) => pool.close()));
}
