/**
 * Line models against figures from outside: a published table, and mpmath and SciPy (make_sizing.py).
 * Tolerances: 1e-9 for closed forms, 1e-8 for integrals.
 */
import { describe, expect, it } from 'vitest';
import { BODIES, type BodyName } from '$lib/engine/line/bodies';
import { ofBody } from '$lib/engine/line/site';
import { sizeTaper, type TaperResult } from '$lib/engine/line/taper';
import { breakingLength, freeStandingRadius, uniformPeakStress } from '$lib/engine/line/uniform';
import cases from './data/taper.json';
import massCases from './data/mass.json';
import fieldCases from './data/field.json';
import moon from './data/moon.json';

const CLOSED = 1e-9;
const INTEGRAL = 1e-8;

const relative = (got: unknown, expected: number) => Math.abs(Number(got) / expected - 1);

describe('sizing against mpmath at 40 digits', () => {
	it('covers 48 lines on three bodies, with and without J2', () => {
		expect(cases).toHaveLength(48);
		expect(new Set(cases.map(({ body }) => body)).size).toBe(3);
	});

	const integrals: (keyof TaperResult)[] = ['mass', 'massBelow', 'massAbove', 'total'];

	for (const line of cases) {
		const { body, withJ2, density, designStress, topHeight, lift, reserve, expected } = line;
		const name = `${body}${withJ2 ? ' with J2' : ''}, ${density} kg/m³, ${designStress / 1e9} GPa, top ${topHeight / 1e6} Mm`;
		it(`agrees for ${name}`, () => {
			const field = ofBody(BODIES[body as BodyName], withJ2);
			const result = sizeTaper(field, {
				density,
				designStress,
				base: { lift },
				reserve,
				top: field.base + topHeight
			});
			for (const [key, value] of Object.entries(expected)) {
				const quantity = key as keyof TaperResult;
				const limit = integrals.includes(quantity) ? INTEGRAL : CLOSED;
				expect(relative(result[quantity], value), key).toBeLessThan(limit);
			}
		});
	}

	it('gives the same mass as SciPy’s DOP853 along the line', () => {
		expect(massCases).toHaveLength(2);
		const field = ofBody(BODIES.earth, false);
		for (const { designStress, mass } of massCases) {
			const result = sizeTaper(field, {
				density: 1300,
				designStress,
				base: { lift: 20e3 },
				reserve: 0,
				top: field.base + 1e8
			});
			expect(relative(result.mass, mass)).toBeLessThan(INTEGRAL);
		}
	});
});

describe('the field against mpmath at 40 digits', () => {
	it('agrees in g and in the rise of the potential, also between radii a metre apart', () => {
		expect(fieldCases).toHaveLength(20);
		for (const { body, withJ2, a, b, g, rise } of fieldCases) {
			const field = ofBody(BODIES[body as BodyName], withJ2);
			const { gm, rate } = BODIES[body as BodyName];
			// Near r_s both are the small difference of two large terms, whose size is what counts.
			const pull = (r: number) => gm.value / r ** 2 + rate.value ** 2 * r;
			expect(Math.abs(field.g(b) - g)).toBeLessThan(1e-14 * pull(b));
			expect(Math.abs(field.rise(a, b) - rise)).toBeLessThan(
				1e-14 * Math.max(pull(a), pull(b)) * (b - a)
			);
		}
	});
});

describe('figures of the trade', () => {
	const earth = ofBody(BODIES.earth, false);
	const sized = (density: number, designStress: number) =>
		sizeTaper(earth, {
			density,
			designStress,
			base: { lift: 20e3 },
			reserve: 0,
			top: earth.base + 1e8
		});

	// P. K. Aravind, Am. J. Phys. 75 (2007) 125, table of materials; from memory.
	it('gives the published taper of steel, of an aramid fibre and of nanotubes', () => {
		expect(Number(sized(7900, 5e9).taper) / 1e33).toBeCloseTo(1.7, 1);
		expect(Number(sized(1440, 3.6e9).taper) / 1e8).toBeCloseTo(2.6, 1);
		expect(Number(sized(1300, 130e9).taper)).toBeCloseTo(1.62, 2);
	});

	// Consistency figures computed with SciPy/mpmath: cases D1 and D2.
	it('sizes case D1', () => {
		const d1 = sized(1300, 50e9);
		expect(Number(d1.taper)).toBeCloseTo(3.52186, 5);
		expect(d1.baseArea * 1e6).toBeCloseTo(3.905748, 6);
		expect(Number(d1.mass)).toBeCloseTo(1_493_607.9, 1);
		expect(Number(d1.counterweight)).toBeCloseTo(777_827.9, 1);
	});

	it('sizes case D2', () => {
		const d2 = sized(1300, 65e9);
		expect(Number(d2.taper)).toBeCloseTo(2.633868, 6);
		expect(d2.baseArea * 1e6).toBeCloseTo(3.004421, 6);
		expect(Number(d2.mass)).toBeCloseTo(892_751.8, 1);
		expect(Number(d2.counterweight)).toBeCloseTo(654_513.9, 1);
	});

	// Common practice: the synchronous radii of Earth and Mars; the rise for Earth is a consistency figure.
	it('knows the synchronous radii and the rise to them', () => {
		expect(earth.balance / 1e3).toBeCloseTo(42_164.17, 2);
		expect(ofBody(BODIES.mars, false).balance / 1e3).toBeCloseTo(20_428, 0);
		expect(earth.rise(earth.base, earth.balance) / 1e7).toBeCloseTo(4.842267, 6);
		expect(earth.rise(earth.base, earth.balance) / 3.6e6).toBeCloseTo(13.45, 2);
	});

	// Consistency figures for Earth; the peak for steel is told by Aravind (2007), from memory.
	it('lets a uniform line stand free to 143 781 km and a steel one bear 382.5 GPa', () => {
		expect(freeStandingRadius(earth) / 1e3).toBeCloseTo(150_159, 0);
		expect((freeStandingRadius(earth) - earth.base) / 1e3).toBeCloseTo(143_781, 0);
		expect(uniformPeakStress(earth, 7900) / 1e9).toBeCloseTo(382.5, 1);
	});

	// Common practice: 1 N/tex is a breaking length of about 102 km.
	it('breaks at 102 km for one newton per tex', () => {
		expect(breakingLength(1e6 * 1300, 1300) / 1e3).toBeCloseTo(101.97, 2);
	});

	it('puts the L1 of the Moon where the circular three-body problem has it', () => {
		expect(relative(BODIES.moon.l1!.value, moon.distance)).toBeLessThan(1e-4);
	});
});
