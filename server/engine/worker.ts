/** The engine in a worker thread of the server: a whole note in, all its results out. */
import type { MessagePort } from 'node:worker_threads';
import type { SheetChange } from '../../src/lib/engine/calc/items';
import type { ItemResult } from '../../src/lib/engine/calc/results';
import { createSheet } from '../../src/lib/engine/calc/sheet';

type Task = { input: SheetChange; begun: MessagePort };

export default function evaluate({ input, begun }: Task): ItemResult[] {
	begun.postMessage(null);
	const sheet = createSheet();
	sheet.apply(input);
	return sheet.results();
}
