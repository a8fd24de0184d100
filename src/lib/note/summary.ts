/** What a register row, the overview and the home page draw of a note. */

export type CheckState = 'holds' | 'thin' | 'fails' | 'waits';

export type CheckCounts = Record<CheckState, number>;

/** A feature of the line beside one item. `at` runs from 0 (first item) to 1 (last). */
export type LineMark = {
	at: number;
	itemId: string;
	state: CheckState;
	/** Margin of the check; null when it waits. Its width follows from it. */
	margin: number | null;
};

/** Width in px of the line beside a check: full (8) from a margin of 0.25, 2 at zero margin. */
export function cordWidth(margin: number): number {
	return 2 + 6 * Math.min(1, Math.max(0, margin) / 0.25);
}
