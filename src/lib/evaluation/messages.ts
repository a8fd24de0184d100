/** What passes between the page and its engine worker. */
import type { Suggestion } from '$lib/engine/calc/completion';
import type { SheetChange } from '$lib/engine/calc/items';
import type { SheetAnswer } from '$lib/engine/calc/sheet';

export type ToWorker =
	{ kind: 'apply'; change: SheetChange } | { kind: 'complete'; question: number; prefix: string };

export type FromWorker =
	| ({ kind: 'results' } & SheetAnswer)
	| { kind: 'suggestions'; question: number; suggestions: Suggestion[] };
