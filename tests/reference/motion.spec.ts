/**
 * Periods and transits against NumPy and SciPy (make_motion.py: collocation and QZ, settled by shooting with
 * DOP853 at 1e-12). Tolerance 1e-6 for periods, 1e-8 for integrals; the periods are held to 1e-7 here.
 */
import { describe, expect, it } from 'vitest';
import { answer } from '$lib/engine/methods/method';
import { periods } from '$lib/engine/methods/periods';
import { transit } from '$lib/engine/methods/transit';
import periodCases from './data/periods.json';
import transitCases from './data/transits.json';

const relative = (got: number, expected: number) => Math.abs(got / expected - 1);

describe('natural periods against shooting with SciPy', () => {
	it('covers lines on bodies with and without J2, from a moon on both sides, tapered and uniform', () => {
		expect(periodCases).toHaveLength(26);
		expect(new Set(periodCases.map(({ input }) => input.section.kind)).size).toBe(2);
		expect(periodCases.filter(({ input }) => input.site.kind === 'moon')).toHaveLength(4);
	});

	it.each(periodCases.map((line, i) => [i + 1, line] as const))('line %i', (_, line) => {
		const found = answer(periods, line.input);
		if (!found.ok) throw new Error(found.refusal.message);
		for (const kind of ['inPlane', 'outOfPlane', 'along', 'coupled'] as const)
			line.expected[kind].forEach((lambda, i) => {
				const period = (2 * Math.PI) / Math.sqrt(lambda);
				expect(relative(found.outputs[kind][i]!.period!, period), `${kind} ${i + 1}`).toBeLessThan(
					1e-7
				);
			});
	});

	it('agrees with the published consistency figures of lines D1 and D2', () => {
		// Hours, computed outside with SciPy.
		const wanted = [
			{
				designStress: 50e9,
				baseArea: 3.905748e-6,
				counterweight: 777_827.9,
				inPlane: 131.211,
				coupled: 148.17
			},
			{
				designStress: 65e9,
				baseArea: 3.004421e-6,
				counterweight: 654_513.9,
				inPlane: 121.586,
				coupled: 140.77
			}
		];
		for (const { designStress, baseArea, counterweight, inPlane, coupled } of wanted) {
			const found = answer(periods, {
				site: { kind: 'body', body: 'earth' },
				density: 1300,
				section: { kind: 'taper', baseArea, designStress, top: 6_378_137 + 1e8 },
				masses: [],
				counterweight,
				modulus: 1e12
			});
			if (!found.ok) throw new Error(found.refusal.message);
			expect(found.outputs.inPlane[0]!.period! / 3600).toBeCloseTo(inPlane, 2);
			expect(found.outputs.coupled[0]!.period! / 3600).toBeCloseTo(coupled, 2);
		}
	});
});

describe('transits against SciPy', () => {
	it('covers 40 ways on three bodies', () => expect(transitCases).toHaveLength(40));

	it.each(transitCases.map((way, i) => [i + 1, way] as const))(
		'way %i',
		(_, { input, expected }) => {
			const found = answer(transit, input);
			if (!found.ok) throw new Error(found.refusal.message);
			for (const [key, value] of Object.entries(expected)) {
				const got = found.outputs[key as keyof typeof expected];
				if (value === 0) expect(got, key).toBe(0);
				else expect(relative(got, value), key).toBeLessThan(1e-8);
			}
		}
	);
});
