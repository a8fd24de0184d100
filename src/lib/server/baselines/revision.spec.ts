import { expect, test } from 'vitest';
import { nextRevision } from './revision';

test('letters that are misread are left out (ASME Y14.35, common practice)', () => {
	const letters = ['A'];
	while (letters.at(-1)!.length === 1) letters.push(nextRevision(letters.at(-1)!));
	expect(letters.join(' ')).toBe('A B C D E F G H J K L M N P R T U V W Y AA');
});

test('after AY comes BA, after YY comes AAA', () => {
	expect(nextRevision('AY')).toBe('BA');
	expect(nextRevision('YY')).toBe('AAA');
});

test('what is no revision letter has no next', () => {
	expect(() => nextRevision('I')).toThrow('"I" is no revision letter.');
	expect(() => nextRevision('')).toThrow();
});
