/** Items that are gone while remarks stay pinned to them, each below the row that it stood after. */
import type { RemarkView } from '$lib/server/remarks/list';
import { groupBy } from './group';
import type { SheetView } from './sheet-view';

export type RemovedPins = { itemId: string; remarks: RemarkView[] };

type Sheet = Pick<SheetView, 'number'> & { readonly order: readonly string[] };

export function removedPins(
	remarks: readonly RemarkView[],
	sheet: Sheet
): Map<string, RemovedPins[]> {
	const places = new Map<string, RemovedPins[]>();
	const present = new Set(sheet.order);
	const gone = groupBy(
		remarks.filter(({ itemId }) => !present.has(itemId)),
		({ itemId }) => itemId
	);
	for (const [itemId, pinned] of gone) {
		const after = placeOf(pinned[0]!.pinned.number, sheet);
		if (after === null) continue;
		places.set(after, [...(places.get(after) ?? []), { itemId, remarks: pinned }]);
	}
	return places;
}

/** The last row whose number does not go beyond the one that was; the first row if all do. */
function placeOf(number: string, sheet: Sheet): string | null {
	const { order } = sheet;
	const beyond = order.findIndex((id) => compareNumbers(sheet.number(id), number) >= 0);
	const index = beyond < 0 ? order.length - 1 : Math.max(0, beyond - 1);
	return order[index] ?? null;
}

export function compareNumbers(a: string, b: string): number {
	const [left, right] = [a, b].map((number) => number.split('.').map(Number));
	return left![0]! - right![0]! || (left![1] ?? 0) - (right![1] ?? 0);
}
