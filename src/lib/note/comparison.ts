/** Two baselines, or a baseline and now, held against each other: what moved, by what, and what reads otherwise. */
import { changedFields, readingMoved, readingsOf, relativeChange } from './readings';
import type { Reading, Side } from './readings';
import { FIELD_WORDS } from './compare';
import type { Item } from './items';
import { numberItems } from './numbering';
import { proseTokens, textTokens } from './tokens';
import { differenceOf, type TextDifference } from './words';

export type Cause =
	/** Its own text was changed: the names of the fields. */
	| { kind: 'typed'; fields: string[] }
	/** Items that it uses moved: their numbers, what moved most first. */
	| { kind: 'upstream'; numbers: string[] }
	| { kind: 'thin limit' }
	/** Nothing that it reads changed: another version of the engine. */
	| { kind: 'engine' };

export type Movement = {
	before: Reading;
	after: Reading;
	number: string;
	/** Relative change of the value; null where one side has none. */
	change: number | null;
	cause: Cause;
};

export type Entry = { item: Item; number: string; readings: Reading[] };

/** A field that reads otherwise; its number is the one it has after. */
export type Wording = { item: Item; number: string; field: string; difference: TextDifference };

export type Comparison = {
	/** What moved most first. */
	movements: Movement[];
	added: Entry[];
	removed: Entry[];
	wordings: Wording[];
	thinLimit: { before: string; after: string } | null;
	/** Items that neither moved nor read otherwise. */
	unchanged: number;
};

export function compare(from: Side, to: Side): Comparison {
	const before = entriesOf(from);
	const after = entriesOf(to);
	const pairs = [...after].flatMap(([id, now]) => {
		const was = before.get(id);
		return was ? [{ was, now, fields: changedFields(was.item, now.item) }] : [];
	});
	const limitMoved = from.content.thinLimit !== to.content.thinLimit;
	const moved = pairs.flatMap(({ was, now }) => movedReadings(was, now));
	const uses = new Map(to.results.map((result) => [result.id, result.uses]));
	const fieldsOf = new Map(pairs.map(({ now, fields }) => [now.item.id, fields]));

	const movements = moved.map((movement): Movement => {
		const id = movement.after.itemId;
		const typed = (fieldsOf.get(id) ?? []).filter((field) => !WORDING_ONLY.has(field));
		if (typed.length > 0) return { ...movement, cause: { kind: 'typed', fields: typed } };
		const upstream = moved.filter(({ after }) => uses.get(id)?.includes(after.itemId));
		if (upstream.length > 0) {
			const numbers = new Set(upstream.sort(mostFirst).map(({ number }) => number));
			return { ...movement, cause: { kind: 'upstream', numbers: [...numbers] } };
		}
		return { ...movement, cause: { kind: limitMoved ? 'thin limit' : 'engine' } };
	});
	const movedIds = new Set(moved.map(({ after }) => after.itemId));

	return {
		movements: movements.sort(mostFirst),
		added: [...after].filter(([id]) => !before.has(id)).map(([, entry]) => entry),
		removed: [...before].filter(([id]) => !after.has(id)).map(([, entry]) => entry),
		wordings: pairs.flatMap(({ was, now, fields }) =>
			fields
				.filter((field) => !(now.item.kind === 'given' && field === 'value'))
				.map((field) => wording(was.item, now, field))
		),
		thinLimit: limitMoved ? { before: from.content.thinLimit, after: to.content.thinLimit } : null,
		unchanged: pairs.filter(({ now, fields }) => fields.length === 0 && !movedIds.has(now.item.id))
			.length
	};
}

/** Fields that no figure follows from. */
const WORDING_ONLY = new Set(['description', 'source', 'title', 'digits']);

function entriesOf({ content, results }: Side): Map<string, Entry> {
	const numbers = numberItems(content.items);
	const byId = new Map(results.map((result) => [result.id, result]));
	return new Map(
		content.items.map((item) => [
			item.id,
			{
				item,
				number: numbers.get(item.id) ?? '',
				readings: readingsOf(item, byId.get(item.id))
			}
		])
	);
}

type Moved = Omit<Movement, 'cause'>;

function movedReadings(was: Entry, now: Entry): Moved[] {
	return now.readings.flatMap((after) => {
		const before = was.readings.find(({ output }) => output === after.output);
		if (!before || !readingMoved(before, after)) return [];
		const change = relativeChange(before.outcome, after.outcome);
		return [{ before, after, number: now.number, change }];
	});
}

const mostFirst = (a: Moved, b: Moved) => (weight(a) === weight(b) ? 0 : weight(b) - weight(a));

/** A value lost or gained weighs more than any change; where only the margin moved, it counts. */
function weight({ before, after, change }: Moved): number {
	if (change === null) return Infinity;
	if (change !== 0) return Math.abs(change);
	return Math.abs((after.check?.margin?.relative ?? 0) - (before.check?.margin?.relative ?? 0));
}

function wording(before: Item, { item, number }: Entry, field: string): Wording {
	const name = item.kind === 'text' && field === 'body' ? 'text' : (FIELD_WORDS[field] ?? field);
	const difference = differenceOf(fieldTokens(before, field), fieldTokens(item, field));
	return { item, number, field: name, difference };
}

function fieldTokens(item: Item, field: string) {
	if (item.kind === 'text' && field === 'body') return proseTokens(item.body);
	if (item.kind === 'evidence' && field === 'files')
		return item.files.flatMap((file) => textTokens(`${file.name} `));
	return textTokens(String((item as unknown as Record<string, unknown>)[field] ?? ''));
}
