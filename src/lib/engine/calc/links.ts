/** Who names whom: names with the nodes that define and mention them, and from it each node's neighbours. */

export type Linked = {
	/** Names that others may use. */
	readonly defines: readonly string[];
	/** Names whose definition bears on the node, in order of mention. */
	readonly mentions: readonly string[];
};

type Node = { readonly id: string; /** In sheet order. */ place: number };

const NOTHING: Linked = { defines: [], mentions: [] };

export class Links<T extends Node> {
	/** Counts up whenever a link or the order changes. */
	version = 0;
	private linked = new Map<T, Linked>();
	private definersByName = new Index<T>();
	private mentionersByName = new Index<T>();
	private place = new Map<string, number>();
	/** Neighbours found so far; emptied when a link or the order changes. */
	private found = {
		suppliers: new Map<T, readonly T[]>(),
		users: new Map<T, readonly T[]>(),
		uses: new Map<T, string[]>(),
		usedIn: new Map<T, string[]>()
	};

	/** The node and those whose neighbours change when it is linked so (null: not at all); none where all links stay. */
	touchedBy(node: T, now: Linked | null): T[] {
		const before = this.linked.get(node) ?? NOTHING;
		const after = now ?? NOTHING;
		if (sameLinks(before, after)) return [];
		const found = [node, ...this.suppliers(node), ...this.users(node)];
		for (const name of after.mentions) found.push(...this.definers(name));
		for (const name of after.defines) found.push(...this.mentioners(name));
		return found;
	}

	/** Links a node anew (null: it is gone); returns the names that other nodes define now than before. */
	relink(node: T, now: Linked | null): string[] {
		const before = this.linked.get(node) ?? NOTHING;
		const after = now ?? NOTHING;
		const came = now !== null && !this.linked.has(node);
		if (came) node.place = this.place.get(node.id) ?? Infinity;
		if (now) this.linked.set(node, now);
		else this.linked.delete(node);
		if (now && !came && sameLinks(before, after)) return [];
		for (const name of before.defines) this.definersByName.remove(name, node);
		for (const name of before.mentions) this.mentionersByName.remove(name, node);
		for (const name of after.defines) this.definersByName.add(name, node);
		for (const name of after.mentions) this.mentionersByName.add(name, node);
		this.forget();
		if (alike(before.defines, after.defines)) return [];
		const kept = before.defines.filter((name) => after.defines.includes(name));
		return [...before.defines, ...after.defines].filter((name) => !kept.includes(name));
	}

	arrange(order: readonly string[], nodes: Iterable<T>): void {
		this.place = new Map(order.map((id, i) => [id, i]));
		for (const node of nodes) node.place = this.place.get(node.id) ?? Infinity;
		this.forget();
	}

	definers(name: string): ReadonlySet<T> {
		return this.definersByName.of(name);
	}

	mentioners(name: string): ReadonlySet<T> {
		return this.mentionersByName.of(name);
	}

	definedNames(): Iterable<string> {
		return this.definersByName.names();
	}

	/** Nodes that this one names, in order of mention. */
	suppliers = (node: T): readonly T[] =>
		kept(this.found.suppliers, node, () => {
			const { mentions } = this.linked.get(node) ?? NOTHING;
			return unique(mentions.flatMap((name) => [...this.definers(name)].sort(byId)));
		});

	/** Nodes that name this one. */
	users = (node: T): readonly T[] =>
		kept(this.found.users, node, () => {
			const { defines } = this.linked.get(node) ?? NOTHING;
			return unique(defines.flatMap((name) => [...this.mentioners(name)]));
		});

	/** Their ids in sheet order. */
	uses(node: T): string[] {
		return kept(this.found.uses, node, () => inOrder([...this.suppliers(node)]).map(idOf));
	}

	usedIn(node: T): string[] {
		return kept(this.found.usedIn, node, () => inOrder([...this.users(node)]).map(idOf));
	}

	private forget() {
		this.version += 1;
		for (const cache of Object.values(this.found)) cache.clear();
	}
}

/** Sorts nodes into sheet order; those that the order does not name come last, by id. */
export function inOrder<T extends Node>(nodes: T[]): T[] {
	return nodes.sort((a, b) => (a.place === b.place ? byId(a, b) : a.place - b.place));
}

const idOf = ({ id }: { id: string }) => id;
export const byId = (a: { id: string }, b: { id: string }) =>
	a.id < b.id ? -1 : a.id > b.id ? 1 : 0;

const sameLinks = (a: Linked, b: Linked) =>
	alike(a.defines, b.defines) && alike(a.mentions, b.mentions);

export const alike = (a: readonly string[], b: readonly string[]) =>
	a.length === b.length && a.every((name, i) => name === b[i]);

const unique = <T>(nodes: T[]) => (nodes.length > 1 ? [...new Set(nodes)] : nodes);

function kept<T, Found>(cache: Map<T, Found>, node: T, find: () => Found): Found {
	let value = cache.get(node);
	if (value === undefined) {
		value = find();
		cache.set(node, value);
	}
	return value;
}

/** Nodes by name. */
class Index<T> {
	private nodes = new Map<string, Set<T>>();
	private none: ReadonlySet<T> = new Set();

	of(name: string): ReadonlySet<T> {
		return this.nodes.get(name) ?? this.none;
	}

	add(name: string, node: T) {
		const nodes = this.nodes.get(name);
		if (nodes) nodes.add(node);
		else this.nodes.set(name, new Set([node]));
	}

	remove(name: string, node: T) {
		const nodes = this.nodes.get(name);
		nodes?.delete(node);
		if (nodes?.size === 0) this.nodes.delete(name);
	}

	names(): Iterable<string> {
		return this.nodes.keys();
	}
}
