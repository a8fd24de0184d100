/** What holds of any note: found by random edits. fast-check prints the seed of a failure to replay it. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SheetChange, SheetItem } from './items';
import { calculation, check, given, lineModel } from './items.fixture';
import type { ItemResult } from './results';
import { createSheet } from './sheet';

const IDS = ['i1', 'i2', 'i3', 'i4', 'i5', 'i6'];
const SYMBOLS = ['a', 'b', 'c', 'd', 'line', '', 'h'];
const EXPRESSIONS = [
	'a',
	'a + b',
	'b*2',
	'2 c',
	'd/a',
	'3 km',
	'5 h',
	'line.mass',
	'line',
	'1/(a - 1)',
	'sqrt(b)',
	'a < b ? c : d',
	'max(0, a, b)',
	'',
	'oops +',
	'aa + bb',
	'exp(a)*c^2',
	'[a, b]',
	'[1, 2]*c',
	'sum(a)',
	'a[2] + sum([b, c])',
	'mean(b) - b'
];

const text = fc.constantFrom(...EXPRESSIONS);
const symbol = fc.constantFrom(...SYMBOLS);
const unit = fc.constantFrom('', 'km', 'kg', 'GPa', 'nonsense');
const id = fc.constantFrom(...IDS);

const item: fc.Arbitrary<SheetItem> = fc.oneof(
	fc.record({
		id,
		kind: fc.constant('given' as const),
		symbol,
		value: fc.constantFrom('1', '2.5', '-3', '', 'x', '1e200'),
		unit,
		uncertainty: fc.constantFrom('', '0.1', '5 %')
	}),
	fc.record({
		id,
		kind: fc.constant('calculation' as const),
		symbol,
		expression: text,
		unit,
		digits: fc.constantFrom('', '6', 'many')
	}),
	fc.record({
		id,
		kind: fc.constant('check' as const),
		left: text,
		relation: fc.constantFrom('le' as const, 'ge' as const, 'within' as const),
		right: text,
		tolerance: text,
		required: fc.constantFrom('', '0.1', 'a')
	}),
	fc
		.record({ id, symbol, lift: fc.constantFrom('20 t', 'a', 'line.mass', '') })
		.map((more) => lineModel(more))
);

const change: fc.Arbitrary<SheetChange> = fc.record(
	{
		upsert: fc.uniqueArray(item, { selector: ({ id }) => id, maxLength: 3 }),
		remove: fc.uniqueArray(id, { maxLength: 1 }),
		order: fc.shuffledSubarray(IDS, { minLength: IDS.length }),
		thinLimit: fc.constantFrom(0, 0.1, 0.5)
	},
	{ requiredKeys: [] }
);

/** The items after these changes, with order and thin limit. */
function after(changes: SheetChange[]): SheetChange {
	const items = new Map<string, SheetItem>();
	let order: string[] | undefined;
	let thinLimit: number | undefined;
	for (const change of changes) {
		change.remove?.forEach((id) => items.delete(id));
		change.upsert?.forEach((item) => items.set(item.id, item));
		order = change.order ?? order;
		thinLimit = change.thinLimit ?? thinLimit;
	}
	return {
		upsert: [...items.values()],
		...(order && { order }),
		...(thinLimit !== undefined && { thinLimit })
	};
}

/** Many runs on a busy machine take their time. */
const SECONDS = 60_000;

describe('any sequence of edits', () => {
	it(
		'leaves the results that the items have when they come all at once, read in between or not',
		() => {
			fc.assert(
				fc.property(fc.array(change, { maxLength: 8 }), fc.boolean(), (changes, read) => {
					const live = createSheet();
					changes.forEach((change) => live.apply(change)[read ? 'changed' : 'removed']);
					const fresh = createSheet();
					fresh.apply(after(changes));
					expect(live.results()).toEqual(fresh.results());
				}),
				{ numRuns: 300 }
			);
		},
		SECONDS
	);

	it(
		'tells every change and nothing else, so that whoever follows the answers has the results',
		() => {
			fc.assert(
				fc.property(fc.array(change, { maxLength: 8 }), (changes) => {
					const live = createSheet();
					const followed = new Map<string, unknown>();
					const follow = (results: ItemResult[], again: string[] = []) => {
						for (const result of results) {
							if (!again.includes(result.id)) expect(result).not.toEqual(followed.get(result.id));
							followed.set(result.id, result);
						}
					};
					changes.forEach((change, i) => {
						const { changed, removed } = live.apply(change);
						removed.forEach((id) => followed.delete(id));
						follow(changed, change.remove);
						if (i % 2 === 1 || i === changes.length - 1) follow(live.uncertainties());
					});
					expect(followed).toEqual(new Map(live.results().map((result) => [result.id, result])));
				}),
				{ numRuns: 150 }
			);
		},
		SECONDS
	);
});

describe('figures typed one after the other into the same given', () => {
	const figure = fc
		.tuple(fc.constantFrom(0, 1, -1, 9.5, 0.01, 1e5), fc.integer({ min: -9, max: 9 }))
		.map(([digit, power]) => `${digit}e${power}`);
	const shownIn = fc.constantFrom('', 'km', 'kg', 'mm');
	const expression = (before: string) =>
		fc.constantFrom(
			before,
			`${before} * 3`,
			`${before} / (${before} - 9.5 m)`,
			`sqrt(${before})`,
			`1e300 * ${before}`,
			`min(${before}, 1 km)`,
			`${before} * 1 kN`,
			`b + ${before}`
		);
	const chain = fc
		.tuple(
			...['a', 'b', 'c', 'd'].map(expression),
			fc.array(shownIn, { minLength: 4, maxLength: 4 })
		)
		.map((made) => {
			const units = made.at(-1) as string[];
			return ['b', 'c', 'd', 'e'].map((symbol, i) =>
				calculation(symbol, made[i] as string, units[i])
			);
		});

	it(
		'leave what each would alone, whatever units the figures ask for on the way',
		() => {
			fc.assert(
				fc.property(chain, fc.array(figure, { minLength: 2, maxLength: 6 }), (items, figures) => {
					const rest = [...items, check('e', 'le', 'c'), lineModel({ top: 'b' })];
					const live = createSheet();
					live.apply({ upsert: rest });
					for (const value of figures) {
						live.apply({ upsert: [given('a', value, 'm')] });
						const fresh = createSheet();
						fresh.apply({ upsert: [given('a', value, 'm'), ...rest] });
						expect(live.results()).toEqual(fresh.results());
					}
				}),
				{ numRuns: 150 }
			);
		},
		SECONDS
	);
});

describe('the order in which items come', () => {
	it(
		'makes no difference',
		() => {
			const items = fc.uniqueArray(item, { selector: ({ id }) => id, maxLength: 6 });
			fc.assert(
				fc.property(items, fc.infiniteStream(fc.nat()), (given, stream) => {
					const shuffled = given
						.map((item) => ({ item, key: stream.next().value as number }))
						.sort((a, b) => a.key - b.key)
						.map(({ item }) => item);
					const [first, second] = [createSheet(), createSheet()];
					first.apply({ upsert: given, order: IDS });
					shuffled.forEach((item) => second.apply({ upsert: [item], order: IDS }));
					expect(second.results()).toEqual(first.results());
				}),
				{ numRuns: 150 }
			);
		},
		SECONDS
	);
});
