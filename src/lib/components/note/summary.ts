import type { ItemResult } from '$lib/engine/calc/results';
import type { CheckCounts, CheckState, LineMark } from '$lib/note/summary';

export type SheetSummary = { counts: CheckCounts; marks: LineMark[] };

/** Worst first: the order in which counts are told. */
export const CHECK_STATES: readonly CheckState[] = ['fails', 'thin', 'holds', 'waits'];

/** Counts of checks, and the features of the line from the first item (0) to the last (1). */
export function countChecks(
	order: readonly string[],
	resultOf: (id: string) => ItemResult | undefined
): SheetSummary {
	const counts: CheckCounts = { holds: 0, thin: 0, fails: 0, waits: 0 };
	const marks: LineMark[] = [];
	order.forEach((id, index) => {
		const result = resultOf(id);
		if (result?.kind !== 'check') return;
		counts[result.state] += 1;
		const at = order.length > 1 ? index / (order.length - 1) : 0;
		marks.push({ at, itemId: id, state: result.state, margin: result.margin?.relative ?? null });
	});
	return { counts, marks };
}
