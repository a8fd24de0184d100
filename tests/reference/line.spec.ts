/**
 * The statics of lines through the methods' own door, against mpmath at 40 digits (make_line.py): random places, materials and
 * lines over the whole range, and extremes. Tolerances: 1e-9 for closed forms, 1e-8 for integrals.
 */
import { describe, expect, it } from 'vitest';
import { METHODS } from '$lib/engine/methods/catalogue';
import { answer } from '$lib/engine/methods/method';
import type { Told } from '$lib/engine/methods/parameter';
import cases from './data/line.json';

const CLOSED = 1e-9;
const INTEGRAL = 1e-8;

/* eslint-disable-next-line @typescript-eslint/no-explicit-any -- outputs are compared by the names in the data */
function run(method: string, input: unknown): any {
	const found = answer(METHODS.get(method)!, input);
	if (!found.ok) throw new Error(`${found.refusal.message} ${JSON.stringify(input)}`);
	return found.outputs;
}

/** Relative error; of the logarithm where the figure is told by it. A figure below 1e-290 counts as nothing. */
function off(got: Told, expected: Told): number {
	if (typeof expected === 'number')
		return Math.abs(expected) < 1e-290 ? Number(got) : Math.abs(Number(got) / expected - 1);
	return typeof got === 'number' ? Infinity : Math.abs(got.log10 / expected.log10 - 1);
}

function check(
	got: Record<string, Told>,
	expected: Record<string, Told>,
	limit: (name: string) => number
) {
	for (const [name, value] of Object.entries(expected)) {
		if (value === 0) expect(got[name], name).toBe(0);
		else expect(off(got[name]!, value), name).toBeLessThan(limit(name));
	}
}

describe('the field', () => {
	it('agrees at 60 places, also a hair from the balance radius', () => {
		expect(cases.field).toHaveLength(60);
		for (const { input, expected } of cases.field) {
			const { points, balanceRadius, climb } = run('field', input);
			check(
				{ balanceRadius, climb },
				{ balanceRadius: expected.balanceRadius, climb: expected.climb },
				() => CLOSED
			);
			expected.points.forEach((point, i) => check(points[i], point, () => CLOSED));
		}
	});
});

describe('the uniform line', () => {
	it('agrees at 50 places, with and without tension at the anchor', () => {
		expect(cases.uniform).toHaveLength(50);
		for (const { input, expected } of cases.uniform)
			check(run('uniform-line', input), expected, () => CLOSED);
	});
});

describe('the taper', () => {
	const integrals = ['massBelow', 'massAbove', 'lineMass', 'total', 'totalPerLift', 'topWithin'];

	it('agrees for 60 random designs and 8 extremes', () => {
		expect(cases.taper).toHaveLength(68);
		for (const { input, expected } of cases.taper)
			check(run('taper', input), expected as unknown as Record<string, Told>, (name) =>
				integrals.includes(name) ? INTEGRAL : CLOSED
			);
	});
});

describe('the stepped line', () => {
	it('agrees for 68 random ones, joints and penalties included', () => {
		expect(cases.stepped).toHaveLength(68);
		for (const { input, expected } of cases.stepped) {
			const { sections, linePenalty, totalPenalty, ...figures } = expected;
			const found = run('stepped-line', input);
			check(found, figures as unknown as Record<string, Told>, () => INTEGRAL);
			check(
				{ linePenalty: plus1(found.linePenalty), totalPenalty: plus1(found.totalPenalty) },
				{ linePenalty: plus1(linePenalty as Told), totalPenalty: plus1(totalPenalty as Told) },
				() => INTEGRAL
			);
			expect(found.sections).toHaveLength(sections.length);
			sections.forEach((section, i) =>
				check(found.sections[i], section as unknown as Record<string, Told>, () => CLOSED)
			);
		}
	});

	/** The penalty is the difference of two integrals: the ratio is what their accuracy bounds. */
	const plus1 = (penalty: Told) => (typeof penalty === 'number' ? penalty + 1 : penalty);
});

describe('the line as built', () => {
	it('agrees for 40 random ones: tapers, sections and tables with masses on them', () => {
		expect(cases.asBuilt).toHaveLength(40);
		for (const { input, expected } of cases.asBuilt) {
			const { anchorTension, slack, leastMargin, stretch, ...figures } = expected;
			const found = run('as-built', input);
			check(found, figures, () => INTEGRAL);
			// The anchor's tension is what is left of larger ones.
			expect(Math.abs(found.anchorTension - anchorTension)).toBeLessThan(
				1e-11 * Math.max(Math.abs(anchorTension), expected.greatestTension)
			);
			expect(Math.abs(found.stretch - stretch)).toBeLessThan(
				INTEGRAL * (Math.abs(stretch) + 1e-3 * expected.manufacturedLength)
			);
			if (leastMargin === undefined) expect(found.leastMargin).toBeUndefined();
			else
				expect(Math.abs(found.leastMargin - leastMargin)).toBeLessThan(
					CLOSED * Math.max(1, leastMargin)
				);
			expect(found.slack).toHaveLength(slack.length);
			slack.forEach((interval, i) => check(found.slack[i], interval, () => INTEGRAL));
		}
	});
});

describe('case D1 with three climbers', () => {
	it('holds the tension at the anchor that SciPy’s DOP853 steps down to', () => {
		expect(cases.d1).toHaveLength(1);
		const { baseArea, counterweight, climbers, anchorTension } = cases.d1[0]!;
		const found = run('as-built', {
			site: { kind: 'body', body: 'earth' },
			density: 1300,
			section: { kind: 'taper', baseArea, designStress: 50e9, top: 6_378_137 + 1e8 },
			masses: climbers,
			counterweight,
			allowable: 50e9,
			factorOfSafety: 1,
			points: 2000
		});
		expect(off(found.anchorTension, anchorTension)).toBeLessThan(INTEGRAL);
	});
});

describe('the climber envelope', () => {
	it('agrees for 20 lines at five moments each', () => {
		expect(cases.envelope).toHaveLength(20);
		for (const { input, expected } of cases.envelope) {
			const { moments } = run('climber-envelope', input);
			expect(moments).toHaveLength(5);
			expected.forEach(({ greatestStress, anchorTension, leastTension, greatestTension }, i) => {
				const moment = moments[i];
				const margin = input.allowable / greatestStress - 1;
				if (greatestStress > 0)
					expect(Math.abs(moment.margin - margin)).toBeLessThan(CLOSED * Math.max(1, margin));
				else expect(moment.margin).toBeUndefined();
				const scale = 1e-11 * Math.max(Math.abs(leastTension), greatestTension);
				expect(Math.abs(moment.anchorTension - anchorTension)).toBeLessThan(scale);
				expect(Math.abs(moment.leastTension - leastTension)).toBeLessThan(scale);
			});
		}
	});
});
