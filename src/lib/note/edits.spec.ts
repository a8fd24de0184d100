import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { copyItems, duplicateItem, pasteItems, readCopiedItems } from './clipboard';
import {
	addItem,
	addItems,
	dropFile,
	moveItem,
	putFile,
	removeItem,
	setChoice,
	setThinLimit,
	textField
} from './document';
import { documentFrom, parseContent } from './interchange';
import type { EvidenceFile, ItemOf, NoteContent } from './items';
import { numberItems } from './numbering';
import { orderedIds } from './order';
import { projectItem, projectNote } from './projection';
import { createUndo } from './undo';
import { thinLimitOf, toSheetItem } from './sheet-items';
import { watchNote, type NoteChange } from './watch';

const file = (fileId: string): EvidenceFile => ({
	fileId,
	name: `${fileId}.csv`,
	mediaType: 'text/csv',
	size: 12,
	sha256: 'ab'
});

const content: NoteContent = {
	format: 'holdfast-note',
	version: 1,
	thinLimit: '0.05',
	items: [
		{ id: 's', kind: 'section', title: 'Givens' },
		{
			id: 't',
			kind: 'text',
			body: {
				type: 'doc',
				content: [
					{ type: 'heading', attrs: { level: 4 }, content: [{ type: 'text', text: 'Scope' }] },
					{
						type: 'paragraph',
						content: [
							{ type: 'text', text: 'The line of ' },
							{ type: 'text', text: 'tape', marks: [{ type: 'bold' }, { type: 'italic' }] },
							{ type: 'hardBreak' },
							{ type: 'quantity', attrs: { item: 'g', output: '' } },
							{ type: 'formula', attrs: { tex: '\\rho' } },
							{
								type: 'text',
								text: 'see there',
								marks: [{ type: 'link', attrs: { href: 'https://halden.example/t' } }]
							}
						]
					},
					{
						type: 'bulletList',
						content: [
							{
								type: 'listItem',
								content: [{ type: 'paragraph', content: [{ type: 'text', text: 'one' }] }]
							}
						]
					}
				]
			}
		},
		{
			id: 'g',
			kind: 'given',
			symbol: 'rho',
			description: 'Density',
			value: '1520',
			unit: 'kg/m^3',
			uncertainty: '12',
			source: 'own coupons',
			taken: ''
		},
		{ id: 'e', kind: 'evidence', description: 'Coupons', files: [file('f1'), file('f2')] }
	]
};

describe('A note written into a document and read back', () => {
	it('is the same content with the same ids', () => {
		expect(projectNote(documentFrom(parseContent(content)))).toEqual(content);
	});

	it('is refused with the place named when it is no note', () => {
		expect(() => parseContent({ ...content, items: [{ id: 'x', kind: 'song' }] })).toThrow(/items/);
	});
});

describe('Numbers', () => {
	it('count sections, and items within their section', () => {
		const items = ['given', 'section', 'text', 'check', 'section', 'given'].map((kind, index) => ({
			id: `${index}`,
			kind: kind as 'given'
		}));
		expect([...numberItems(items).values()]).toEqual(['0.1', '1', '1.1', '1.2', '2', '2.1']);
	});
});

describe('Copying', () => {
	it('puts a duplicate right below its item, under an id of its own', () => {
		const doc = documentFrom(content);
		const copy = duplicateItem(doc, 'g')!;
		expect(orderedIds(doc)).toEqual(['s', 't', 'g', copy, 'e']);
		expect(projectItem(doc, copy)).toEqual({ ...content.items[2], id: copy });
	});

	it('carries items to another note in sheet order, evidence by reference', () => {
		const other = new Y.Doc();
		const ids = pasteItems(other, copyItems(documentFrom(content), ['e', 'g']), { after: null })!;
		expect(projectNote(other).items).toEqual([
			{ ...content.items[2], id: ids[0] },
			{ ...content.items[3], id: ids[1] }
		]);
	});

	it('lets live values in prose follow the items copied with it', () => {
		const other = new Y.Doc();
		const [text, given] = pasteItems(other, copyItems(documentFrom(content), ['t', 'g']), {
			after: null
		})!;
		expect(JSON.stringify(projectItem(other, text!))).toContain(`"item":"${given}"`);
	});

	it.each(['', 'some words', '{"format":"holdfast-items","version":1,"items":[{"kind":"given"}]}'])(
		'takes no items from a clipboard that holds none: %s',
		(text) => {
			expect(readCopiedItems(text)).toBeNull();
			expect(pasteItems(new Y.Doc(), text, { after: null })).toBeNull();
		}
	);
});

describe('Evidence files', () => {
	it('stand in the order in which they were put, whoever put them', () => {
		const doc = documentFrom(content);
		putFile(doc, 'e', file('f0'));
		dropFile(doc, 'e', 'f1');
		const files = (projectItem(doc, 'e') as ItemOf<'evidence'>).files;
		expect(files.map(({ fileId }) => fileId)).toEqual(['f2', 'f0']);
	});
});

describe('Undo', () => {
	const mine = Symbol('mine');
	const typeInto = (doc: Y.Doc, field: string, text: string, origin: unknown) =>
		doc.transact(() => textField(doc, 'g', field)!.insert(0, text), origin);
	const given = (doc: Y.Doc) => projectItem(doc, 'g') as ItemOf<'given'>;

	it('takes back what one typed in one field as one step, and leaves what others typed', () => {
		const doc = documentFrom(content);
		const undo = createUndo(doc, mine);
		for (const key of ['a', 'b', 'c']) typeInto(doc, 'source', key, mine);
		typeInto(doc, 'source', 'theirs ', 'someone else');
		typeInto(doc, 'description', 'Mass ', mine);
		undo.undo();
		expect(given(doc)).toMatchObject({ description: 'Density', source: 'theirs cbaown coupons' });
		undo.undo();
		expect(given(doc)).toMatchObject({ description: 'Density', source: 'theirs own coupons' });
		undo.undo();
		expect(given(doc).source).toBe('theirs own coupons');
		undo.redo();
		undo.redo();
		expect(given(doc)).toMatchObject({
			description: 'Mass Density',
			source: 'theirs cbaown coupons'
		});
	});

	it('brings a removed item back under its id, in its place, with all that it held', () => {
		const doc = documentFrom(content);
		const undo = createUndo(doc, mine);
		removeItem(doc, 't', mine);
		expect(orderedIds(doc)).toEqual(['s', 'g', 'e']);
		undo.undo();
		expect(projectNote(doc)).toEqual(content);
	});

	it('takes back adding, moving, choosing and the thin limit one by one', () => {
		const doc = documentFrom(content);
		const undo = createUndo(doc, mine);
		const check = addItem(doc, { kind: 'check' }, { after: 'e', origin: mine });
		setChoice(doc, check, 'relation', 'ge', mine);
		moveItem(doc, check, { after: 's', origin: mine });
		setThinLimit(doc, '0.2', mine);
		undo.undo();
		expect(projectNote(doc).thinLimit).toBe('0.05');
		undo.undo();
		expect(orderedIds(doc).at(-1)).toBe(check);
		undo.undo();
		expect(projectItem(doc, check)).toMatchObject({ relation: 'le' });
		undo.undo();
		expect(projectNote(doc)).toEqual(content);
	});

	it('takes back pasting several items in one step', () => {
		const doc = documentFrom(content);
		const undo = createUndo(doc, mine);
		pasteItems(doc, copyItems(doc, ['s', 't', 'g']), { after: 'e', origin: mine });
		undo.undo();
		expect(projectNote(doc)).toEqual(content);
	});
});

describe('Watching a note', () => {
	it('tells only what a transaction touched', () => {
		const doc = documentFrom(content);
		const seen: NoteChange[] = [];
		const end = watchNote(doc, (change) => seen.push(change));
		textField(doc, 'g', 'value')!.insert(4, '.5');
		expect(seen.pop()).toEqual({
			upsert: [{ ...content.items[2], value: '1520.5' }],
			remove: [],
			order: null,
			thinLimit: null
		});
		moveItem(doc, 'e', { after: null });
		expect(seen.pop()).toMatchObject({ order: ['e', 's', 't', 'g'], thinLimit: null });
		removeItem(doc, 's');
		expect(seen.pop()).toMatchObject({ upsert: [], remove: ['s'], order: ['e', 't', 'g'] });
		setThinLimit(doc, '0.2');
		expect(seen.pop()).toMatchObject({ upsert: [], remove: [], order: null, thinLimit: '0.2' });
		end();
		removeItem(doc, 'e');
		expect(seen).toEqual([]);
	});

	it('tells of several items added at once in one change', () => {
		const doc = new Y.Doc();
		const seen: NoteChange[] = [];
		watchNote(doc, (change) => seen.push(change));
		addItems(doc, content.items, { after: null });
		expect(seen).toHaveLength(1);
		expect(seen[0]!.order).toEqual(['s', 't', 'g', 'e']);
	});

	it('tells of a change inside prose', () => {
		const doc = documentFrom(content);
		const seen: NoteChange[] = [];
		watchNote(doc, (change) => seen.push(change));
		const body = doc.getMap<Y.Map<Y.XmlFragment>>('items').get('t')!.get('body')!;
		body.delete(0, 1);
		expect(seen[0]!.upsert.map((item) => item.id)).toEqual(['t']);
	});
});

describe('The engine', () => {
	it('is given the items that compute, and no others', () => {
		expect(content.items.map((item) => toSheetItem(item)?.id)).toEqual([
			undefined,
			undefined,
			'g',
			undefined
		]);
	});

	it.each([
		['0.05', 0.05],
		[' 0.2 ', 0.2],
		['0', 0],
		['', 0.1],
		['a tenth', 0.1],
		['-1', 0.1]
	])('reads the thin limit %j as %d', (typed, limit) => {
		expect(thinLimitOf(typed)).toBe(limit);
	});
});
