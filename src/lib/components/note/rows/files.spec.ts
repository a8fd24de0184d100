import { expect, test } from 'vitest';
import { sizeWords } from './files';

// Decimal prefixes: IEC 80000-13, clause 4, and SI.
test('sizes are told in decimal units with one decimal below a hundred', () => {
	expect(sizeWords(0)).toBe('0\u202fB');
	expect(sizeWords(999)).toBe('999\u202fB');
	expect(sizeWords(1000)).toBe('1.0\u202fkB');
	expect(sizeWords(2_100_000)).toBe('2.1\u202fMB');
	expect(sizeWords(61_000_000)).toBe('61.0\u202fMB');
	expect(sizeWords(999_600)).toBe('1.0\u202fMB');
});
