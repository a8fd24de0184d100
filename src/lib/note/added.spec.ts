import { expect, it } from 'vitest';
import { withAdded, type ShownInline } from './added';
import type { Prose, ProseInline } from './prose';

const doc = (...content: ProseInline[]): Prose => ({
	type: 'doc',
	content: [{ type: 'paragraph', content }]
});
const text = (words: string): ProseInline => ({ type: 'text', text: words });

/** The pieces of a paragraph, what is new in brackets. */
function shown(before: Prose, after: Prose): string {
	const [block] = withAdded(before, after).content;
	const content = (block as { content: ShownInline[] }).content;
	return content
		.map((inline) => {
			const words = inline.type === 'text' ? inline.text : inline.type;
			return inline.added ? `[${words}]` : words;
		})
		.join('');
}

it('marks the new words and not the spaces around them', () => {
	expect(shown(doc(text('The line holds.')), doc(text('The stepped line holds well.')))).toBe(
		'The [stepped] line holds [well].'
	);
});

it('marks neighbouring new words as one', () => {
	expect(shown(doc(text('In one.')), doc(text('In one piece from the loom.')))).toBe(
		'In one [piece from the loom].'
	);
});

it('marks new live values and formulas', () => {
	const value: ProseInline = { type: 'quantity', attrs: { item: 'a', output: '' } };
	expect(shown(doc(text('It is ')), doc(text('It is '), value))).toBe('It is [quantity]');
});

it('keeps every letter of the text, and how it is set', () => {
	const bold: ProseInline = { type: 'text', text: 'one  two,three', marks: [{ type: 'bold' }] };
	const [block] = withAdded(doc(text('two')), doc(text(' a '), bold)).content;
	const content = (block as { content: ProseInline[] }).content;
	expect(content.map((inline) => (inline.type === 'text' ? inline.text : '')).join('')).toBe(
		' a one  two,three'
	);
	expect(content.slice(-1)[0]).toMatchObject({ marks: [{ type: 'bold' }] });
});

it('marks nothing where nothing is new', () => {
	const same = doc(text('As it was.'));
	expect(shown(same, same)).toBe('As it was.');
});

it('goes through lists', () => {
	const listed = (words: string): Prose => ({
		type: 'doc',
		content: [
			{
				type: 'bulletList',
				content: [{ type: 'listItem', content: doc(text(words)).content }]
			}
		]
	});
	expect(JSON.stringify(withAdded(listed('one'), listed('one two')))).toContain(
		'{"type":"text","text":"two","added":true}'
	);
});
