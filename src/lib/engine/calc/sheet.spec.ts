import { describe, expect, it } from 'vitest';
import { calculation, check, given, lineModel, resultsOf } from './items.fixture';
import type { QuantityResult } from './results';
import { createSheet } from './sheet';

const chain = [
	given('a', '2', 'GPa'),
	calculation('b', 'a/2'),
	calculation('c', '2*b'),
	calculation('d', '3'),
	check('c', 'le', '5 GPa')
];
const order = chain.map(({ id }) => id);

function sheetOf(items = chain) {
	const sheet = createSheet();
	sheet.apply({ upsert: items, order: items.map(({ id }) => id) });
	return sheet;
}

const ids = (results: { id: string }[]) => results.map(({ id }) => id);

describe('an edit', () => {
	it('answers with what it reaches, in sheet order', () => {
		const { changed } = sheetOf().apply({ upsert: [given('a', '4', 'GPa')] });
		expect(ids(changed)).toEqual(['a', 'b', 'c', 'check']);
	});

	it('stops where a value stays as it was', () => {
		const sheet = sheetOf([
			given('a', '2'),
			calculation('b', 'max(a, 10)'),
			calculation('c', 'b + 1')
		]);
		expect(ids(sheet.apply({ upsert: [given('a', '3')] }).changed)).toEqual(['a']);
	});

	it('that changes nothing is answered with nothing', () => {
		expect(sheetOf().apply({ upsert: [given('a', '2', 'GPa')] }).changed).toEqual([]);
	});

	it('of the order changes the order of links only', () => {
		const sheet = sheetOf([given('a', '1'), calculation('b', 'a'), calculation('c', 'a')]);
		const { changed } = sheet.apply({ order: ['a', 'c', 'b'] });
		expect(changed).toMatchObject([{ id: 'a', usedIn: ['c', 'b'] }]);
	});

	it('of the thin limit reaches the checks', () => {
		const { changed } = sheetOf().apply({ thinLimit: 2 });
		expect(changed).toMatchObject([{ id: 'check', state: 'thin' }]);
	});

	it('that removes an item names it, and what used it has lost its symbol', () => {
		const { changed, removed } = sheetOf().apply({ remove: ['a', 'nobody'] });
		expect(removed).toEqual(['a']);
		expect(changed[0]).toMatchObject({
			id: 'b',
			uses: [],
			outcome: { state: 'fault', faults: [{ code: 'unknown-symbol' }] }
		});
		expect(changed[1]).toMatchObject({
			id: 'c',
			outcome: { state: 'waits', for: ['b'], rootIds: ['b'] }
		});
	});

	it('that makes a line model of a given is seen by what named the given', () => {
		const named = lineModel({ id: 'other', symbol: '', lift: 'a' });
		const model = lineModel({ id: 'a', symbol: 'a', lift: 'unknown' });
		const sheet = createSheet();
		for (const item of [given('a', '1', 't'), named, model]) sheet.apply({ upsert: [item] });
		const fresh = createSheet();
		fresh.apply({ upsert: [model, named] });
		expect(sheet.results()).toEqual(fresh.results());
	});

	it('that brings a symbol back heals what waited for it', () => {
		const sheet = sheetOf();
		const before = sheet.results();
		sheet.apply({ remove: ['a'] });
		sheet.apply({ upsert: [given('a', '2', 'GPa')], order });
		expect(sheet.results()).toEqual(before);
	});
});

describe('links between items', () => {
	it('run both ways in sheet order', () => {
		const results = resultsOf(chain);
		expect(results.get('b')).toMatchObject({ uses: ['a'], usedIn: ['c'] });
		expect(results.get('c')).toMatchObject({ uses: ['b'], usedIn: ['check'] });
	});

	it('run through the outputs of a line model', () => {
		const results = resultsOf([lineModel(), calculation('m', 'line.mass + line.counterweight')]);
		expect(results.get('m')).toMatchObject({ uses: ['line'] });
		expect(results.get('line')).toMatchObject({ usedIn: ['m'] });
	});
});

describe('a symbol defined twice', () => {
	const twice = [given('x', '1'), { ...given('x', '2'), id: 'other' }, calculation('y', 'x')];

	it('is a fault at each place, which names the other', () => {
		const results = resultsOf(twice);
		for (const [id, other] of [
			['x', 'other'],
			['other', 'x']
		]) {
			expect(results.get(id!)).toMatchObject({
				outcome: { state: 'fault', faults: [{ code: 'double-definition', items: [other] }] }
			});
		}
		expect(results.get('y')).toMatchObject({ outcome: { state: 'waits', for: ['x'] } });
	});

	it('heals when one of them is renamed', () => {
		const sheet = createSheet();
		sheet.apply({ upsert: twice });
		sheet.apply({ upsert: [{ ...given('z', '2'), id: 'other' }] });
		expect(sheet.results().map((result) => (result as QuantityResult).outcome.state)).toEqual(
			Array(3).fill('value')
		);
	});
});

describe('a cycle', () => {
	const round = [
		calculation('a', 'c + 1'),
		calculation('b', '2*a'),
		calculation('c', 'b'),
		calculation('after', 'c*2')
	];

	it('names the symbols in it in order, at each of them', () => {
		const results = resultsOf(round);
		expect(results.get('a')).toMatchObject({
			outcome: {
				faults: [
					{ code: 'cycle', message: 'a depends on itself: a → c → b → a.', items: ['c', 'b'] }
				]
			}
		});
		expect(results.get('b')).toMatchObject({ outcome: { faults: [{ code: 'cycle' }] } });
		expect(results.get('after')).toMatchObject({
			outcome: { state: 'waits', for: ['c'], rootIds: ['c'] }
		});
	});

	it('of one item with itself is one too', () => {
		expect(resultsOf([calculation('a', 'a + 1')]).get('a')).toMatchObject({
			outcome: { faults: [{ message: 'a depends on itself: a → a.' }] }
		});
	});

	it('through a line model is told there', () => {
		const results = resultsOf([lineModel({ lift: 'm_x' }), calculation('m_x', 'line.mass')]);
		expect(results.get('line')).toMatchObject({
			faults: [
				{
					field: '',
					fault: {
						code: 'cycle',
						message: 'line.mass depends on itself: line.mass → m_x → line.mass.'
					}
				}
			]
		});
	});

	it('that is broken heals', () => {
		const sheet = sheetOf(round);
		sheet.apply({ upsert: [calculation('c', '3')] });
		expect(sheet.results().at(-1)).toMatchObject({ outcome: { quantity: { value: 6 } } });
	});

	it('that is broken by a fault lets the others wait for it', () => {
		const sheet = sheetOf(round);
		sheet.apply({ upsert: [calculation('c', '3 +')] });
		expect(sheet.results()[0]).toMatchObject({ outcome: { state: 'waits', rootIds: ['c'] } });
	});
});

describe('a symbol', () => {
	it.each([
		['2x', 'begins with a letter'],
		['a b', 'begins with a letter'],
		['a.b', 'begins with a letter'],
		['pi', 'is a constant'],
		['sin', 'is a function'],
		['earth', 'is a body'],
		['and', 'is a word'],
		['x'.repeat(41), 'at most 40']
	])('%s is refused', (symbol, words) => {
		expect(resultsOf([given(symbol, '1')]).get(symbol)).toMatchObject({
			outcome: { faults: [{ code: 'bad-symbol', message: expect.stringContaining(words) }] }
		});
	});

	it('may be missing: the value is there, but nothing can use it', () => {
		expect(resultsOf([given('', '5', 'km')]).get('')).toMatchObject({
			outcome: { quantity: { value: 5, unit: 'km' } }
		});
	});
});

describe('a given', () => {
	const outcome = (...args: Parameters<typeof given>) => resultsOf([given(...args)]).get(args[0]);

	it('keeps value, unit, digits and uncertainty as typed', () => {
		expect(outcome('x', '100.0', 'GPa', '2.4')).toMatchObject({
			outcome: { quantity: { value: 100, unit: 'GPa', si: 1e11, digits: 4, uncertainty: 2.4 } }
		});
	});

	it('may have its uncertainty as a percentage of the value', () => {
		expect(outcome('x', '-200', 'MPa', '2 %')).toMatchObject({
			outcome: { quantity: { uncertainty: 4 } }
		});
	});

	it('is blank before a value is typed', () => {
		expect(outcome('x', '', 'km')).toMatchObject({ outcome: { state: 'blank' } });
	});

	it('tells every field that is wrong', () => {
		expect(outcome('x', '1,5', 'kgg', '-1')).toMatchObject({
			outcome: {
				faults: [
					{ code: 'bad-number', remedy: 'Write 1.5.', span: { field: 'value' } },
					{ code: 'unknown-unit', span: { field: 'unit' } }
				]
			}
		});
		expect(outcome('x', '1', '', '-1')).toMatchObject({
			outcome: { faults: [{ message: 'A standard uncertainty is not negative.' }] }
		});
	});
});
