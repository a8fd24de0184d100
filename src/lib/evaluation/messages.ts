/** What passes between the page and its engine worker. */
import type { Suggestion } from '$lib/engine/calc/completion';
import type { SheetChange } from '$lib/engine/calc/items';
import type { ItemResult } from '$lib/engine/calc/results';
import type { SheetAnswer } from '$lib/engine/calc/sheet';

export type ToWorker =
	{ kind: 'apply'; change: SheetChange } | { kind: 'complete'; question: number; prefix: string };

export type FromWorker =
	| ({ kind: 'results' } & SheetAnswer)
	/** Results whose standard uncertainties have come up to their figures, a moment after these. */
	| { kind: 'uncertainties'; changed: ItemResult[] }
	| { kind: 'suggestions'; question: number; suggestions: Suggestion[] };
