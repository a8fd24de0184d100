/** What changed in a note since a baseline, item by item: the words beside the revision triangle. */
import { marginWords, outcomeWords } from '../components/note/figures';
import { formatFigure } from '../engine/quantities/format';
import type { ItemResult, Outcome } from '../engine/calc/results';
import { withAdded } from './added';
import type { Item, ItemOf } from './items';
import type { Prose } from './prose';
import { changedFields, readingMoved, readingsOf, type Side } from './readings';
import { proseTokens } from './tokens';
import { differenceOf } from './words';

export type ItemChange = {
	kind: 'added' | 'changed';
	/** What it was, in a few words: "91 000", "+0.105", "14 words new". */
	words: string;
	/** Outputs of a line model that moved, with what they were. */
	outputs: Record<string, string>;
	/** Of a text that has new words: the prose that was looked at, and the same with them marked. */
	text?: { of: Prose; marked: Prose };
};

export type ChangesSince = {
	items: Map<string, ItemChange>;
	/** Ids of items that the baseline has and the note has no longer. */
	removed: string[];
	added: number;
	changed: number;
};

/** What fields are called where they are all that changed. */
export const FIELD_WORDS: Record<string, string> = {
	kind: 'kind',
	title: 'title',
	body: 'body',
	symbol: 'symbol',
	description: 'wording',
	value: 'value',
	unit: 'unit',
	uncertainty: 'uncertainty',
	source: 'source',
	taken: 'where it is taken from',
	expression: 'formula',
	digits: 'digits',
	left: 'left side',
	relation: 'relation',
	right: 'right side',
	tolerance: 'tolerance',
	required: 'required margin',
	j2: 'J2',
	gm: 'gravitational parameter',
	radius: 'radius',
	period: 'period of rotation',
	oblateness: 'J2',
	primaryGm: 'primary',
	distance: 'distance',
	density: 'density',
	allowable: 'allowable',
	factorOfSafety: 'factor of safety',
	baseMode: 'base',
	lift: 'lift',
	reserve: 'reserve',
	area: 'base area',
	top: 'top',
	files: 'files'
};

export function changesSince(letter: string, baseline: Side, now: Side): ChangesSince {
	const before = byId(baseline);
	const after = byId(now);
	const items = new Map<string, ItemChange>();
	for (const [id, { item, result }] of after) {
		const was = before.get(id);
		const change = was
			? itemChange(was, { item, result })
			: { kind: 'added' as const, words: `not in ${letter}`, outputs: {} };
		if (change) items.set(id, change);
	}
	const added = [...items.values()].filter((change) => change.kind === 'added').length;
	return {
		items,
		removed: [...before.keys()].filter((id) => !after.has(id)),
		added,
		changed: items.size - added
	};
}

export type Entry = { item: Item; result: ItemResult | undefined };

function byId({ content, results }: Side): Map<string, Entry> {
	const found = new Map(results.map((result) => [result.id, result]));
	return new Map(content.items.map((item) => [item.id, { item, result: found.get(item.id) }]));
}

/** Null when neither what is typed nor what follows from it changed. */
export function itemChange(before: Entry, after: Entry): ItemChange | null {
	const fields = changedFields(before.item, after.item);
	const was = readingsOf(before.item, before.result);
	const moved = readingsOf(after.item, after.result).flatMap((reading) => {
		const earlier = was.find(({ output }) => output === reading.output);
		return earlier && readingMoved(earlier, reading) ? [{ earlier, reading }] : [];
	});
	if (fields.length === 0 && moved.length === 0) return null;
	const change = { kind: 'changed' as const, outputs: {} };
	if (after.item.kind === 'lineModel') {
		const outputs = Object.fromEntries(
			moved.map(({ earlier, reading }) => [
				reading.output,
				wasWords(earlier.outcome, reading.outcome)
			])
		);
		return { ...change, outputs, words: typedWords(before.item, fields) || 'by its inputs' };
	}
	if (after.item.kind === 'text' && before.item.kind === 'text') {
		return { ...change, ...textChange(before.item, after.item) };
	}
	if (after.item.kind === 'evidence' && before.item.kind === 'evidence' && fields.includes('files'))
		return { ...change, words: fileWords(before.item, after.item) };
	const [first] = moved;
	if (!first) return { ...change, words: typedWords(before.item, fields) };
	const { earlier, reading } = first;
	if (earlier.check) {
		return {
			...change,
			words: earlier.check.margin ? marginWords(earlier.check.margin) : earlier.check.state
		};
	}
	return { ...change, words: wasWords(earlier.outcome, reading.outcome) };
}

/** The value before, with its unit only where the unit is another now. */
function wasWords(before: Outcome, after: Outcome): string {
	if (before.state === 'value' && after.state === 'value') {
		const { value, unit, digits } = before.quantity;
		if (unit === after.quantity.unit) return formatFigure(value, digits);
	}
	return outcomeWords(before);
}

/** One field as it was typed; of several, their names. */
function typedWords(before: Item, fields: string[]): string {
	const names = fields.map((field) => FIELD_WORDS[field] ?? field);
	const value = (before as unknown as Record<string, unknown>)[fields[0] ?? ''];
	if (names.length === 1 && typeof value === 'string' && value !== '' && value.length <= 12)
		return `${names[0]} ${value}`;
	return names.length > 2 ? `${names.length} fields` : names.join(', ');
}

function textChange({ body: before }: ItemOf<'text'>, { body: of }: ItemOf<'text'>) {
	const { wordsIn, wordsOut } = differenceOf(proseTokens(before), proseTokens(of));
	const count = (n: number, word: string) => `${n} ${n === 1 ? 'word' : 'words'} ${word}`;
	if (wordsIn > 0)
		return { words: count(wordsIn, 'new'), text: { of, marked: withAdded(before, of) } };
	return { words: wordsOut > 0 ? count(wordsOut, 'out') : 'set otherwise' };
}

function fileWords(before: ItemOf<'evidence'>, after: ItemOf<'evidence'>): string {
	const [was, is] = [before, after].map(({ files }) => new Set(files.map((file) => file.fileId)));
	const fresh = [...is!].filter((id) => !was!.has(id)).length;
	const gone = [...was!].filter((id) => !is!.has(id)).length;
	const words = [fresh > 0 && `${fresh} new`, gone > 0 && `${gone} out`].filter(Boolean);
	return words.join(', ') || 'order of files';
}
