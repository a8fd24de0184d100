/**
 * The page's side of the engine. Edits that come while the worker computes are merged and sent as one
 * when it is done, so that a fast typist never queues up work that is already stale.
 */
import type { Suggestion } from '$lib/engine/calc/completion';
import type { SheetChange } from '$lib/engine/calc/items';
import type { ItemResult } from '$lib/engine/calc/results';
import { merge } from './merge';
import type { FromWorker, ToWorker } from './messages';

type Listener = {
	onResults: (changed: ItemResult[], removed: string[]) => void;
	onFailure: (message: string) => void;
};

/** What is needed of a Worker. */
export type Port = Pick<Worker, 'postMessage' | 'terminate'> & {
	onmessage: ((event: MessageEvent<FromWorker>) => void) | null;
	onerror: ((event: ErrorEvent) => void) | null;
};

const startWorker = (): Port =>
	new Worker(new URL('./engine.worker.ts', import.meta.url), { type: 'module' });

let ahead: Port | undefined;

/** Starts a worker while the page still comes up; the next evaluation takes it. */
export function startAhead(): void {
	ahead ??= startWorker();
}

function takeWorker(): Port {
	const port = ahead ?? startWorker();
	ahead = undefined;
	return port;
}

export class Evaluation {
	private port: Port;
	private busy = false;
	private waiting: SheetChange | null = null;
	private questions = new Map<number, (suggestions: Suggestion[]) => void>();
	private asked = 0;

	constructor(
		private listener: Listener,
		start: () => Port = takeWorker
	) {
		this.port = start();
		this.port.onmessage = ({ data }) => this.receive(data);
		this.port.onerror = (event) => {
			event.preventDefault?.();
			this.answerAll();
			listener.onFailure('The calculations have stopped. Load the page again; no edit is lost.');
		};
	}

	apply(change: SheetChange): void {
		if (this.busy) {
			this.waiting = this.waiting ? merge(this.waiting, change) : change;
			return;
		}
		this.busy = true;
		this.send({ kind: 'apply', change });
	}

	/** Symbols, constants, functions and units that begin so. */
	complete(prefix: string): Promise<Suggestion[]> {
		const question = ++this.asked;
		return new Promise((resolve) => {
			this.questions.set(question, resolve);
			this.send({ kind: 'complete', question, prefix });
		});
	}

	dispose(): void {
		this.port.terminate();
		this.answerAll();
	}

	private receive(message: FromWorker): void {
		if (message.kind === 'suggestions') {
			this.questions.get(message.question)?.(message.suggestions);
			this.questions.delete(message.question);
			return;
		}
		if (message.kind === 'uncertainties') {
			this.listener.onResults(message.changed, []);
			return;
		}
		this.busy = false;
		const { waiting } = this;
		this.waiting = null;
		if (waiting) this.apply(waiting);
		this.listener.onResults(message.changed, message.removed);
	}

	private send(message: ToWorker): void {
		this.port.postMessage(message);
	}

	/** Nobody is left waiting for a worker that is gone. */
	private answerAll(): void {
		for (const resolve of this.questions.values()) resolve([]);
		this.questions.clear();
	}
}
