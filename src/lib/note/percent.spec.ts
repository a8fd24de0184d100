import { expect, test } from 'vitest';
import { percentWords } from './percent';

test('a change is told in percent, with its sign and enough digits to be seen', () => {
	expect(
		[-0.056, 0.0987, 0.00003, -3e-9, 0, 11.4, null].map((change) =>
			percentWords(change).replace('\u202f', ' ')
		)
	).toEqual(['−5.6 %', '+9.9 %', '+0.0030 %', '−3.0×10⁻⁷ %', '0 %', '×12.4', '']);
});
