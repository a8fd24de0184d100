import { expect, test } from 'vitest';
import { byteRange } from './range';

// The examples of RFC 9110 §14.1.2, for a representation of 10 000 bytes.
test.each([
	['bytes=0-499', { first: 0, last: 499 }],
	['bytes=500-999', { first: 500, last: 999 }],
	['bytes=-500', { first: 9500, last: 9999 }],
	['bytes=9500-', { first: 9500, last: 9999 }]
])('%s is the range that the standard says', (header, range) => {
	expect(byteRange(header, 10_000)).toEqual(range);
});

test('a range is cut where the file ends', () => {
	expect(byteRange('bytes=9990-20000', 10_000)).toEqual({ first: 9990, last: 9999 });
	expect(byteRange('bytes=-20000', 10_000)).toEqual({ first: 0, last: 9999 });
});

test('a range beyond the end cannot be answered', () => {
	expect(byteRange('bytes=10000-', 10_000)).toBe('beyond');
	expect(byteRange('bytes=-0', 10_000)).toBe('beyond');
});

test('what is no single range of bytes is answered with the whole', () => {
	for (const header of [null, '', 'bytes=-', 'bytes=5-2', 'bytes=0-1,3-4', 'lines=1-2'])
		expect(byteRange(header, 10_000)).toBeNull();
});
