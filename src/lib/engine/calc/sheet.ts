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
import { Links } from './links';
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
	private links = new Links();
	private thinLimit = DEFAULT_THIN_LIMIT;
	private askedNear = false;

	apply(change: SheetChange): SheetAnswer {
		const removed = (change.remove ?? []).filter((id) => this.held.has(id));
		const upserted = (change.upsert ?? []).filter(
			(item) => removed.includes(item.id) || !same(this.held.get(item.id)?.entry.item, item)
		);
		const edited = [...removed, ...upserted.map(({ id }) => id)];
		const neighbours = edited.flatMap((id) => this.neighbours(id));
		const redefined = new Set<string>();
		const relink = (id: string, entry: Entry | null) =>
			this.links.relink(id, entry).forEach((name) => redefined.add(name));

		for (const id of removed) {
			this.held.delete(id);
			relink(id, null);
		}
		for (const item of upserted) {
			const entry = createEntry(item);
			this.held.set(item.id, { ...(this.held.get(item.id) ?? UNEVALUATED), entry });
			relink(item.id, entry);
		}
		if (change.order) this.links.arrange(change.order);

		const seeds = new Set(edited.filter((id) => this.held.has(id)));
		for (const id of this.bornOn(redefined)) seeds.add(id);
		if (change.thinLimit !== undefined && change.thinLimit !== this.thinLimit) {
			this.thinLimit = change.thinLimit;
			for (const [id, { entry }] of this.held) if (entry.item.kind === 'check') seeds.add(id);
		}
		const evaluated = this.evaluate(seeds);
		for (const id of seeds) neighbours.push(...this.neighbours(id));
		const relinked = change.order ? this.held.keys() : neighbours;
		const told = removed.filter((id) => !this.held.has(id));
		return { changed: this.answer(new Set([...evaluated, ...relinked])), removed: told };
	}

	results(): ItemResult[] {
		return this.links.inOrder(this.held.keys()).map((id) => this.held.get(id)!.result!);
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

	/** Items on which it bears that other items define these names now than before. */
	private bornOn(redefined: Set<string>): string[] {
		if (redefined.size === 0) return [];
		const named = [...redefined].flatMap((name) => [
			...this.links.mentioners(name),
			...this.links.definers(name)
		]);
		const near = [...this.held].filter(([, { asksNear }]) => asksNear).map(([id]) => id);
		return [...named, ...near];
	}

	private evaluate(seeds: Set<string>): string[] {
		const { suppliers, users } = this.links;
		const moved = new Set<string>();
		const evaluated: string[] = [];
		for (const component of components(reach(seeds, users), suppliers)) {
			const cyclic = component.length > 1 || suppliers(component[0]!).includes(component[0]!);
			for (const id of component) {
				const held = this.held.get(id)!;
				const due =
					cyclic || held.cyclic || seeds.has(id) || suppliers(id).some((other) => moved.has(other));
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
		const before = held.supplies;
		held.body = body;
		held.supplies = supplies;
		held.cyclic = cyclic;
		held.asksNear = this.askedNear;
		return !sameSupplies(before, supplies);
	}

	private scope: Scope = {
		supply: (name) => {
			const ids = this.links.definers(name);
			const [id] = ids;
			if (id === undefined) return 'unknown';
			if (ids.size > 1) return { state: 'missing', roots: [...ids].sort() };
			const { entry, supplies } = this.held.get(id)!;
			if (entry.item.kind === 'lineModel' && name === entry.symbol) return 'model';
			return supplies.get(name) ?? { state: 'missing', roots: [id] };
		},
		defines: (name) => this.links.definers(name).size > 0,
		near: (name) => {
			this.askedNear = true;
			return nearest(name, [...this.links.definedNames(), ...CONSTANTS.keys()]);
		}
	};

	private doubleDefinition(id: string, { symbol }: Entry): Fault | null {
		const definers = this.links.definers(symbol);
		if (symbol === '' || definers.size < 2) return null;
		return fault('double-definition', `${symbol} is defined more than once in this note.`, {
			remedy: 'Give one of them another symbol.',
			span: { field: 'symbol', from: 0, to: symbol.length },
			items: [...definers].filter((other) => other !== id).sort()
		});
	}

	private cycleFault(id: string): Fault {
		const way = wayRound(id, this.links.suppliers);
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
		return mentions.find((name) => this.links.definers(name).has(to))!;
	}

	private neighbours(id: string): string[] {
		return [id, ...this.links.suppliers(id), ...this.links.users(id)];
	}

	/** The results among these ids that are not what was last told, in sheet order. */
	private answer(ids: Set<string>): ItemResult[] {
		const changed: ItemResult[] = [];
		for (const id of this.links.inOrder(ids)) {
			const held = this.held.get(id);
			if (!held) continue;
			const uses = this.links.uses(id);
			const usedIn = this.links.usedIn(id);
			const result = { ...held.body!, uses, usedIn } as ItemResult;
			if (same(result, held.result)) continue;
			held.result = result;
			changed.push(result);
		}
		return changed;
	}
}

const UNEVALUATED: Omit<Held, 'entry'> = {
	body: null,
	supplies: new Map(),
	cyclic: false,
	asksNear: false,
	result: null
};

function sameSupplies(a: ReadonlyMap<string, Supply>, b: ReadonlyMap<string, Supply>): boolean {
	if (a.size !== b.size) return false;
	for (const [name, supply] of b) if (!same(a.get(name), supply)) return false;
	return true;
}
