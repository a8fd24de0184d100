/** What the sheet itself has against an item: its symbol is defined twice, or it depends on itself. */
import { fault } from './faults';
import { wayRound } from './graph';
import type { Held } from './held';
import { byId, type Links } from './links';
import type { Fault } from './results';

export function objectionTo(held: Held, links: Links<Held>): Fault | null {
	return held.cyclic ? cycleFault(held, links) : doubleDefinition(held, links);
}

function doubleDefinition(held: Held, links: Links<Held>): Fault | null {
	const { symbol } = held.entry;
	const definers = links.definers(symbol);
	if (symbol === '' || definers.size < 2) return null;
	const others = [...definers].filter((other) => other !== held).sort(byId);
	return fault('double-definition', `${symbol} is defined more than once in this note.`, {
		remedy: 'Give one of them another symbol.',
		span: { field: 'symbol', from: 0, to: symbol.length },
		items: others.map(({ id }) => id)
	});
}

function cycleFault(held: Held, links: Links<Held>): Fault {
	const way = wayRound(held, links.suppliers);
	const steps = way.map((to, i) => nameUsed(way[i - 1] ?? held, to, links));
	const own = steps.at(-1)!;
	return fault('cycle', `${own} depends on itself: ${[own, ...steps].join(' → ')}.`, {
		remedy: 'Break the circle at one of them.',
		items: way.slice(0, -1).map(({ id }) => id)
	});
}

/** The name by which one item mentions another. */
const nameUsed = (from: Held, to: Held, links: Links<Held>) =>
	from.entry.mentions.find((name) => links.definers(name).has(to))!;
