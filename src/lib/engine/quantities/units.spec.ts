import { describe, expect, it } from 'vitest';
import { dimensionText } from './dimension';
import { unitText } from './format';
import { PREFIXES, UNITS } from './unit-table';
import { scanUnit } from './unit-reader';
import { parseUnit } from './units';

const read = (text: string) => {
	const parsed = parseUnit(text);
	return parsed.ok
		? { factor: parsed.unit.factor, dimension: dimensionText(parsed.unit.dimension) }
		: { message: parsed.message, remedy: parsed.remedy };
};

describe('a unit as typed', () => {
	it.each([
		['kg/m^3', 1, 'M L⁻³'],
		['kg m^-3', 1, 'M L⁻³'],
		['kg·m⁻³', 1, 'M L⁻³'],
		['kg*m^(-3)', 1, 'M L⁻³'],
		['N/tex', 1e6, 'L² T⁻²'],
		['mm²', 1e-6, 'L²'],
		['mm^2', 1e-6, 'L²'],
		['m/s²', 1, 'L T⁻²'],
		['W/(m K)', 1, 'M L T⁻³ Θ⁻¹'],
		['1/s', 1, 'T⁻¹'],
		['1/(m^2 yr)', 1 / 31557600, 'L⁻² T⁻¹'],
		['m/s/s', 1, 'L T⁻²'],
		['Pa^(1/2)', 1, 'M^(1/2) L^(-1/2) T⁻¹'],
		['sidereal day', 86164.0905, 'T'],
		['µm', 1e-6, 'L'],
		['%', 0.01, '1'],
		['', 1, '1']
	])('%s is read', (text, factor, dimension) => {
		expect(read(text)).toEqual({ factor: expect.closeTo(factor, 15), dimension });
	});

	it('is refused where a product after a division can be read in two ways', () => {
		expect(read('J/kg K')).toEqual({
			message: '“J/kg K” can be read in two ways: a product follows a division.',
			remedy: 'Write J/(kg K) if all of it divides.'
		});
	});

	it('that is not known is named, with what differs only in capitals', () => {
		expect(read('mpa')).toEqual({
			message: '“mpa” is not a unit known here.',
			remedy: 'Near it: MPa, mPa.'
		});
		expect(read('kg/furlong').message).toBe('“furlong” is not a unit known here.');
	});

	it('never takes a name from what every object has', () => {
		for (const name of ['constructor', '__proto__', 'toString']) {
			expect(read(name).message).toContain('not a unit');
		}
	});

	it('makes degrees differences in a product', () => {
		expect(parseUnit('W/(m degC)')).toMatchObject({ ok: true, unit: { offset: 0 } });
		expect(parseUnit('degC')).toMatchObject({ ok: true, unit: { offset: 273.15 } });
	});
});

describe('a unit in an expression', () => {
	const scanned = (text: string) => scanUnit(text, 0, { tight: true })?.unit.text ?? null;

	it('goes on as long as units follow closely', () => {
		expect(scanned('m/s^2 + 3')).toBe('m/s^2');
		expect(scanned('kg m^-3*x')).toBe('kg m^-3');
		expect(scanned('J/(kg K)/b')).toBe('J/(kg K)');
	});

	it('ends before a spaced operator, a symbol and an argument', () => {
		expect(scanned('kN / A')).toBe('kN');
		expect(scanned('km*x_1')).toBe('km');
		expect(scanned('kN/(A_1 + A_2)')).toBe('kN');
		expect(scanned('m_lift')).toBeNull();
		expect(scanned('min(a, b)')).toBeNull();
		expect(scanned('m/s t')).toBe('m/s');
	});
});

describe('the table of units', () => {
	it('gives no name two meanings', () => {
		const definitions = [...UNITS.keys()];
		expect(new Set(definitions).size).toBe(definitions.length);
		for (const name of definitions) {
			const prefixed = Object.keys(PREFIXES).filter(
				(prefix) =>
					UNITS.get(name.slice(prefix.length))?.prefixes?.includes(prefix) &&
					name.startsWith(prefix)
			);
			const own = UNITS.get(name)!.prefixes !== undefined || prefixed.length === 0 ? 1 : 0;
			expect(prefixed.length + own, name).toBe(1);
		}
	});
});

describe('a unit in print', () => {
	it.each([
		['kg/m^3', 'kg/m³'],
		['kg m^-3', 'kg·m⁻³'],
		['um', 'µm'],
		['degC', '°C'],
		['N / tex', 'N/tex'],
		['sidereal_day', 'sidereal day'],
		['W/(m K)', 'W/(m·K)'],
		['mm²', 'mm²'],
		['', '']
	])('%s is set as %s', (typed, printed) => expect(unitText(typed)).toBe(printed));
});
