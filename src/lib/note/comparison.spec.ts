import { expect, test } from 'vitest';
import type { CheckResult, ItemResult, Outcome, QuantityResult } from '../engine/calc/results';
import { changesSince } from './compare';
import { compare } from './comparison';
import { BLANK, type Item } from './items';
import type { Side } from './readings';

const STRESS = [-1, 1, -2];
const gigapascal = (value: number): Outcome => ({
	state: 'value',
	quantity: { si: value * 1e9, dimension: STRESS, value, unit: 'GPa', uncertainty: null, digits: 3 }
});
const ratio = (value: number): Outcome => ({
	state: 'value',
	quantity: { si: value, dimension: [], value, unit: '', uncertainty: null, digits: 3 }
});

const quantity = (
	id: string,
	symbol: string,
	outcome: Outcome,
	uses: string[] = []
): QuantityResult => ({
	id,
	kind: uses.length > 0 ? 'calculation' : 'given',
	symbol,
	outcome,
	tex: '',
	symbolTex: symbol,
	uses,
	usedIn: []
});

const check = (
	state: CheckResult['state'],
	margin: number,
	left: Outcome,
	uses: string[]
): CheckResult => ({
	id: 'check',
	kind: 'check',
	state,
	left,
	right: gigapascal(50),
	tolerance: null,
	required: 0,
	margin: { kind: 'ratio', value: margin, unit: '', relative: margin },
	shortBy: null,
	faults: [],
	tex: '',
	uses,
	usedIn: []
});

const section = (id: string, title: string): Item => ({ ...BLANK.section, id, title }) as Item;
const given = (id: string, symbol: string, value: string, more = {}): Item =>
	({ ...BLANK.given, id, symbol, value, ...more }) as Item;
const calculation = (id: string, symbol: string, expression: string): Item =>
	({ ...BLANK.calculation, id, symbol, expression }) as Item;
const text = (id: string, words: string): Item =>
	({
		...BLANK.text,
		id,
		body: {
			type: 'doc',
			content: [{ type: 'paragraph', content: [{ type: 'text', text: words }] }]
		}
	}) as Item;
const stress = { ...BLANK.check, id: 'check', left: 'σ_j', right: 'σ_d' } as Item;

const side = (items: Item[], results: ItemResult[], thinLimit = '0.10'): Side => ({
	content: { format: 'holdfast-note', version: 1, thinLimit, items },
	results
});

// A joint of full strength before, one of 0.944 now: 50 GPa × 0.944 = 47.2 GPa, 5.6 % less.
const before = side(
	[
		section('s', 'Sizing'),
		text('t', 'The joints are taken as strong as the tape.'),
		given('eta', 'η_j', '1.000'),
		calculation('sigma', 'σ_j', 'η_j * σ_d'),
		stress,
		calculation('old', 'H_0', '1')
	],
	[
		quantity('eta', 'η_j', ratio(1)),
		quantity('sigma', 'σ_j', gigapascal(50), ['eta']),
		check('holds', 0, gigapascal(50), ['sigma']),
		quantity('old', 'H_0', ratio(1))
	]
);
const now = side(
	[
		section('s', 'Sizing'),
		given('eta', 'η_j', '0.944', { source: 'Coupons' }),
		text('t', 'The joints are weaker than the tape.'),
		calculation('sigma', 'σ_j', 'η_j * σ_d'),
		stress,
		calculation('new', 'k_j', '1/η_j')
	],
	[
		quantity('eta', 'η_j', ratio(0.944)),
		quantity('sigma', 'σ_j', gigapascal(47.2), ['eta']),
		check('fails', -0.056, gigapascal(47.2), ['sigma']),
		quantity('new', 'k_j', ratio(1.059), ['eta'])
	]
);

test('a comparison gives each figure that moved, by how much and by what', () => {
	const { movements } = compare(before, now);
	expect(movements.map(({ number, change, cause }) => [number, change, cause])).toEqual([
		['1.1', expect.closeTo(-0.056, 12), { kind: 'typed', fields: ['value'] }],
		['1.3', expect.closeTo(-0.056, 12), { kind: 'upstream', numbers: ['1.1'] }],
		['1.4', expect.closeTo(-0.056, 12), { kind: 'upstream', numbers: ['1.3'] }]
	]);
	expect(movements[2]!.before.check).toMatchObject({ state: 'holds' });
	expect(movements[2]!.after.check).toMatchObject({ state: 'fails', margin: { value: -0.056 } });
});

test('what moved most stands first, and a value that was lost before all', () => {
	const lost: Outcome = { state: 'waits', for: ['Φ'], rootIds: [] };
	const items = [given('a', 'a', '1'), given('b', 'b', '1'), given('c', 'c', '1')];
	const from = side(
		items,
		['a', 'b', 'c'].map((id) => quantity(id, id, ratio(1)))
	);
	const to = side(items, [
		quantity('a', 'a', ratio(1.01)),
		quantity('b', 'b', ratio(0.8)),
		quantity('c', 'c', lost)
	]);
	const order = compare(from, to).movements.map(({ after }) => after.itemId);
	expect(order).toEqual(['c', 'b', 'a']);
});

test('items added and removed, wording and the count of the rest are given', () => {
	const { added, removed, wordings, unchanged, thinLimit } = compare(before, now);
	expect(added.map(({ item, number }) => [item.id, number])).toEqual([['new', '1.5']]);
	expect(removed.map(({ item, number }) => [item.id, number])).toEqual([['old', '1.5']]);
	expect(wordings.map(({ number, field }) => [number, field])).toEqual([
		['1.1', 'source'],
		['1.2', 'text']
	]);
	expect(wordings[1]!.difference).toMatchObject({ wordsIn: 2, wordsOut: 4 });
	expect(unchanged).toBe(1);
	expect(thinLimit).toBeNull();
});

test('a note held against itself shows nothing', () => {
	expect(compare(now, now)).toEqual({
		movements: [],
		added: [],
		removed: [],
		wordings: [],
		thinLimit: null,
		unchanged: now.content.items.length
	});
});

test('a check that turns thin because the limit was raised says so', () => {
	const items = [stress];
	const held = side(items, [check('holds', 0.12, gigapascal(44), [])], '0.10');
	const thin = side(items, [check('thin', 0.12, gigapascal(44), [])], '0.15');
	const { movements, thinLimit } = compare(held, thin);
	expect(movements).toMatchObject([{ change: 0, cause: { kind: 'thin limit' } }]);
	expect(thinLimit).toEqual({ before: '0.10', after: '0.15' });
});

test('a change in the last bit, as between platforms, is no change', () => {
	const items = [given('a', 'a', '1')];
	const from = side(items, [quantity('a', 'a', ratio(0.1 + 0.2))]);
	const to = side(items, [quantity('a', 'a', ratio(0.3))]);
	expect(compare(from, to).movements).toEqual([]);
});

test('each item says in a few words what it was in the baseline', () => {
	const { items, removed, added, changed } = changesSince('B', before, now);
	expect(Object.fromEntries([...items].map(([id, { words }]) => [id, words]))).toEqual({
		eta: '1.00',
		t: '2 words new',
		sigma: '50.0',
		check: '+0.000',
		new: 'not in B'
	});
	expect({ removed, added, changed }).toEqual({ removed: ['old'], added: 1, changed: 4 });
});

test('an item only moved to another place is not marked as changed', () => {
	const moved = {
		...before,
		content: { ...before.content, items: [...before.content.items].reverse() }
	};
	expect(changesSince('B', before, moved).items.size).toBe(0);
});
