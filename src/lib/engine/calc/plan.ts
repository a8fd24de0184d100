/** What an edit may reach, in order of evaluation; kept while links stay, for edits that come again. */
import { components, reach } from './graph';
import type { Held } from './held';
import type { Links } from './links';

/** Suppliers first, and for each the items that name it. */
export type Plan = { order: readonly Held[]; users: readonly (readonly Held[])[] };

/** Edits go to and fro between a few items; each plan is as long as what its item reaches. */
const MOST = 8;

export class Plans {
	private kept = new Map<Held, Plan>();
	private version = 0;
	private all: Plan = { order: [], users: [] };
	private wholeVersion = 0;

	constructor(private links: Links<Held>) {}

	/** Marks what stands in a cycle. */
	for(seeds: ReadonlySet<Held>): Plan {
		if (this.version !== this.links.version || this.kept.size >= MOST) this.kept.clear();
		this.version = this.links.version;
		if (seeds.size > 1) return this.make(seeds);
		const [only] = seeds;
		const plan = this.kept.get(only!) ?? this.make(seeds);
		this.kept.set(only!, plan);
		return plan;
	}

	/** Of all items. */
	whole(all: Iterable<Held>): Plan {
		if (this.wholeVersion !== this.links.version) this.all = this.make(new Set(all));
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
		return { order, users: order.map(users) };
	}
}
