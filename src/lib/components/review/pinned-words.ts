/** A pinned item in words and figures. */
import { marginWords } from '$lib/components/note/figures';
import { formatFigure, unitText } from '$lib/engine/quantities/format';
import { percentWords } from '$lib/note/percent';
import type { PinnedValue } from '$lib/note/frozen';

const THIN_SPACE = '\u202f';

/** "50.0 GPa"; "margin −0.056, fails"; "waits for Φ"; empty for an item without a figure. */
export function pinnedFigure({ value, unit, digits, state }: PinnedValue): string {
	if (value === null) return state;
	if (state !== '') {
		const kind = unit === '' ? 'ratio' : 'difference';
		return `margin ${marginWords({ kind, value, unit })}, ${state}`;
	}
	return formatFigure(value, digits) + (unit && THIN_SPACE + unitText(unit));
}

/** "−5.6 %" where both have a value in the same unit; a margin has none. */
export function changeSince(then: PinnedValue, now: PinnedValue): string {
	if (then.value === null || now.value === null || then.unit !== now.unit || then.state !== '')
		return '';
	return percentWords((now.value - then.value) / Math.abs(then.value));
}
