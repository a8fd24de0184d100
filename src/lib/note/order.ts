/**
 * The order of items: each holds a fractional index, so that a move is one field and concurrent moves
 * converge. Equal keys fall back to the id.
 */
import { generateKeyBetween } from 'fractional-indexing';
import type * as Y from 'yjs';
import { heldItem, itemsMap, type ItemMap } from './document';

const FIRST_KEY = generateKeyBetween(null, null);

/** An item's key. A document can hold anything there; what is no key counts as the first one. */
function orderKey(item: ItemMap): string {
	const key = item.get('order');
	// The library looks at the form of a key, not at its letters.
	if (typeof key !== 'string' || !/^[0-9A-Za-z]+$/.test(key)) return FIRST_KEY;
	try {
		generateKeyBetween(key, null);
		return key;
	} catch {
		return FIRST_KEY;
	}
}

function keyed(doc: Y.Doc): { id: string; key: string }[] {
	const all: { id: string; key: string }[] = [];
	for (const id of itemsMap(doc).keys()) {
		const item = heldItem(doc, id);
		if (item) all.push({ id, key: orderKey(item) });
	}
	return all.sort((a, b) => (a.key === b.key ? (a.id < b.id ? -1 : 1) : a.key < b.key ? -1 : 1));
}

/** Ids in the order of the sheet. */
export function orderedIds(doc: Y.Doc): string[] {
	return keyed(doc).map(({ id }) => id);
}

/** A gap in the order, between two keys or at an end. */
export type Gap = { below: string | null; above: string | null };

/** The gap below `after` (null: above all), with `skip` taken out of the order first. */
export function gapAfter(doc: Y.Doc, after: string | null, skip?: string): Gap {
	const order = keyed(doc).filter(({ id }) => id !== skip);
	const index = after === null ? -1 : order.findIndex(({ id }) => id === after);
	const below = order[index]?.key ?? null;
	// Equal keys leave no room between them: go past all that are equal.
	const above = order.slice(index + 1).find(({ key }) => below === null || key > below)?.key;
	return { below, above: above ?? null };
}

/**
 * A key in the gap. Two people who insert in the same place at once would get the same key if it were
 * always the middle; a few random halvings keep them apart, at the cost of about two characters.
 */
export function keyIn({ below, above }: Gap): string {
	let [low, high] = [below, above];
	let key = generateKeyBetween(low, high);
	for (let halving = 0; halving < 12; halving++) {
		if (Math.random() < 0.5) low = key;
		else high = key;
		key = generateKeyBetween(low, high);
	}
	return key;
}
