import { expect, test } from 'vitest';
import { DEEPEST, inSentences, isTooDeep } from './refusals';

const nested = (depth: number) => JSON.parse('['.repeat(depth) + ']'.repeat(depth));

test('what is nested beyond the limit is found, however deep it goes', () => {
	expect(isTooDeep(nested(DEEPEST))).toBe(false);
	expect(isTooDeep(nested(DEEPEST + 2))).toBe(true);
	expect(isTooDeep(nested(500_000))).toBe(true);
	expect(isTooDeep({ a: [{ b: null }, 'text', 3] })).toBe(false);
});

test('a misfit names its place unless it is a sentence of its own', () => {
	const misfits = [
		{ field: 'items.0.kind', message: 'expected text' },
		{ field: '', message: 'expected an object' },
		{ field: 'name', message: 'Say what it is for.' }
	];
	expect(inSentences(misfits)).toBe(
		'items.0.kind: expected text. The whole: expected an object. Say what it is for.'
	);
});
