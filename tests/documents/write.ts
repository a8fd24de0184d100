/**
 * Writes the frozen documents that are not there yet: `npx tsx tests/documents/write.ts`. One that is
 * there stays as it was written, whatever this script says now; a new form of document is a new name.
 * What each must read as is typed beside it by hand.
 */
import { getSchema } from '@tiptap/core';
import Subscript from '@tiptap/extension-subscript';
import Superscript from '@tiptap/extension-superscript';
import StarterKit from '@tiptap/starter-kit';
import { prosemirrorJSONToYXmlFragment } from '@tiptap/y-tiptap';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import * as Y from 'yjs';
import {
	addItem,
	completeFields,
	dropFile,
	itemsMap,
	moveItem,
	proseField,
	putFile,
	removeItem,
	setChoice,
	setThinLimit,
	settingsMap,
	textField,
	writeFields
} from '../../src/lib/note/document';
import { documentFrom } from '../../src/lib/note/interchange';
import { createUndo } from '../../src/lib/note/undo';

const folder = new URL('.', import.meta.url);
const base64 = (update: Uint8Array) => Buffer.from(update).toString('base64');
const state = (doc: Y.Doc) => [base64(Y.encodeStateAsUpdate(doc))];

/** A note of every kind of item, written at once. */
function everyKind(): string[] {
	return state(documentFrom(contentOf('every-kind')));
}

/** Three people editing, deleting, moving and taking back; kept as the updates they sent. */
function manyHands(): string[] {
	const updates: string[] = [];
	const docs = [11, 12, 13].map((clientID) => {
		const doc = new Y.Doc();
		doc.clientID = clientID;
		doc.on('update', (update: Uint8Array, origin: unknown) => {
			if (origin === 'network') return;
			updates.push(base64(update));
			for (const other of docs) if (other !== doc) Y.applyUpdate(other, update, 'network');
		});
		return doc;
	});
	const [a, b, c] = docs as [Y.Doc, Y.Doc, Y.Doc];
	setThinLimit(a, '0.10');
	addItem(a, { id: 'sec', kind: 'section', title: 'Loads' }, { after: null });
	addItem(a, { id: 'load', kind: 'given', symbol: 'F', value: '12', unit: 'kN' }, { after: 'sec' });
	addItem(b, { id: 'gone', kind: 'calculation', symbol: 'x' }, { after: 'load' });
	addItem(b, { id: 'cap', kind: 'check', left: 'F', right: '15 kN' }, { after: 'gone' });
	addItem(c, { id: 'ev', kind: 'evidence', description: 'Proof test' }, { after: 'cap' });
	const file = { mediaType: 'text/csv', size: 9, sha256: '00' };
	putFile(c, 'ev', { fileId: 'f-1', name: 'pull-1.csv', ...file });
	putFile(a, 'ev', { fileId: 'f-2', name: 'pull-2.csv', ...file });
	dropFile(b, 'ev', 'f-1');
	const undo = createUndo(b, 'own');
	b.transact(() => textField(b, 'load', 'source')!.insert(0, 'a slip'), 'own');
	textField(a, 'load', 'description')!.insert(0, 'Load on the anchor');
	undo.undo();
	textField(c, 'load', 'value')!.delete(0, 2);
	textField(c, 'load', 'value')!.insert(0, '13.5');
	setChoice(a, 'cap', 'relation', 'within');
	textField(b, 'cap', 'tolerance')!.insert(0, '2 kN');
	removeItem(a, 'gone');
	moveItem(b, 'ev', { after: 'sec' });
	setThinLimit(c, '0.05');
	return updates;
}

/** Prose as the editor's binding writes it, with attributes of its own that the note does not keep. */
function editorProse(): string[] {
	const doc = documentFrom({
		format: 'holdfast-note',
		version: 1,
		thinLimit: '0.10',
		items: [{ id: 'words', kind: 'text', body: { type: 'doc', content: [] } }]
	});
	const text = (words: string, ...marks: object[]) => ({ type: 'text', text: words, marks });
	const bold = { type: 'bold' };
	const link = { type: 'link', attrs: { href: 'https://halden.example/tape', target: '_blank' } };
	const paragraph = (...content: object[]) => ({ type: 'paragraph', content });
	const item = (...content: object[]) => ({ type: 'listItem', content });
	const schema = getSchema([StarterKit.configure({ undoRedo: false }), Subscript, Superscript]);
	prosemirrorJSONToYXmlFragment(
		schema,
		{
			type: 'doc',
			content: [
				{ type: 'heading', attrs: { level: 3 }, content: [text('Tape')] },
				paragraph(text('Woven, '), text('not', bold, { type: 'italic' }), text(' braided; see '), text('there', link)),
				paragraph(text('E'), text('1', { type: 'subscript' }), { type: 'hardBreak' }, text('m'), text('2', { type: 'superscript' })),
				{
					type: 'orderedList',
					attrs: { start: 3 },
					content: [
						item(paragraph(text('first'))),
						item(paragraph(text('second')), { type: 'bulletList', content: [item(paragraph(text('inner')))] })
					]
				},
				{ type: 'blockquote', content: [paragraph(text('left out'))] }
			]
		},
		proseField(doc, 'words')!
	);
	return state(doc);
}

/** What a foreign or broken client may have left: each field is blank or as it was, never the whole note. */
function damaged(): string[] {
	const doc = documentFrom({
		format: 'holdfast-note',
		version: 1,
		thinLimit: '0.10',
		items: [
			{ id: 's', kind: 'section', title: 'Still here' },
			{ id: 'k', kind: 'check', description: 'Kept', left: 'a', relation: 'ge', right: 'b', tolerance: '', required: '' }
		]
	});
	const items = itemsMap(doc);
	settingsMap(doc).set('thinLimit', 7);
	items.get('s')!.set('order', 'a1');
	items.get('k')!.set('order', 'a2');
	items.get('k')!.set('left', { not: 'text' });
	items.get('k')!.set('relation', 'about');
	items.get('s')!.set('unheard', 'of');
	const stranger = new Y.Map<unknown>();
	stranger.set('kind', 'song');
	items.set('x', stranger);
	items.set('y', 'no item at all' as never);
	const bare = new Y.Map<unknown>();
	bare.set('kind', 'given');
	bare.set('order', 'no key, so first');
	items.set('__proto__', bare);
	return state(doc);
}

/** A line model written before lines stood on other places: its new fields come with the first who opens it. */
function otherPlaces(): string[] {
	const { items, ...note } = contentOf('other-places');
	const doc = documentFrom({ ...note, items: [items[0]] });
	const [second] = items.slice(1);
	addItem(doc, { id: second.id, kind: 'lineModel', symbol: second.symbol }, { after: 'own' });
	const item = itemsMap(doc).get(second.id)!;
	for (const field of ['j2', 'gm', 'radius', 'period', 'oblateness', 'primaryGm', 'distance'])
		item.delete(field);
	completeFields(doc, second.id);
	setChoice(doc, second.id, 'body', second.body);
	setChoice(doc, second.id, 'j2', second.j2);
	textField(doc, second.id, 'distance')!.insert(0, ' km');
	textField(doc, second.id, 'distance')!.insert(0, '384 400');
	return state(doc);
}

/** Typed, then filled whole from a baseline. */
function takenGiven(): string[] {
	const [given] = contentOf('taken-given').items;
	const { id, symbol, description, value, unit, uncertainty, source, taken } = given;
	const doc = new Y.Doc();
	setThinLimit(doc, '0.10');
	addItem(doc, { id, kind: 'given', symbol, description, value: '95', unit: 'ksi' }, { after: null });
	writeFields(doc, id, { value, unit, uncertainty, source }, { taken });
	return state(doc);
}

function contentOf(name: string) {
	return JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8')).content;
}

/** A document is begun as a file with its content alone; this adds what was written. */
for (const [name, write] of Object.entries({
	'every-kind': everyKind,
	'many-hands': manyHands,
	'editor-prose': editorProse,
	damaged,
	'other-places': otherPlaces,
	'taken-given': takenGiven
})) {
	const file = new URL(`${name}.json`, folder);
	if (!existsSync(file)) throw new Error(`${name}.json is to say by hand what it must read as.`);
	const frozen = JSON.parse(readFileSync(file, 'utf8'));
	if (frozen.updates) continue;
	const written = { about: frozen.about, updates: write(), content: frozen.content };
	writeFileSync(file, JSON.stringify(written, null, '\t') + '\n');
}
