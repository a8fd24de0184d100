/**
 * What SvelteKit's part of the process leaves for the process around it. They are two bundles, so the
 * place both know is a symbol on `globalThis`: `init` in hooks.server.ts sets it, `main.ts` and the dev
 * server read it.
 */
import type { IncomingMessage } from 'node:http';
import type { Duplex } from 'node:stream';

export type Lifecycle = {
	/** Takes a request to upgrade to a WebSocket. */
	upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void;
	/** First step of an orderly end: closes live notes after their last commit. */
	shutdown(): Promise<void>;
	/** Last step, when no request runs any more: stops the mail worker, closes the database. */
	close(): Promise<void>;
};

const key = (step: keyof Lifecycle) => Symbol.for(`holdfast.${step}`);
const shared = globalThis as unknown as Record<symbol, unknown>;

export function provide<S extends keyof Lifecycle>(step: S, work: Lifecycle[S]): void {
	shared[key(step)] = work;
}

export function provided<S extends keyof Lifecycle>(step: S): Lifecycle[S] | undefined {
	return shared[key(step)] as Lifecycle[S] | undefined;
}
