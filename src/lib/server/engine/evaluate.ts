/** A whole note computed on the server, by the same engine as in the browser. */
import { resolve } from 'node:path';
import type { SheetChange } from '$lib/engine/calc/items';
import type { ItemResult } from '$lib/engine/calc/results';
import type { NoteContent } from '$lib/note/items';
import { thinLimitOf, toSheetItem } from '$lib/note/sheet-items';
import { EnginePool } from './pool';

export { EngineLimitError } from './pool';

let pool: EnginePool<SheetChange, ItemResult[]> | undefined;

/** @throws EngineLimitError when time or memory ran out. */
export function evaluateContent(content: NoteContent): Promise<ItemResult[]> {
	pool ??= new EnginePool({
		worker: resolve(process.env.ENGINE_WORKER ?? 'build/engine-worker.js'),
		milliseconds: 2000,
		megabytes: 256,
		threads: 2
	});
	return pool.run({
		upsert: content.items.flatMap((item) => toSheetItem(item) ?? []),
		order: content.items.map(({ id }) => id),
		thinLimit: thinLimitOf(content.thinLimit)
	});
}

/** Ends the threads; the next evaluation starts them again. */
export async function closeEngine(): Promise<void> {
	const closing = pool;
	pool = undefined;
	await closing?.close();
}
