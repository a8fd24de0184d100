/**
 * Standard uncertainties through notes against figures from outside: the GUM's worked examples, and
 * mpmath at 150 digits (make_uncertainty.py).
 */
import { describe, expect, it } from 'vitest';
import type { GivenItem, SheetItem } from '$lib/engine/calc/items';
import type { ItemResult, Quantity } from '$lib/engine/calc/results';
import { lineModel } from '$lib/engine/calc/items.fixture';
import { createSheet } from '$lib/engine/calc/sheet';
import { lines, notes } from './data/uncertainty.json';

const EXACT_SLOPES = 1e-9;
/** Through a line model slopes come from differences. */
const DIFFERENCES = 1e-8;

const given = (symbol: string, value: string, unit = '', uncertainty = ''): GivenItem => ({
	id: symbol,
	kind: 'given',
	symbol,
	value,
	unit,
	uncertainty
});
const calculation = (symbol: string, expression: string, unit = ''): SheetItem => ({
	id: symbol,
	kind: 'calculation',
	symbol,
	expression,
	unit,
	digits: ''
});

function quantitiesOf(upsert: SheetItem[]): Map<string, Quantity> {
	const sheet = createSheet();
	sheet.apply({ upsert });
	const outcomes = (result: ItemResult) => {
		if (result.kind === 'check') return [];
		if (result.kind !== 'lineModel') return [[result.id, result.outcome] as const];
		return result.outputs.map(({ name, outcome }) => [name, outcome] as const);
	};
	return new Map(
		sheet
			.results()
			.flatMap(outcomes)
			.flatMap(([name, outcome]) =>
				outcome.state === 'value' ? [[name, outcome.quantity] as const] : []
			)
	);
}

const relative = (got: number | null, expected: number) =>
	expected === 0 ? (got ?? 0) : Math.abs((got ?? NaN) / expected - 1);

describe('worked examples of the guides', () => {
	it('end gauge calibration, JCGM 100 H.1.5: 32 nm to first order', () => {
		// Inputs of H.1.3; the sum of the squares as told there is 1002 nm².
		const found = quantitiesOf([
			given('l_S', '50 000 623', 'nm', '25'),
			given('d', '215', 'nm', '9.7'),
			given('α_S', '11.5e-6', '1/K', '1.2e-6'),
			given('δα', '0', '1/K', '0.58e-6'),
			given('θ', '-0.1', 'K', '0.41'),
			given('δθ', '0', 'K', '0.029'),
			calculation('l', 'l_S + d - l_S * (δα * θ + α_S * δθ)', 'nm')
		]).get('l')!;
		expect(found.value).toBeCloseTo(50_000_838, 6);
		expect(found.uncertainty!).toBeCloseTo(Math.sqrt(1002), 0);
		expect(Math.round(found.uncertainty!)).toBe(32);
	});

	it('a sum of four, JCGM 101 9.2: 2.0, and 10.1 where one has 10', () => {
		const sum = (last: string) =>
			quantitiesOf([
				...['1', '1', '1', last].map((u, i) => given(`X_${i}`, '0', '', u)),
				calculation('Y', 'X_0 + X_1 + X_2 + X_3')
			]).get('Y')!.uncertainty!;
		expect(sum('1')).toBeCloseTo(2.0, 12);
		expect(sum('10')).toBeCloseTo(10.1, 1);
	});

	it('resistance and reactance, the data of JCGM 100 H.2 taken as independent', () => {
		// R = V/I cos φ, X = V/I sin φ; slopes written out by hand from the formulas.
		const [V, I, φ] = [4.999, 19.661e-3, 1.04446];
		const [uV, uI, uφ] = [0.0032, 0.0095e-3, 0.00075];
		const Z = V / I;
		const found = quantitiesOf([
			given('V', '4.999', 'V', '0.0032'),
			given('I', '19.661', 'mA', '0.0095'),
			given('φ', '1.04446', 'rad', '0.00075'),
			calculation('R', 'V/I * cos(φ)', 'ohm'),
			calculation('X', 'V/I * sin(φ)', 'ohm'),
			calculation('Z', 'hypot(R, X)', 'ohm')
		]);
		// 127.73 Ω, 219.85 Ω and 254.26 Ω as told in table H.4.
		expect(found.get('R')!.value).toBeCloseTo(127.73, 2);
		expect(found.get('X')!.value).toBeCloseTo(219.85, 1);
		expect(found.get('Z')!.value).toBeCloseTo(254.26, 1);
		const share = (Z: number) => Math.hypot((Z * uV) / V, (Z * uI) / I);
		const [uR, uX] = [
			Math.hypot(share(Z * Math.cos(φ)), Z * Math.sin(φ) * uφ),
			Math.hypot(share(Z * Math.sin(φ)), Z * Math.cos(φ) * uφ)
		];
		expect(relative(found.get('R')!.uncertainty, uR)).toBeLessThan(1e-12);
		expect(relative(found.get('X')!.uncertainty, uX)).toBeLessThan(1e-12);
		// What R and X have in common counts as common: Z does not hang on φ.
		expect(relative(found.get('Z')!.uncertainty, share(Z))).toBeLessThan(1e-12);
	});
});

describe('random notes against mpmath at 150 digits', () => {
	it('has 250 of them', () => expect(notes).toHaveLength(250));

	it('agrees to 1e-9 in every quantity', () => {
		for (const [n, { givens, calculations, expected }] of notes.entries()) {
			const found = quantitiesOf([
				...givens.map(({ symbol, value, uncertainty }) => given(symbol, value, '', uncertainty)),
				...calculations.map((text, k) => calculation(`q_${k}`, text))
			]);
			expected.forEach(({ value, uncertainty }, k) => {
				const quantity = found.get(`q_${k}`)!;
				const what = `note ${n}, q_${k} = ${calculations[k]}`;
				expect(Math.abs(quantity.value - value), what).toBeLessThan(1e-9 * (1 + Math.abs(value)));
				expect(relative(quantity.uncertainty, uncertainty), what).toBeLessThan(EXACT_SLOPES);
			});
		}
	});
});

describe('line models against mpmath at 30 digits', () => {
	it('has ten of them', () => expect(lines).toHaveLength(10));

	for (const { inputs, uncertainties, expected } of lines) {
		it(`agrees to 1e-8 for ${inputs.join(', ')}`, () => {
			const names = ['ρ', 'σ', 'h', 'm_lift', 'R'];
			const units = ['kg/m^3', 'Pa', 'm', 'kg', ''];
			const found = quantitiesOf([
				...names.map((name, i) => given(name, inputs[i]!, units[i], uncertainties[i]!)),
				lineModel({
					...{ density: 'ρ', allowable: 'σ', factorOfSafety: '2' },
					...{ lift: 'm_lift', reserve: 'R', top: 'h' }
				})
			]);
			for (const [name, uncertainty] of Object.entries(expected)) {
				const { uncertainty: inUnit, si, value } = found.get(name)!;
				const got = inUnit! * (si / value);
				expect(relative(got, uncertainty), name).toBeLessThan(DIFFERENCES);
			}
		});
	}
});
