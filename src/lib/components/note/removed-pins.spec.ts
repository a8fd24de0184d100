import { expect, test } from 'vitest';
import type { RemarkView } from '$lib/server/remarks/list';
import { compareNumbers, removedPins } from './removed-pins';

const numbers: Record<string, string> = { s: '3', a: '3.1', b: '3.2', t: '4', c: '4.1' };
const sheet = {
	order: ['s', 'a', 'b', 't', 'c'],
	number: (id: string) => numbers[id] ?? ''
};
const remark = (itemId: string, number: string) => ({ itemId, pinned: { number } }) as RemarkView;

test('numbers are compared as numbers', () => {
	expect(compareNumbers('3.10', '3.9')).toBeGreaterThan(0);
	expect(compareNumbers('3', '3.1')).toBeLessThan(0);
});

test('a removed item that has pins keeps its place', () => {
	const remarks = [remark('x', '3.3'), remark('a', '3.1'), remark('y', '3.2'), remark('x', '3.3')];
	const places = removedPins(remarks, sheet);
	expect([...places.keys()]).toEqual(['b', 'a']);
	expect(places.get('b')).toMatchObject([{ itemId: 'x', remarks: [{}, {}] }]);
	expect(places.get('a')).toMatchObject([{ itemId: 'y' }]);
});

test('an item removed beyond the last one stands at the end', () => {
	expect([...removedPins([remark('z', '7.1')], sheet).keys()]).toEqual(['c']);
});
