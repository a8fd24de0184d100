import { describe, expect, it } from 'vitest';
import { quantity } from '$lib/engine/methods/parameter';
import { DENSITY, PRESSURE, PURE, TEMPERATURE, TIME } from '$lib/engine/quantities/dimension';
import { readQuantity } from './quantity';

const stress = quantity({ label: 'stress', dimension: PRESSURE, unit: 'GPa' });
const density = quantity({ label: 'density', dimension: DENSITY, unit: 'kg/m^3' });
const period = quantity({ label: 'period', dimension: TIME, unit: 'h' });
const share = quantity({ label: 'share', dimension: PURE, unit: '' });
const rise = quantity({ label: 'rise', dimension: TEMPERATURE, unit: 'K' });

describe('a quantity in a field', () => {
	it.each([
		['50', stress, 50e9],
		['50 GPa', stress, 50e9],
		['50GPa', stress, 50e9],
		['5e10 Pa', stress, 5e10],
		['-1.5e-3 MPa', stress, -1500],
		// 1 psi = 6 894.757 Pa, NIST SP 811 table B.8.
		['1 psi', stress, 6894.757293168],
		['1 300 kg/m³', density, 1300],
		['1.3 g/cm^3', density, 1300],
		['1 300 kg m^-3', density, 1300],
		['23 h 56 min', period, 86_160],
		['23 h 56 min 4.1 s', period, 86_164.1],
		['-1 h 30 min', period, -5400],
		['86164 s', period, 86_164],
		['5 %', share, 0.05],
		['0.05', share, 0.05],
		['12 K', rise, 12]
	])('%s is read', (typed, field, si) => {
		const found = readQuantity(typed, field);
		expect(found).toMatchObject({ ok: true });
		if (found.ok) expect(found.si / si).toBeCloseTo(1, 12);
	});

	it.each([
		['50 kg', stress, 'kg is a unit of a mass, M; what is wanted is a pressure'],
		['50 Gpa', stress, 'GPa'],
		['5,0 GPa', stress, 'Write 5.0.'],
		['GPa', stress, 'is not a number'],
		['12 degC', rise, 'Write the value in K.'],
		['5 m', share, 'a figure without a unit'],
		['23 h 56', period, 'has no unit'],
		['23 h -56 min', period, 'before the whole only']
	])('%s is refused with what to do', (typed, field, words) => {
		const found = readQuantity(typed, field);
		expect(found.ok ? '' : found.message).toContain(words);
	});
});
