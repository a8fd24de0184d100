/** Short forms in which the demo programme's notes are written. */
import type { Item, ItemOf } from '../../src/lib/note/items';
import { BLANK } from '../../src/lib/note/items';
import type { ProseBlock, ProseInline } from '../../src/lib/note/prose';

export const section = (id: string, title: string): Item => ({
	...BLANK.section,
	id,
	kind: 'section',
	title
});

/** A given: symbol, what it is, value, unit, standard uncertainty, source. */
export const given = (
	id: string,
	symbol: string,
	description: string,
	value: string,
	unit: string,
	uncertainty: string,
	source: string
): Item => ({
	id,
	kind: 'given',
	...{ symbol, description, value, unit, uncertainty, source },
	taken: ''
});

export const calculation = (
	id: string,
	symbol: string,
	description: string,
	expression: string,
	unit = '',
	digits = ''
): Item => ({ id, kind: 'calculation', symbol, description, expression, unit, digits });

export const check = (
	id: string,
	description: string,
	left: string,
	relation: ItemOf<'check'>['relation'],
	right: string,
	tolerance = ''
): Item => ({ id, kind: 'check', description, left, relation, right, tolerance, required: '' });

export const lineModel = (
	id: string,
	symbol: string,
	description: string,
	inputs: Partial<Omit<ItemOf<'lineModel'>, 'id' | 'kind'>>
): Item => ({ ...BLANK.lineModel, ...inputs, id, kind: 'lineModel', symbol, description });

export const evidence = (id: string, description: string): Item => ({
	id,
	kind: 'evidence',
	description,
	files: []
});

export const text = (id: string, ...content: ProseBlock[]): Item => ({
	id,
	kind: 'text',
	body: { type: 'doc', content }
});

/** A paragraph of plain words and inline parts. */
export const paragraph = (...parts: (string | ProseInline)[]): ProseBlock => ({
	type: 'paragraph',
	content: parts.map(inline)
});

export const bullets = (...points: (string | ProseInline)[][]): ProseBlock => ({
	type: 'bulletList',
	content: points.map((parts) => ({ type: 'listItem', content: [paragraph(...parts)] }))
});

export const formula = (tex: string): ProseInline => ({ type: 'formula', attrs: { tex } });

/** The live value of another item. */
export const value = (item: string, output = ''): ProseInline => ({
	type: 'quantity',
	attrs: { item, output }
});

const inline = (part: string | ProseInline): ProseInline =>
	typeof part === 'string' ? { type: 'text', text: part } : part;
