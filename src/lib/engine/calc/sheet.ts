/**
 * The sheet: items, the graph of who names whom, and the result of each. An edit parses only what was
 * edited, evaluates only what it reaches and stops where a value stays as it was. The results depend on
 * the items alone, not on the order in which they came.
 */
import { CONSTANTS } from '../quantities/constants';
import { createEntry, type Body, type Entry } from './entry';
import { fault } from './faults';
import { components, reach, wayRound } from './graph';
import type { SheetChange } from './items';
import { nearest } from './near';
import type { Fault, ItemResult, Outcome } from './results';
import { same } from './same';
import type { Scope, Supply } from './scope';

const DEFAULT_THIN_LIMIT = 0.1;

type Held = {
	entry: Entry;
	body: Body | null;
	supplies: ReadonlyMap<string, Supply>;
	cyclic: boolean;
	/** Its words name what lies near an unknown symbol, which any new symbol may change. */
	asksNear: boolean;
	result: ItemResult | null;
};

export type SheetAnswer = { changed: ItemResult[]; removed: string[] };

export interface Sheet {
	/** Takes an edit and answers with the results that it changed. */
	apply(change: SheetChange): SheetAnswer;
	/** All results in sheet order. */
	results(): ItemResult[];
	/** Names that others may use, with the item and the outcome behind each. */
	symbols(): Iterable<{ name: string; id: string; outcome: Outcome }>;
}

export function createSheet(): Sheet {
	return new LiveSheet();
}

class LiveSheet implements Sheet {
	private held = new Map<string, Held>();
	/** Ids that define a name, and ids that mention it. */
	private definers = new Index();
	private mentioners = new Index();
	/** Place of each id on the sheet. */
	private place = new Map<string, number>();
	private thinLimit = DEFAULT_THIN_LIMIT;
	private askedNear = false;

	apply(change: SheetChange): SheetAnswer {
		const removed = (change.remove ?? []).filter((id) => this.held.has(id));
		const upserted = (change.upsert ?? []).filter(
			(item) => !same(this.held.get(item.id)?.entry.item, item)
		);
		const edited = [...removed, ...upserted.map(({ id }) => id)];
		const entries = upserted.map(createEntry);
		const before = this.definersOf([
			...edited.flatMap((id) => this.held.get(id)?.entry.defines ?? []),
			...entries.flatMap(({ defines }) => defines)
		]);
		const linked = this.neighbours(edited);
		for (const id of removed) this.detach(id);
		for (const entry of entries) this.attach(entry);
		if (change.order) this.place = new Map(change.order.map((id, i) => [id, i]));

		const seeds = new Set(edited);
		for (const name of this.redefined(before)) {
			for (const id of [...this.mentioners.of(name), ...this.definers.of(name)]) seeds.add(id);
			for (const [id, { asksNear }] of this.held) if (asksNear) seeds.add(id);
		}
		if (change.thinLimit !== undefined && change.thinLimit !== this.thinLimit) {
			this.thinLimit = change.thinLimit;
			for (const [id, { entry }] of this.held) if (entry.item.kind === 'check') seeds.add(id);
		}
		const evaluated = this.evaluate(seeds);
		// Who names whom has changed around what was edited, before and after.
		const relinked = change.order ? this.held.keys() : [...linked, ...this.neighbours(seeds)];
		return { changed: this.answer([...evaluated, ...relinked]), removed };
	}

	results(): ItemResult[] {
		return this.inOrder([...this.held.keys()]).map((id) => this.held.get(id)!.result!);
	}

	*symbols() {
		for (const [id, { entry, body }] of this.held) {
			if (entry.symbol === '' || !body) continue;
			if (body.kind === 'lineModel') {
				for (const { name, outcome } of body.outputs) {
					yield { name: `${entry.symbol}.${name}`, id, outcome };
				}
			} else if (body.kind !== 'check') yield { name: entry.symbol, id, outcome: body.outcome };
		}
	}

	private attach(entry: Entry) {
		const { id } = entry.item;
		const blank = { body: null, supplies: new Map(), cyclic: false, asksNear: false, result: null };
		const previous = this.held.get(id);
		if (previous) this.detach(id);
		this.held.set(id, { ...(previous ?? blank), entry });
		for (const name of entry.defines) this.definers.add(name, id);
		for (const name of entry.mentions) this.mentioners.add(name, id);
	}

	private detach(id: string) {
		const { entry } = this.held.get(id)!;
		this.held.delete(id);
		for (const name of entry.defines) this.definers.remove(name, id);
		for (const name of entry.mentions) this.mentioners.remove(name, id);
	}

	private definersOf(names: string[]): Map<string, string> {
		return new Map(names.map((name) => [name, [...this.definers.of(name)].sort().join()]));
	}

	/** The names that other items define now than before. */
	private redefined(before: Map<string, string>): string[] {
		const now = this.definersOf([...before.keys()]);
		return [...before.keys()].filter((name) => before.get(name) !== now.get(name));
	}

	private evaluate(seeds: Set<string>): string[] {
		const present = [...seeds].filter((id) => this.held.has(id));
		const reached = reach(present, (id) => this.users(id));
		const moved = new Set<string>();
		const evaluated: string[] = [];
		for (const component of components(reached, (id) => this.suppliers(id))) {
			const [first] = component;
			const cyclic = component.length > 1 || this.suppliers(first!).includes(first!);
			for (const id of component) {
				const held = this.held.get(id)!;
				const due =
					seeds.has(id) ||
					cyclic ||
					held.cyclic ||
					this.suppliers(id).some((supplier) => moved.has(supplier));
				if (!due) continue;
				evaluated.push(id);
				if (this.evaluateOne(id, held, cyclic)) moved.add(id);
			}
		}
		return evaluated;
	}

	/** Whether what others see of the item has changed. */
	private evaluateOne(id: string, held: Held, cyclic: boolean): boolean {
		this.askedNear = false;
		const objection = cyclic ? this.cycleFault(id) : this.doubleDefinition(id, held.entry);
		const { body, supplies } = held.entry.evaluate(this.scope, this.thinLimit, objection);
		const moved = !same([...supplies], [...held.supplies]);
		Object.assign(held, { body, supplies, cyclic, asksNear: this.askedNear });
		return moved;
	}

	private scope: Scope = {
		supply: (name) => {
			const ids = this.definers.of(name);
			const [id] = ids;
			if (id === undefined) return 'unknown';
			if (ids.size > 1) return { state: 'missing', roots: [...ids].sort() };
			const { entry, supplies } = this.held.get(id)!;
			if (entry.item.kind === 'lineModel' && name === entry.symbol) return 'model';
			return supplies.get(name) ?? { state: 'missing', roots: [id] };
		},
		defines: (name) => this.definers.of(name).size > 0,
		near: (name) => {
			this.askedNear = true;
			return nearest(name, [...this.definers.names(), ...CONSTANTS.keys()]);
		}
	};

	private doubleDefinition(id: string, { symbol }: Entry): Fault | null {
		const others = [...this.definers.of(symbol)].filter((other) => other !== id).sort();
		if (symbol === '' || others.length === 0) return null;
		return fault('double-definition', `${symbol} is defined more than once in this note.`, {
			remedy: 'Give one of them another symbol.',
			span: { field: 'symbol', from: 0, to: symbol.length },
			items: others
		});
	}

	private cycleFault(id: string): Fault {
		const way = wayRound(id, (at) => this.suppliers(at));
		const steps = way.map((to, i) => this.nameUsed(way[i - 1] ?? id, to));
		const own = steps.at(-1)!;
		return fault('cycle', `${own} depends on itself: ${[own, ...steps].join(' → ')}.`, {
			remedy: 'Break the circle at one of them.',
			items: way.slice(0, -1)
		});
	}

	/** The name by which one item mentions another. */
	private nameUsed(from: string, to: string): string {
		const { mentions } = this.held.get(from)!.entry;
		return mentions.find((name) => this.definers.of(name).has(to))!;
	}

	private suppliers(id: string): string[] {
		const mentions = this.held.get(id)?.entry.mentions ?? [];
		return [...new Set(mentions.flatMap((name) => [...this.definers.of(name)].sort()))];
	}

	private users(id: string): Set<string> {
		const defines = this.held.get(id)?.entry.defines ?? [];
		return new Set(defines.flatMap((name) => [...this.mentioners.of(name)]));
	}

	private neighbours(ids: Iterable<string>): Set<string> {
		return new Set([...ids].flatMap((id) => [id, ...this.suppliers(id), ...this.users(id)]));
	}

	/** The results among these ids that are not what was last told. */
	private answer(ids: Iterable<string>): ItemResult[] {
		return this.inOrder([...new Set(ids)].filter((id) => this.held.has(id))).flatMap((id) => {
			const held = this.held.get(id)!;
			const result = {
				...held.body!,
				uses: this.inOrder(this.suppliers(id)),
				usedIn: this.inOrder([...this.users(id)])
			} as ItemResult;
			if (same(result, held.result)) return [];
			held.result = result;
			return [result];
		});
	}

	private inOrder(ids: string[]): string[] {
		const at = (id: string) => this.place.get(id) ?? Infinity;
		return ids.sort((a, b) => (at(a) === at(b) ? (a < b ? -1 : 1) : at(a) - at(b)));
	}
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

	names(): string[] {
		return [...this.ids.keys()];
	}
}
