import { describe, expect, it } from 'vitest';
import type { Quantity } from '../engine/calc/results';
import { fieldsOf, newerThan, readTaken, takenText, type Takeable } from './taken';

const quantity = (more: Partial<Quantity> = {}): Quantity => ({
	si: 110.0937e9,
	dimension: [1, -1, -2, 0, 0, 0, 0],
	value: 110.0937,
	unit: 'GPa',
	uncertainty: 1.1,
	digits: 4,
	...more
});
const strength = (revision: string, more: Partial<Quantity> = {}): Takeable => ({
	...{ noteId: 'n-2', itemId: 'σ/B', output: '', revision, noteNumber: 'CL-DN-002', number: '3.1' },
	...{ symbol: 'σ_B', symbolTex: '', description: 'Strength, B-basis' },
	outcome: { state: 'value', quantity: quantity(more) }
});
const typed = (more: Partial<Quantity> = {}) =>
	({ state: 'value', quantity: quantity(more) }) as const;

describe('what is taken from a baseline', () => {
	it('is kept as a text that reads as it was; any other text is nothing taken', () => {
		const taken = { noteId: 'n-2', itemId: 'σ/B', output: 'mass', revision: 'A' };
		expect(readTaken(takenText(taken))).toEqual(taken);
		for (const text of [
			'',
			'x',
			'[]',
			'["a","b","c"]',
			'["a","b","c",4]',
			'{"noteId":"a"}',
			'null'
		])
			expect(readTaken(text)).toBeNull();
	});

	it('fills the fields of a given and says where it comes from', () => {
		expect(fieldsOf(strength('A', { value: 110.093712345, uncertainty: null }))).toEqual({
			value: '110.09371',
			unit: 'GPa',
			uncertainty: '',
			source: 'CL-DN-002 baseline A, 3.1'
		});
		expect(fieldsOf({ ...strength('A'), outcome: { state: 'blank' } })).toBeNull();
	});

	it('is flagged when a newer baseline has another value or uncertainty, and only then', () => {
		const taken = readTaken(takenText(strength('A')))!;
		expect(newerThan(taken, typed(), [strength('A')])).toBeNull();
		expect(newerThan(taken, typed({ si: 110.0937000001e9 }), [strength('B')])).toBeNull();
		expect(newerThan(taken, typed(), [strength('B', { si: 108e9, value: 108 })])).toMatchObject({
			revision: 'B'
		});
		expect(newerThan(taken, typed(), [strength('B', { uncertainty: 2 })])).not.toBeNull();
		expect(newerThan(taken, undefined, [strength('B')])).not.toBeNull();
		// The item is gone from the newer baseline: nothing to take.
		expect(newerThan(taken, typed(), [{ ...strength('B'), itemId: 'other' }])).toBeNull();
	});
});
