import { expect, test } from 'vitest';
import * as Y from 'yjs';
import { addItem, textField } from '$lib/note/document';
import { AsItWas } from './as-it-was';

const mine = Symbol('mine');

function note() {
	const doc = new Y.Doc();
	const id = addItem(doc, { kind: 'given', symbol: 'ρ', value: '1300' }, { after: null });
	return { doc, id, value: textField(doc, id, 'value')! };
}

test('closing with Esc takes back what I typed since I opened the item', () => {
	const { doc, id, value } = note();
	const was = new AsItWas(doc, id, mine);
	doc.transact(() => value.insert(4, '5'), mine);
	doc.transact(() => value.delete(0, 1), mine);
	expect(was.changed).toBe(true);
	was.restore();
	expect(value.toString()).toBe('1300');
});

test('what somebody else typed meanwhile stays', () => {
	const { doc, id, value } = note();
	const was = new AsItWas(doc, id, mine);
	doc.transact(() => value.insert(4, '.5'), mine);
	doc.transact(() => textField(doc, id, 'unit')!.insert(0, 'kg/m^3'), 'theirs');
	doc.transact(() => value.insert(0, '2'), 'theirs');
	was.restore();
	expect(value.toString()).toBe('21300');
	expect(textField(doc, id, 'unit')!.toString()).toBe('kg/m^3');
});

test('what I typed before I opened it stays', () => {
	const { doc, id, value } = note();
	doc.transact(() => value.insert(4, '0'), mine);
	const was = new AsItWas(doc, id, mine);
	expect(was.changed).toBe(false);
	was.restore();
	expect(value.toString()).toBe('13000');
});
