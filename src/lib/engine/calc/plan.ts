/** What an edit may reach, in order of evaluation; kept while links stay, for edits that come again. */
import { components, reach } from './graph';
import type { Held } from './held';
import type { Links } from './links';
import type { Move } from './slot';

/**
 * Suppliers first. What says how far an edit has come lies side by side in few bytes an item: over
 * thousands of items it is memory that an edit waits for.
 */
export type Plan = {
	order: readonly Held[];
	/** Places in the order of the items that the edit begins with. */
	seeds: readonly number[];
	/** Places of what stands in a cycle, or stood in one when it was evaluated last. */
	cyclic: readonly number[];
	/** Places of those who name the item at i: users[from[i]] to users[from[i + 1] - 1]. */
	users: Int32Array;
	from: Int32Array;
	/** How far each is concerned by the edit under way. */
	concerns: Uint8Array;
};

/** Nothing that the item names has moved; a figure has; more has, or the item itself is edited. */
const UNTOUCHED = 0;
const DUE = 1;
const STIRRED = 2;

/** Visits what an edit concerns, suppliers first, and stops where nothing moves. */
export function run(plan: Plan, visit: (held: Held, stirred: boolean) => Move): void {
	const { order, seeds, cyclic, users, from, concerns } = plan;
	for (const i of seeds) concerns[i] = STIRRED;
	for (const i of cyclic) {
		concerns[i] = STIRRED;
		// Nothing in a cycle sees what stood there before it closed.
		const { slots, id, cyclic, wasCyclic } = order[i]!;
		if (cyclic && !wasCyclic) for (const slot of slots) slot.lack([id]);
	}
	for (let i = 0; i < order.length; i += 1) {
		const concern = concerns[i];
		if (concern === UNTOUCHED) continue;
		const move = visit(order[i]!, concern === STIRRED);
		if (move === 'none') continue;
		const reach = move === 'figure' ? DUE : STIRRED;
		for (let k = from[i]!; k < from[i + 1]!; k += 1) {
			const user = users[k]!;
			if (concerns[user]! < reach) concerns[user] = reach;
		}
	}
	concerns.fill(UNTOUCHED);
}

/** Edits go to and fro between a few items; each plan is as long as what its item reaches. */
const MOST = 8;

export class Plans {
	private kept = new Map<Held, Plan>();
	private version = 0;
	private all: Plan | null = null;
	private wholeVersion = 0;

	constructor(private links: Links<Held>) {}

	/** Marks what stands in a cycle. */
	for(seeds: ReadonlySet<Held>): Plan {
		if (this.version !== this.links.version) this.kept.clear();
		this.version = this.links.version;
		if (seeds.size > 1) return this.make(seeds);
		const [only] = seeds;
		const known = this.kept.get(only!);
		if (known) return known;
		if (this.kept.size >= MOST) this.kept.clear();
		const plan = this.make(seeds);
		this.kept.set(only!, plan);
		return plan;
	}

	/** Of all items. */
	whole(all: Iterable<Held>): Plan {
		if (!this.all || this.wholeVersion !== this.links.version) this.all = this.make(new Set(all));
		this.wholeVersion = this.links.version;
		return this.all;
	}

	private make(seeds: ReadonlySet<Held>): Plan {
		const { suppliers, users } = this.links;
		const order: Held[] = [];
		for (const component of components(reach(seeds, users), suppliers)) {
			const cyclic = component.length > 1 || suppliers(component[0]!).includes(component[0]!);
			for (const held of component) held.cyclic = cyclic;
			order.push(...component);
		}
		const places = new Map(order.map((held, i) => [held, i]));
		const found = order.map((held) => users(held).map((user) => places.get(user)!));
		const from = new Int32Array(order.length + 1);
		found.forEach((places, i) => (from[i + 1] = from[i]! + places.length));
		return {
			order,
			seeds: [...seeds].map((held) => places.get(held)!),
			cyclic: order.flatMap((held, i) => (held.cyclic || held.wasCyclic ? [i] : [])),
			users: Int32Array.from(found.flat()),
			from,
			concerns: new Uint8Array(order.length)
		};
	}
}
