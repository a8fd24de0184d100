/**
 * The sheet: items, the graph of who names whom, and the result of each. An edit parses only what was
 * edited, evaluates only what it reaches and stops where a value stays as it was. The results depend on
 * the items alone, not on the order in which they came.
 *
 * Figures are found with the edit; results are built of them when they are read.
 */
import { CONSTANTS } from '../quantities/constants';
import type { Entry } from './entry';
import { Held } from './held';
import type { SheetChange } from './items';
import { Links, inOrder } from './links';
import { nearest } from './near';
import { objectionTo } from './objections';
import { Plans, run } from './plan';
import type { ItemResult, Outcome } from './results';
import { same } from './same';
import type { Scope } from './scope';
import { Slot, type Move } from './slot';
import { propagate } from './uncertainty';

const DEFAULT_THIN_LIMIT = 0.1;

export type SheetAnswer = {
	/** Results that the edit changed, in sheet order; built when they are first read, before the next edit. */
	readonly changed: ItemResult[];
	readonly removed: string[];
};

export interface Sheet {
	/** Takes an edit and answers with the results that it changed. */
	apply(change: SheetChange): SheetAnswer;
	/**
	 * Brings the standard uncertainties up to the figures and answers with the results in which they
	 * changed. An edit leaves them as they were, so that nobody who types waits for them.
	 */
	uncertainties(): ItemResult[];
	/** All results in sheet order, with their uncertainties. */
	results(): ItemResult[];
	/** Names that others may use, with the item and the outcome behind each. */
	symbols(): Iterable<{ name: string; id: string; outcome: Outcome }>;
}

export function createSheet(): Sheet {
	return new LiveSheet();
}

class LiveSheet implements Sheet {
	private held = new Map<string, Held>();
	private links = new Links<Held>();
	private plans = new Plans(this.links);
	private thinLimit = DEFAULT_THIN_LIMIT;
	/** Counts the edits. */
	private edit = 0;
	/** The edit whose figures the uncertainties follow. */
	private propagatedFor = 0;
	/** Items whose results this edit may have changed. */
	private open: Held[] = [];
	/** Items in whose results it moved a figure. */
	private moved: Held[] = [];
	/** Items whose words name what lies near an unknown symbol, which any new symbol may change. */
	private asking = new Set<Held>();
	private askedNear = false;

	apply(change: SheetChange): SheetAnswer {
		this.edit += 1;
		this.open = [];
		this.moved = [];
		const removed = (change.remove ?? []).filter((id) => this.held.has(id));
		const seeds = new Set<Held>();
		const redefined = new Set<string>();
		const relink = (held: Held, entry: Entry | null) => {
			for (const node of this.links.touchedBy(held, entry)) this.touch(node, 'links');
			for (const name of this.links.relink(held, entry)) redefined.add(name);
		};
		for (const id of removed) {
			const held = this.held.get(id)!;
			relink(held, null);
			this.held.delete(id);
			this.asking.delete(held);
			held.gone = true;
		}
		for (const item of change.upsert ?? []) {
			let held = this.held.get(item.id);
			if (held && same(held.entry.item, item)) continue;
			if (held) {
				this.touch(held, 'all');
				held.rewrite(item);
			} else {
				this.held.set(item.id, (held = new Held(item)));
				this.reopen(held);
			}
			relink(held, held.entry);
			seeds.add(held);
		}
		if (change.order) {
			for (const held of this.held.values()) this.touch(held, 'links');
			this.links.arrange(change.order, this.held.values());
		}
		this.findBorneOn(redefined, seeds);
		if (change.thinLimit !== undefined && change.thinLimit !== this.thinLimit) {
			this.thinLimit = change.thinLimit;
			for (const held of this.held.values()) if (held.entry.item.kind === 'check') seeds.add(held);
		}
		if (seeds.size > 0) {
			const plan = this.plans.for(seeds);
			run(plan, (held, stirred) => (stirred ? this.evaluate(held) : this.refresh(held)));
		}
		return this.answer(removed.filter((id) => !this.held.has(id)));
	}

	uncertainties(): ItemResult[] {
		if (this.propagatedFor === this.edit) return [];
		this.propagatedFor = this.edit;
		const { order } = this.plans.whole(this.held.values());
		const changed = propagate(order).filter(({ held, uncertainties }) => {
			const before = held.read(this.links);
			held.slots.forEach((slot, i) => slot.learn(uncertainties[i]!));
			held.spoil('all');
			return !same(held.read(this.links), before);
		});
		return inOrder(changed.map(({ held }) => held)).map((held) => held.read(this.links));
	}

	results(): ItemResult[] {
		this.uncertainties();
		return inOrder([...this.held.values()]).map((held) => held.read(this.links));
	}

	*symbols() {
		for (const held of this.held.values()) {
			const { symbol } = held.entry;
			if (symbol === '') continue;
			const result = held.read(this.links);
			if (result.kind === 'lineModel') {
				for (const { name, outcome } of result.outputs) {
					yield { name: `${symbol}.${name}`, id: held.id, outcome };
				}
			} else if (result.kind !== 'check') {
				yield { name: symbol, id: held.id, outcome: result.outcome };
			}
		}
	}

	/** Adds the items on which it bears that other items define these names now than before. */
	private findBorneOn(redefined: Set<string>, seeds: Set<Held>): void {
		if (redefined.size === 0) return;
		for (const name of redefined) {
			for (const held of this.links.mentioners(name)) seeds.add(held);
			for (const held of this.links.definers(name)) seeds.add(held);
		}
		for (const held of this.asking) seeds.add(held);
	}

	/** The figures anew, where that does; else the whole item. */
	private refresh(held: Held): Move {
		const refreshed = held.entry.refresh(held.slots);
		if (refreshed === 'stayed') return 'none';
		if (refreshed === null) return this.evaluate(held);
		this.moved.push(held);
		held.spoil('all');
		return 'figure';
	}

	private evaluate(held: Held): Move {
		this.touch(held, 'all');
		this.askedNear = false;
		const objection = objectionTo(held, this.links);
		held.entry.evaluate(held.slots, this.scope, this.thinLimit, objection);
		held.wasCyclic = held.cyclic;
		if (this.askedNear) this.asking.add(held);
		else this.asking.delete(held);
		let furthest: Move = 'none';
		for (const slot of held.slots) {
			const move = slot.takeMove();
			if (move === 'manner' || furthest === 'none') furthest = move;
		}
		return furthest;
	}

	private scope: Scope = {
		supply: (name) => {
			const definers = this.links.definers(name);
			const [held] = definers;
			if (held === undefined) return 'unknown';
			if (definers.size > 1) return lacking([...definers]);
			const { item, symbol } = held.entry;
			return item.kind === 'lineModel' && name === symbol ? 'model' : held.slotOf(name);
		},
		defines: (name) => this.links.definers(name).size > 0,
		near: (name) => {
			this.askedNear = true;
			return nearest(name, [...this.links.definedNames(), ...CONSTANTS.keys()]);
		}
	};

	/** Keeps what the item said before this edit; then it may say something else. */
	private touch(held: Held, what: 'all' | 'links'): void {
		if (held.openedBy !== this.edit) {
			held.before = held.read(this.links);
			this.reopen(held);
		}
		held.spoil(what);
	}

	private reopen(held: Held): void {
		if (held.openedBy === this.edit) return;
		held.openedBy = this.edit;
		this.open.push(held);
	}

	private answer(removed: string[]): SheetAnswer {
		const { open, moved } = this;
		let changed: ItemResult[] | null = null;
		const tell = () => (changed ??= this.tell(open, moved));
		return {
			removed,
			get changed() {
				return tell();
			}
		};
	}

	/** The results of those moved, and of those open that are not what they were before, in sheet order. */
	private tell(open: Held[], moved: Held[]): ItemResult[] {
		const changed = [...moved];
		for (const held of moved) held.isTold = true;
		for (const held of open) {
			const told = held.isTold || held.gone || same(held.read(this.links), held.before);
			if (!told) changed.push(held);
			held.before = null;
		}
		for (const held of moved) held.isTold = false;
		return inOrder(changed).map((held) => held.read(this.links));
	}
}

/** What is defined more than once has no value. */
function lacking(definers: Held[]): Slot {
	const slot = new Slot('');
	slot.lack(definers.map(({ id }) => id).sort());
	return slot;
}
