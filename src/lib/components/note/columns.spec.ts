import { expect, test } from 'vitest';
import { captionsFor, kindsBySection } from './columns';

test('a section is captioned by what stands in it', () => {
	expect(captionsFor(new Set(['given', 'text'])).source).toBe('Source');
	expect(captionsFor(new Set(['calculation'])).source).toBe('Formula');
	expect(captionsFor(new Set(['given', 'calculation', 'check'])).source).toBe('Source or formula');
	expect(captionsFor(new Set(['check']))).toMatchObject({ value: 'Margin', beside: 'State' });
	expect(captionsFor(new Set(['text'])).value).toBe('');
});

test('items belong to the section above them', () => {
	const kinds = kindsBySection([
		{ id: 'a', kind: 'text' },
		{ id: 's', kind: 'section' },
		{ id: 'b', kind: 'given' },
		{ id: 't', kind: 'section' }
	]);
	expect(kinds).toEqual(
		new Map([
			['s', new Set(['given'])],
			['t', new Set()]
		])
	);
});
