/** The engine in a worker thread of the server: a whole note, or one method by its name. */
import type { MessagePort } from 'node:worker_threads';
import { run, type EngineTask } from '../../src/lib/engine-task';

type Task = { input: EngineTask; begun: MessagePort };

export default function work({ input, begun }: Task) {
	begun.postMessage(null);
	return run(input);
}
