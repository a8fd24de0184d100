import type { CheckResult, ItemResult } from '$lib/engine/calc/results';
import type { NoteContent } from '$lib/note/items';
import type { CheckCounts, LineMark } from '$lib/note/summary';

/** What a register row, the overview and the home page draw of a note. */
export function summarise(
	content: NoteContent,
	results: ItemResult[]
): { checks: CheckCounts; marks: LineMark[]; itemCount: number } {
	const last = Math.max(1, content.items.length - 1);
	const at = new Map(content.items.map((item, index) => [item.id, index / last]));
	const checks: CheckCounts = { holds: 0, thin: 0, fails: 0, waits: 0 };
	const marks = results
		.filter((result): result is CheckResult => result.kind === 'check' && at.has(result.id))
		.map(({ id, state, margin }): LineMark => {
			checks[state] += 1;
			return { at: at.get(id)!, itemId: id, state, margin: margin?.relative ?? null };
		})
		.sort((a, b) => a.at - b.at);
	return { checks, marks, itemCount: content.items.length };
}
