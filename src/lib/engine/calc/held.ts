/** An item where it stands in the sheet: what stands behind its names, and its result as last told. */
import { createEntry, type Entry, type ResultLinks } from './entry';
import type { SheetItem } from './items';
import { alike, type Links } from './links';
import type { ItemResult } from './results';
import { Slot } from './slot';

export class Held {
	readonly id: string;
	place = Infinity;
	entry: Entry;
	slots: Slot[];
	/** Whether it stands in a cycle, and stood in one when it was evaluated last. */
	cyclic = false;
	wasCyclic = false;
	gone = false;
	/** Whether it is among those about to be told. */
	isTold = false;
	/** The edit that opened its result, which may say something else now than it said before (null: nothing). */
	openedBy = 0;
	before: ItemResult | null = null;
	private result: ItemResult | null = null;
	private neighbours: ResultLinks | null = null;

	constructor(item: SheetItem) {
		this.id = item.id;
		this.entry = createEntry(item);
		this.slots = this.ownSlots();
	}

	/** The item as written anew. Formulas that hold on to the slots keep them where the names stay. */
	rewrite(item: SheetItem): void {
		const { defines, width } = this.entry;
		this.entry = createEntry(item);
		const now = this.entry;
		if (now.width !== width || !alike(now.defines, defines)) this.slots = this.ownSlots();
	}

	slotOf(name: string): Slot {
		return this.slots[this.entry.defines.indexOf(name)]!;
	}

	/** What was built of the result no longer holds, or only what it says of links. */
	spoil(what: 'all' | 'links'): void {
		if (what === 'all') this.result = null;
		else this.neighbours = null;
	}

	/** The result as plain data. */
	read(links: Links<Held>): ItemResult {
		if (this.result && this.neighbours) return this.result;
		this.neighbours ??= { uses: links.uses(this), usedIn: links.usedIn(this) };
		this.result = this.result
			? { ...this.result, ...this.neighbours }
			: this.entry.result(this.slots, this.neighbours);
		return this.result;
	}

	private ownSlots(): Slot[] {
		return Array.from({ length: this.entry.width }, () => new Slot(this.id));
	}
}
