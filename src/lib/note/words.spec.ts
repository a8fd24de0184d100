import { expect, test } from 'vitest';
import type { Prose, ProseInline } from './prose';
import { proseTokens, textTokens } from './tokens';
import { differenceOf, type Part } from './words';

const shown = (parts: Part[]) =>
	parts.map(({ change, tokens }) => [
		change,
		tokens
			.map(({ text, spaced }) => (spaced ? `${text} ` : text))
			.join('')
			.trim()
	]);

const prose = (...content: ProseInline[]): Prose => ({
	type: 'doc',
	content: [{ type: 'paragraph', content }]
});

test('words that came in and went out are told apart and counted', () => {
	const difference = differenceOf(
		textTokens('The stepped line as manufactured follows in CL-DN-005.'),
		textTokens('The stepped line as manufactured, transits and periods follow in CL-DN-005.')
	);
	expect(shown(difference.parts)).toEqual([
		['same', 'The stepped line as manufactured'],
		['out', 'follows'],
		['in', ', transits and periods follow'],
		['same', 'in CL-DN-005.']
	]);
	expect(difference.wordsIn).toBe(4);
	expect(difference.wordsOut).toBe(1);
});

test('a number, an identifier and an apostrophe do not break a word', () => {
	expect(textTokens('the loom’s 1.059 in CL-DN-004, n_2').map(({ text }) => text)).toEqual([
		'the',
		'loom’s',
		'1.059',
		'in',
		'CL-DN-004',
		',',
		'n_2'
	]);
});

test('a live value in a sentence is one word, and its figure is no change of text', () => {
	const quantity = { type: 'quantity', attrs: { item: 'a', output: '' } } as const;
	const formula = { type: 'formula', attrs: { tex: '\\rho' } } as const;
	const before = prose({ type: 'text', text: 'At ' }, quantity, {
		type: 'text',
		text: ' it holds.'
	});
	const after = prose({ type: 'text', text: 'At ' }, quantity, formula, {
		type: 'text',
		text: ' it holds.'
	});
	const difference = differenceOf(proseTokens(before), proseTokens(after));
	expect(shown(difference.parts)).toEqual([
		['same', 'At a'],
		['in', '\\rho'],
		['same', 'it holds.']
	]);
	expect(difference.wordsIn).toBe(1);
});

test('white space and line breaks alone are no difference', () => {
	const one = prose({ type: 'text', text: 'one two' });
	const broken = prose(
		{ type: 'text', text: 'one' },
		{ type: 'hardBreak' },
		{ type: 'text', text: 'two' }
	);
	expect(differenceOf(proseTokens(one), proseTokens(broken)).wordsIn).toBe(0);
	expect(proseTokens(broken)[0]).toEqual({ kind: 'word', text: 'one', spaced: true });
});

test('texts that have nothing in common are replaced whole, in bounded time', () => {
	const many = (from: number) =>
		textTokens(Array.from({ length: 20_000 }, (_, i) => `w${from + i}`).join(' '));
	const started = performance.now();
	const { wordsIn, wordsOut } = differenceOf(many(0), many(1_000_000));
	expect({ wordsIn, wordsOut }).toEqual({ wordsIn: 20_000, wordsOut: 20_000 });
	expect(performance.now() - started).toBeLessThan(3000);
});
