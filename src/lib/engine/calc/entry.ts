/** One item in the sheet: its texts parsed once, what it defines and mentions, and how it is evaluated. */
import { CalculationEntry } from './calculation-entry';
import { CheckEntry } from './check-entry';
import { GivenEntry } from './given-entry';
import type { SheetItem } from './items';
import { ModelEntry } from './model-entry';
import type { Fault, ItemResult } from './results';
import type { Derived } from './linear';
import type { Scope } from './scope';
import type { Slot } from './slot';

/** Ids of items that the item names, and of those that name it. */
export type ResultLinks = Pick<ItemResult, 'uses' | 'usedIn'>;

/** Whether a figure of the result moved. */
export type Refreshed = 'moved' | 'stayed';

export interface Entry {
	readonly item: SheetItem;
	/** The symbol as others name it; empty where there is none that can be named. */
	readonly symbol: string;
	/** Names that others may use. A line model defines its symbol as well, which is no quantity. */
	readonly defines: readonly string[];
	/** Names whose definition bears on this item, in order of mention. */
	readonly mentions: readonly string[];
	/** How many slots it fills: one for each name in `defines`, in that order, named or not. */
	readonly width: number;
	/** Everything anew, with the sheet's own objection to the symbol (defined twice, in a cycle), if there is one. */
	evaluate(slots: readonly Slot[], scope: Scope, thinLimit: number, objection: Fault | null): void;
	/**
	 * The figures anew, where names stand for what they stood for and in the same manner. Null where that
	 * does not do, and everything is to be evaluated.
	 */
	refresh(slots: readonly Slot[]): Refreshed | null;
	/**
	 * How the figure in each slot follows from those that the item names, to first order; null where it
	 * follows from none that is uncertain.
	 */
	linear(isUncertain: (slot: Slot) => boolean): readonly (Derived | null)[];
	/** The result as plain data, built when it is read. */
	result(slots: readonly Slot[], links: ResultLinks): ItemResult;
}

export function createEntry(item: SheetItem): Entry {
	switch (item.kind) {
		case 'given':
			return new GivenEntry(item);
		case 'calculation':
			return new CalculationEntry(item);
		case 'check':
			return new CheckEntry(item);
		case 'lineModel':
			return new ModelEntry(item);
	}
}
