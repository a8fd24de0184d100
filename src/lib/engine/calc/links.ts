/** Who names whom: names with the items that define and mention them, and from it each item's neighbours. */

export type Linked = {
	/** Names that others may use. */
	defines: readonly string[];
	/** Names whose definition bears on the item, in order of mention. */
	mentions: readonly string[];
};

const NOTHING: Linked = { defines: [], mentions: [] };

export class Links {
	private entries = new Map<string, Linked>();
	private definersByName = new Index();
	private mentionersByName = new Index();
	private place = new Map<string, number>();
	/** Neighbours found so far; emptied when a link or the order changes. */
	private found = {
		suppliers: new Map<string, readonly string[]>(),
		users: new Map<string, readonly string[]>(),
		uses: new Map<string, string[]>(),
		usedIn: new Map<string, string[]>()
	};

	/** Links an item anew (null: it is gone); returns the names that other items define now than before. */
	relink(id: string, entry: Linked | null): string[] {
		const before = this.entries.get(id) ?? NOTHING;
		const now = entry ?? NOTHING;
		if (entry) this.entries.set(id, entry);
		else this.entries.delete(id);
		const sameNames = alike(before.defines, now.defines);
		if (sameNames && alike(before.mentions, now.mentions)) return [];
		for (const name of before.defines) this.definersByName.remove(name, id);
		for (const name of before.mentions) this.mentionersByName.remove(name, id);
		for (const name of now.defines) this.definersByName.add(name, id);
		for (const name of now.mentions) this.mentionersByName.add(name, id);
		this.forget();
		if (sameNames) return [];
		const kept = before.defines.filter((name) => now.defines.includes(name));
		return [...before.defines, ...now.defines].filter((name) => !kept.includes(name));
	}

	arrange(order: readonly string[]): void {
		this.place = new Map(order.map((id, i) => [id, i]));
		this.forget();
	}

	definers(name: string): ReadonlySet<string> {
		return this.definersByName.of(name);
	}

	mentioners(name: string): ReadonlySet<string> {
		return this.mentionersByName.of(name);
	}

	definedNames(): Iterable<string> {
		return this.definersByName.names();
	}

	/** Items that this one names, in order of mention. */
	suppliers = (id: string): readonly string[] =>
		kept(this.found.suppliers, id, () => {
			const { mentions } = this.entries.get(id) ?? NOTHING;
			return unique(mentions.flatMap((name) => [...this.definers(name)].sort()));
		});

	/** Items that name this one. */
	users = (id: string): readonly string[] =>
		kept(this.found.users, id, () => {
			const { defines } = this.entries.get(id) ?? NOTHING;
			return unique(defines.flatMap((name) => [...this.mentioners(name)]));
		});

	/** The same in sheet order. */
	uses(id: string): string[] {
		return kept(this.found.uses, id, () => this.inOrder(this.suppliers(id)));
	}

	usedIn(id: string): string[] {
		return kept(this.found.usedIn, id, () => this.inOrder(this.users(id)));
	}

	/** Ids that the order does not name come last. */
	inOrder(ids: Iterable<string>): string[] {
		const at = (id: string) => this.place.get(id) ?? Infinity;
		return [...ids].sort((a, b) => (at(a) === at(b) ? (a < b ? -1 : 1) : at(a) - at(b)));
	}

	private forget() {
		for (const cache of Object.values(this.found)) cache.clear();
	}
}

const alike = (a: readonly string[], b: readonly string[]) =>
	a.length === b.length && a.every((name, i) => name === b[i]);

const unique = (ids: string[]) => (ids.length > 1 ? [...new Set(ids)] : ids);

function kept<T>(cache: Map<string, T>, id: string, find: () => T): T {
	let value = cache.get(id);
	if (value === undefined) {
		value = find();
		cache.set(id, value);
	}
	return value;
}

/** Ids by name. */
class Index {
	private ids = new Map<string, Set<string>>();
	private static none: ReadonlySet<string> = new Set();

	of(name: string): ReadonlySet<string> {
		return this.ids.get(name) ?? Index.none;
	}

	add(name: string, id: string) {
		const ids = this.ids.get(name);
		if (ids) ids.add(id);
		else this.ids.set(name, new Set([id]));
	}

	remove(name: string, id: string) {
		const ids = this.ids.get(name);
		ids?.delete(id);
		if (ids?.size === 0) this.ids.delete(name);
	}

	names(): Iterable<string> {
		return this.ids.keys();
	}
}
