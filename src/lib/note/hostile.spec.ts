import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { addItem, itemsMap, moveItem, settingsMap, textField, type ItemMap } from './document';
import { FIELDS, LONGEST_TYPED, noteContentSchema, type ItemKind, type ItemOf } from './items';
import { orderedIds } from './order';
import { projectItem, projectNote } from './projection';
import { DEEPEST_LIST } from './prose';
import { watchNote } from './watch';

const kinds = Object.keys(FIELDS) as ItemKind[];
const names = fc.oneof(
	fc.constantFrom('__proto__', 'constructor', 'toString', 'hasOwnProperty', 'kind', 'order', ''),
	fc.constantFrom(...kinds.flatMap((kind) => Object.keys(FIELDS[kind]))),
	fc.string()
);

/** A value of any form that a document can hold. */
const value: fc.Arbitrary<() => unknown> = fc.letrec<{ value: () => unknown }>((tie) => ({
	value: fc.oneof(
		{ maxDepth: 3 },
		fc.constantFrom(...kinds).map((kind) => () => kind),
		fc.jsonValue().map((json) => () => json),
		fc.constant(() => ({ toString: 1, valueOf: 1 })),
		fc.constantFrom(NaN, Infinity, 1n, null).map((odd) => () => odd),
		fc.string({ unit: 'binary' }).map((text) => () => new Y.Text(text)),
		fc.constant(() => {
			const text = new Y.Text('a');
			text.insertEmbed(1, { image: 'x' });
			return text;
		}),
		fc
			.array(fc.constantFrom(1, 'a', null, { a: [] }), { maxLength: 3 })
			.map((values) => () => Y.Array.from<string | number | object | null>(values)),
		fc.array(fc.tuple(names, tie('value')), { maxLength: 6 }).map((entries) => () => {
			const map = new Y.Map();
			for (const [name, make] of entries) map.set(name, make());
			return map;
		}),
		fc
			.array(
				fc.tuple(
					fc.constantFrom('paragraph', 'heading', 'bulletList', 'listItem', 'formula', 'script'),
					fc.string()
				),
				{ maxLength: 4 }
			)
			.map((nodes) => () => {
				const fragment = new Y.XmlFragment();
				fragment.insert(
					0,
					nodes.map(([name, text]) => {
						const element = new Y.XmlElement(name);
						element.setAttribute('level', text);
						element.insert(0, [new Y.XmlText(text), new Y.XmlElement('quantity')]);
						return element;
					})
				);
				return fragment;
			})
	)
})).value;

describe('A document holding anything at all', () => {
	it('is read as a note of the closed shape, without a failure', () => {
		fc.assert(
			fc.property(
				fc.array(
					fc.tuple(names, fc.constantFrom(...kinds, 'nonsense'), fc.array(fc.tuple(names, value)))
				),
				fc.array(fc.tuple(names, value), { maxLength: 3 }),
				(items, strays) => {
					const doc = new Y.Doc();
					const seen: string[] = [];
					watchNote(doc, (change) => seen.push(...change.upsert.map((item) => item.id)));
					doc.transact(() => {
						for (const [id, kind, fields] of items) {
							const map: ItemMap = new Y.Map();
							map.set('kind', kind);
							for (const [name, make] of fields) map.set(name, make());
							itemsMap(doc).set(id, map);
						}
						for (const [name, make] of strays) itemsMap(doc).set(name, make() as ItemMap);
						for (const [name, make] of strays) settingsMap(doc).set(name, make());
					});
					const content = projectNote(doc);
					expect(noteContentSchema.parse(content)).toEqual(content);
					expect(seen.toSorted()).toEqual(orderedIds(doc).toSorted());
					const added = addItem(doc, { kind: 'section' }, { after: content.items[0]?.id ?? null });
					moveItem(doc, added, { after: content.items.at(-1)?.id ?? null });
					expect(orderedIds(doc)).toContain(added);
				}
			),
			{ numRuns: 300 }
		);
	});

	it('takes an item at any place, whatever stands for the order of those around it', () => {
		const order = fc.oneof(
			fc.string({ maxLength: 30 }),
			fc.stringMatching(/^[A-Za-z][0-9A-Za-z]{0,30}$/),
			fc.stringMatching(/^[a-c][0-9A-Za-z]{1,4}0*$/)
		);
		fc.assert(
			fc.property(fc.array(order, { minLength: 1, maxLength: 6 }), fc.nat(6), (orders, place) => {
				const doc = new Y.Doc();
				for (const key of orders)
					itemsMap(doc)
						.get(addItem(doc, { kind: 'section' }, { after: null }))!
						.set('order', key);
				const before = orderedIds(doc);
				const after = before[place % before.length]!;
				const id = addItem(doc, { kind: 'section' }, { after });
				const now = orderedIds(doc);
				expect(now.filter((other) => other !== id)).toEqual(before);
				expect(now.indexOf(id)).toBeGreaterThan(now.indexOf(after));
			}),
			{ numRuns: 500 }
		);
	});

	it('blanks a field of a wrong form and keeps the others', () => {
		const doc = new Y.Doc();
		const id = addItem(
			doc,
			{
				kind: 'check',
				description: 'Joint carries the load',
				left: 'a',
				right: 'b',
				relation: 'ge'
			},
			{ after: null }
		);
		itemsMap(doc).get(id)!.set('left', 7);
		itemsMap(doc).get(id)!.set('relation', 'about');
		expect(projectItem(doc, id)).toMatchObject({
			description: 'Joint carries the load',
			left: '',
			relation: 'le',
			right: 'b'
		});
	});

	it('cuts a text that is longer than a field may be', () => {
		const doc = new Y.Doc();
		const id = addItem(doc, { kind: 'given', symbol: 'm', value: '14' }, { after: null });
		textField(doc, id, 'source')!.insert(0, 'x'.repeat(2_000_000));
		const given = projectItem(doc, id) as ItemOf<'given'>;
		expect(given.source).toHaveLength(LONGEST_TYPED);
		expect(given.value).toBe('14');
	});

	it('gives no NUL and no half of a surrogate pair to the database', () => {
		const doc = new Y.Doc();
		const id = addItem(doc, { kind: 'given' }, { after: null });
		textField(doc, id, 'symbol')!.insert(0, 'a\0b');
		textField(doc, id, 'source')!.insert(0, 'x'.repeat(LONGEST_TYPED - 1) + '\u{1d70e}');
		const given = projectItem(doc, id) as ItemOf<'given'>;
		expect(given.symbol).toBe('ab');
		expect(given.source.isWellFormed()).toBe(true);
	});

	it('leaves foreign nodes out of prose and keeps the sentence around them', () => {
		const doc = new Y.Doc();
		const id = addItem(doc, { kind: 'text' }, { after: null });
		const paragraph = new Y.XmlElement('paragraph');
		(itemsMap(doc).get(id)!.get('body') as Y.XmlFragment).insert(0, [
			paragraph,
			new Y.XmlElement('iframe')
		]);
		paragraph.insert(0, [
			new Y.XmlText('before '),
			new Y.XmlElement('script'),
			new Y.XmlText('after')
		]);
		expect((projectItem(doc, id) as ItemOf<'text'>).body.content).toEqual([
			{
				type: 'paragraph',
				content: [
					{ type: 'text', text: 'before ' },
					{ type: 'text', text: 'after' }
				]
			}
		]);
	});

	it.each([
		'javascript:alert(1)',
		'data:text/html,x',
		'//elsewhere.example',
		'/\\elsewhere.example'
	])('follows no link to %s, and keeps its words', (href) => {
		const doc = new Y.Doc();
		const id = addItem(doc, { kind: 'text' }, { after: null });
		const paragraph = new Y.XmlElement('paragraph');
		const text = new Y.XmlText();
		text.applyDelta([{ insert: 'press here', attributes: { link: { href }, bold: {} } }]);
		(itemsMap(doc).get(id)!.get('body') as Y.XmlFragment).insert(0, [paragraph]);
		paragraph.insert(0, [text]);
		expect((projectItem(doc, id) as ItemOf<'text'>).body.content[0]).toEqual({
			type: 'paragraph',
			content: [{ type: 'text', text: 'press here', marks: [{ type: 'bold' }] }]
		});
	});

	it('reads lists to a fixed depth, however deep they are nested', () => {
		const doc = new Y.Doc();
		const id = addItem(doc, { kind: 'text' }, { after: null });
		let parent: Y.XmlFragment = itemsMap(doc).get(id)!.get('body') as Y.XmlFragment;
		for (let depth = 0; depth < 500; depth++) {
			const list = new Y.XmlElement('bulletList');
			const entry = new Y.XmlElement('listItem');
			parent.insert(0, [list]);
			list.insert(0, [entry]);
			parent = entry;
		}
		const read = JSON.stringify(projectItem(doc, id));
		expect(read.split('bulletList')).toHaveLength(DEEPEST_LIST + 1);
	});
});
