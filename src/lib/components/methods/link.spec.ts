import { describe, expect, it } from 'vitest';
import { METHODS } from '$lib/engine/methods/catalogue';
import { hashOf, typedFrom } from './link';
import { blankFields, type TypedFields } from './typed';

const fields = METHODS.get('uniform-line')!.inputs;

describe('an address with inputs', () => {
	it('opens the form as it was, units as typed', () => {
		const typed = { ...blankFields(fields), density: '1 300 kg/m³', stress: '50 GPa & more' };
		const hash = hashOf(fields, typed)!;
		expect(hash).toMatch(/^#in=[\w%.~!*'()-]+$/);
		expect(typedFrom(fields, hash)).toEqual(typed);
	});

	it('of a blank form is that of any method', () => {
		for (const { name, inputs } of METHODS.values()) {
			const blank = blankFields(inputs);
			expect(typedFrom(inputs, hashOf(inputs, blank)!), name).toEqual(blank);
		}
	});

	it('is not made when it would be too long to pass on', () => {
		const { inputs } = METHODS.get('coupon-statistics')!;
		const [name] = Object.keys(inputs) as [string];
		const typed: TypedFields = { ...blankFields(inputs), [name]: '110.04\n'.repeat(2000) };
		expect(hashOf(inputs, typed)).toBeNull();
	});

	it('that says anything else leaves the field blank', () => {
		const blank = blankFields(fields);
		const says = (value: unknown) => `#in=${encodeURIComponent(JSON.stringify(value))}`;
		for (const wrong of [
			{ density: 5, site: 'earth' },
			{ density: { a: 1 }, site: { kind: '__proto__' } },
			{ site: [], extra: '1' },
			[],
			null
		])
			expect(typedFrom(fields, says(wrong))).toEqual(blank);
		for (const hash of ['', '#top', '#in=%E0%A4', '#in={'])
			expect(typedFrom(fields, hash)).toBeNull();
	});
});
