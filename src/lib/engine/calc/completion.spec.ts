import { describe, expect, it } from 'vitest';
import { complete } from './completion';
import { calculation, given, lineModel } from './items.fixture';
import { createSheet } from './sheet';

describe('completion', () => {
	const sheet = createSheet();
	sheet.apply({
		upsert: [
			given('σ_al', '110', 'GPa'),
			given('mass_climber', '14', 't'),
			calculation('σ_d', 'σ_al/1.75'),
			lineModel()
		]
	});
	const names = (prefix: string) => complete(sheet, prefix).map(({ name }) => name);

	it('offers the symbols of the note first, with what stands behind each', () => {
		expect(complete(sheet, 'σ_')).toMatchObject([
			{
				kind: 'symbol',
				name: 'σ_al',
				id: 'σ_al',
				outcome: { quantity: { value: 110, unit: 'GPa' } }
			},
			{ kind: 'symbol', name: 'σ_d', id: 'σ_d' }
		]);
		expect(names('ma').slice(0, 2)).toEqual(['mass_climber', 'mars.GM']);
	});

	it('offers the outputs of a line model', () => {
		expect(names('line.ma')).toEqual(['line.mass', 'line.mass_above', 'line.mass_below']);
	});

	it('offers constants, functions and units, what is spelt as typed before other capitals', () => {
		expect(complete(sheet, 'sq')).toMatchObject([{ kind: 'function', name: 'sqrt' }]);
		expect(names('gp')).toContain('GPa');
		expect(names('earth.')).toEqual(['earth.GM', 'earth.radius', 'earth.rate', 'earth.J2']);
		expect(names('MP')).toEqual(['MPa', 'mPa']);
		expect(names('mP')).toEqual(['mPa', 'MPa']);
	});
});
