import { expect, test } from 'vitest';
import { pieces } from './pieces';

test('a text without marks is one piece', () => {
	expect(pieces('σ_d/FS', [], [])).toEqual([{ text: 'σ_d/FS', faulty: false, caretAfter: '' }]);
});

test('a fault is underlined and a caret stands between letters', () => {
	expect(pieces('ro + 2 t', [{ from: 0, to: 2 }], [{ at: 5, name: 'L. Haddad' }])).toEqual([
		{ text: 'ro', faulty: true, caretAfter: '' },
		{ text: ' + ', faulty: false, caretAfter: 'L. Haddad' },
		{ text: '2 t', faulty: false, caretAfter: '' }
	]);
});

test('marks that lie beyond the text, because it was just shortened, stay inside it', () => {
	expect(pieces('ab', [{ from: 1, to: 9 }], [{ at: 7, name: 'M. Quispe' }])).toEqual([
		{ text: 'a', faulty: false, caretAfter: '' },
		{ text: 'b', faulty: true, caretAfter: 'M. Quispe' }
	]);
	expect(pieces('', [], [{ at: 0, name: 'M. Quispe' }])).toEqual([
		{ text: '', faulty: false, caretAfter: 'M. Quispe' }
	]);
});
