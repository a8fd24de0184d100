import { describe, expect, it } from 'vitest';
import { METHODS } from '$lib/engine/methods/catalogue';
import { checkInputs } from '$lib/engine/methods/check';
import { choice, flag, group, list, quantity, variant } from '$lib/engine/methods/parameter';
import type { InputFault } from '$lib/engine/methods/refused';
import { LENGTH, PRESSURE } from '$lib/engine/quantities/dimension';
import { blankFields, readFields, type TypedFields } from './typed';

const stress = quantity({ label: 'stress', dimension: PRESSURE, unit: 'GPa', default: 5e9 });
const radius = quantity({ label: 'radius', dimension: LENGTH, unit: 'km' });

function read(fields: Parameters<typeof readFields>[0], typed: TypedFields) {
	const faults: InputFault[] = [];
	return { values: readFields(fields, typed, faults), faults };
}

describe('what is typed into a form', () => {
	it('stands in the method’s unit and is read in SI', () => {
		expect(blankFields({ stress })).toEqual({ stress: '5' });
		expect(read({ stress, radius }, { stress: '2.5', radius: '6 378' }).values).toEqual({
			stress: 2.5e9,
			radius: 6_378_000
		});
	});

	it('is told where it is no number, and nothing else is lost', () => {
		const { values, faults } = read({ stress, radius }, { stress: '1,5', radius: '7' });
		expect(values).toEqual({ radius: 7000 });
		expect(faults).toEqual([{ path: 'stress', message: expect.stringContaining('Write 1.5') }]);
	});

	it('takes a table by lines', () => {
		const rows = list({
			label: 'rows',
			fewest: 1,
			most: 9,
			of: group({ label: 'row', fields: { radius, stress } })
		});
		const { values, faults } = read({ rows }, { rows: '7000; 2\n8000\t3\n\n9;9;9' });
		expect(values).toEqual({
			rows: [
				{ radius: 7e6, stress: 2e9 },
				{ radius: 8e6, stress: 3e9 },
				{ radius: 9e3, stress: 9e9 }
			]
		});
		expect(faults).toEqual([{ path: 'rows.2', message: 'Line 3 has 3 values, not 2.' }]);
	});

	it('takes no comma for the end of a figure', () => {
		const rows = list({ label: 'rows', fewest: 1, most: 9, of: radius });
		expect(read({ rows }, { rows: '1,5' }).faults).toEqual([
			{ path: 'rows.0', message: expect.stringContaining('Write 1.5') }
		]);
	});

	it('is held against its range in the unit in which it was typed', () => {
		const share = quantity({ label: 'x', dimension: PRESSURE, unit: 'GPa', range: { most: 1e12 } });
		expect(read({ share }, { share: '2000' }).faults).toEqual([
			{ path: 'share', message: 'Must be 1\u202f000\u202fGPa or less.' }
		]);
	});

	it('leaves out a part that is not wanted, and reads the kind that is chosen', () => {
		const fields = {
			part: group({ label: 'part', optional: true, fields: { radius } }),
			way: variant({
				label: 'way',
				cases: {
					a: { label: 'A', fields: { side: choice({ label: 's', options: { l: 'L', r: 'R' } }) } },
					b: { label: 'B', fields: { on: flag({ label: 'on', default: true }) } }
				}
			})
		};
		expect(read(fields, blankFields(fields)).values).toEqual({ way: { kind: 'a', side: 'l' } });
		const chosen = { part: { '': true, radius: '1' }, way: { kind: 'b', on: true } };
		expect(read(fields, chosen).values).toEqual({
			part: { radius: 1000 },
			way: { kind: 'b', on: true }
		});
	});

	it('of a blank form misses only what has no default, in every method', () => {
		for (const { inputs, name } of METHODS.values()) {
			const { values, faults } = read(inputs, blankFields(inputs));
			expect(faults, name).toEqual([]);
			const checked = checkInputs(inputs, values);
			if (!checked.ok)
				for (const { message } of checked.faults)
					expect(message, name).toMatch(/is missing|must have/);
		}
	});
});
