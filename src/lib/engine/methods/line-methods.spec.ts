/** What the methods of the line say at the door: refusals, warnings, figures beyond any build. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asBuilt } from './as-built';
import { climberEnvelope } from './climber-envelope';
import { field } from './field';
import { answer, type AnyMethod } from './method';
import { steppedLine } from './stepped-line';
import { taper } from './taper';
import { uniformLine } from './uniform-line';

const EARTH = { kind: 'body', body: 'earth' };
const R = 6_378_137;

const refusal = (method: AnyMethod, input: unknown) => {
	const found = answer(method, input);
	if (found.ok) throw new Error('Nothing was refused.');
	return found.refusal;
};

/* eslint-disable-next-line @typescript-eslint/no-explicit-any -- of several methods */
const outputs = (method: AnyMethod, input: unknown): any => {
	const found = answer(method, input);
	if (!found.ok) throw new Error(found.refusal.message);
	return { ...found.outputs, warnings: found.warnings };
};

const sizing = {
	site: EARTH,
	density: 1300,
	allowable: 100e9,
	factorOfSafety: 2,
	base: { kind: 'lift', lift: 20e3 },
	top: R + 1e8
};

const line = {
	site: EARTH,
	density: 1300,
	section: { kind: 'taper', baseArea: 3.905748e-6, designStress: 50e9, top: R + 1e8 },
	masses: [],
	counterweight: 777_828,
	allowable: 100e9,
	factorOfSafety: 2
};

describe('the taper', () => {
	it('says what it does not cover, where the factor of safety is from, and where to look instead', () => {
		const { warnings } = outputs(taper, { ...sizing, standard: 'ecss' });
		expect(warnings.join(' ')).toMatch(/as-built analysis/);
		expect(warnings.join(' ')).toContain('ECSS-E-ST-32-10');
	});

	it.each([
		[42_164_172.97, 'top'],
		[42_164_172.94, 'top'],
		[R, 'top']
	])('refuses a top at the radius %d m', (top, path) => {
		expect(refusal(taper, { ...sizing, top })).toMatchObject({ code: 'input', faults: [{ path }] });
	});

	it('takes a top a hair further up', () => {
		expect(outputs(taper, { ...sizing, top: 42_164_173.1 }).counterweight).toBeGreaterThan(1e14);
	});

	it('tells figures beyond any build by their decimal logarithm', () => {
		const steel = outputs(taper, { ...sizing, density: 7900, allowable: 1e9 });
		expect(steel.taper.log10).toBeGreaterThan(300);
		expect(steel.trade[0].line.log10).toBeGreaterThan(300);
		expect(steel.warnings[0]).toMatch(/^Beyond any build: .* 10 to the power 3\d\d/);
	});

	it('stands on both sides of a moon, and ends before the primary', () => {
		for (const side of ['near', 'far']) {
			const site = { kind: 'moon', side };
			expect(outputs(taper, { ...sizing, site, top: 2e8 }).taper).toBeLessThan(1.2);
		}
		const far = { ...sizing, site: { kind: 'moon' }, top: 384_400e3 };
		expect(refusal(taper, far).message).toContain('centre of the primary');
	});

	it('warns of a moon taken as one body', () => {
		const moon = { ...sizing, site: { kind: 'body', body: 'moon' }, top: 2e8 };
		expect(outputs(taper, moon).warnings.join(' ')).toContain('beyond its L1');
	});

	it('has a trade curve that falls to the total itself', () => {
		const { trade, total } = outputs(taper, { ...sizing, rangePoints: 30 });
		const totals = trade.map((point: { total: number }) => point.total);
		expect([...totals].sort((a, b) => b - a)).toEqual(totals);
		expect(totals.at(-1) / total).toBeCloseTo(1, 12);
	});

	it('refuses a trade curve upside down', () => {
		const { faults } = refusal(taper, { ...sizing, rangeFrom: 9e7, rangeTop: 8e7 });
		expect(faults).toMatchObject([{ path: 'rangeFrom' }]);
	});
});

describe('the stepped line', () => {
	it('names the section that cannot carry itself and the length it must stay under', () => {
		const { message } = refusal(steppedLine, {
			...sizing,
			sections: { kind: 'heights', count: 9 }
		});
		expect(message).toMatch(
			/^Section 1, .* cannot carry itself: there it must stay under 10\u202f679.52 km/
		);
	});

	it('refuses boundaries that do not ascend, each by its place', () => {
		const at = (...boundaries: number[]) =>
			refusal(steppedLine, { ...sizing, sections: { kind: 'radii', boundaries } }).faults[0]!.path;
		expect(at(1e7, 1e7)).toBe('sections.boundaries.1');
		expect(at(R)).toBe('sections.boundaries.0');
		expect(at(2e7, R + 1e8)).toBe('top');
	});

	it('counts joints in its penalty', () => {
		const sections = { kind: 'rises', count: 40 };
		const plain = outputs(steppedLine, { ...sizing, sections });
		const joined = outputs(steppedLine, { ...sizing, sections, jointMass: 30 });
		expect(plain.linePenalty).toBeGreaterThan(0);
		expect(joined.linePenalty).toBeGreaterThan(plain.linePenalty);
		expect(joined.jointMass).toBeCloseTo(39 * 30, 9);
	});

	it('can be looked at as built: the same tensions and its design stress', () => {
		const made = outputs(steppedLine, { ...sizing, sections: { kind: 'rises', count: 30 } });
		const sections = made.sections.map(({ to, area }: { to: number; area: number }) => ({
			to,
			area
		}));
		const { counterweight } = made;
		const section = { kind: 'stepped', sections };
		const seen = outputs(asBuilt, { ...line, section, counterweight, points: 2 });
		expect(seen.leastMargin).toBeCloseTo(0, 10);
		expect(seen.anchorTension / made.sections[0].lowerTension).toBeCloseTo(1, 10);
		expect(seen.greatestTension / made.greatestTension).toBeCloseTo(1, 10);
	});
});

describe('the line as built', () => {
	it('tells the anchor tension against the reserve', () => {
		const lift = { mass: 20e3, reserve: 1.5 };
		const found = outputs(asBuilt, { ...line, lift });
		expect(found.reserveHeld).toBeCloseTo(1, 5);
		expect(found.warnings.join(' ')).toContain('below the required reserve');
	});

	it('warns of slack and of a stress above the allowed', () => {
		const loose = outputs(asBuilt, { ...line, counterweight: 0 });
		expect(loose.slack).toHaveLength(1);
		expect(loose.warnings[0]).toMatch(/^Slack from the radius/);
		const heavy = outputs(asBuilt, { ...line, counterweight: 1e6 });
		expect(heavy.leastMargin).toBeLessThan(0);
		expect(heavy.warnings.join(' ')).toContain('above the allowed');
	});

	it('says when the anchor tension is no more than the rounding of larger figures', () => {
		const steep = outputs(taper, { ...sizing, allowable: 4e9 });
		const { baseArea, counterweight } = steep;
		const section = { ...line.section, baseArea, designStress: 2e9 };
		const { warnings, slack } = outputs(asBuilt, { ...line, section, counterweight });
		expect(warnings.join(' ')).toContain('last digits');
		expect(slack).toEqual([]);
	});

	it.each([
		[{ masses: [{ radius: 1e6, mass: 1 }] }, 'masses.0.radius'],
		[
			{ section: { kind: 'table', rows: [1, 2].map(() => ({ radius: R, area: 1e-6 })) } },
			'section.rows.1.radius'
		],
		[{ section: { kind: 'table', rows: [{ radius: R, area: 1e-6 }] } }, 'section.rows'],
		[{ section: { kind: 'stepped', sections: [{ to: R, area: 1e-6 }] } }, 'section.sections.0.to'],
		[{ section: { ...line.section, top: R } }, 'section.top']
	])('refuses what is no line: %j', (change, path) => {
		expect(refusal(asBuilt, { ...line, ...change }).faults).toMatchObject([{ path }]);
	});

	it('refuses a taper that no number can tell', () => {
		const section = { ...line.section, designStress: 1e7 };
		expect(refusal(asBuilt, { ...line, section }).code).toBe('beyond-any-build');
	});
});

describe('the climber envelope', () => {
	it('finds the worst position and the least anchor tension of a grid', () => {
		const climbers = { kind: 'grid', mass: 12e3, count: 101 };
		const found = outputs(climberEnvelope, { ...line, climbers });
		expect(found.moments).toHaveLength(101);
		// Lowest when it has just left the anchor, where it weighs most.
		expect(found.leastAnchorTensionMoment).toBe(1);
		// Above the balance radius it pulls outwards and adds to the stress below.
		expect(found.moments[found.leastMarginMoment - 1].climberRadius).toBeGreaterThan(42e6);
		expect(found.slackMoments).toBe(0);
	});

	it('counts the moments with slack', () => {
		const moments = [{ climbers: [] }, { climbers: [{ radius: R, mass: 1e6 }] }];
		const found = outputs(climberEnvelope, { ...line, climbers: { kind: 'schedule', moments } });
		expect(found.slackMoments).toBe(1);
		expect(found.leastAnchorTensionMoment).toBe(2);
	});

	it('refuses climbers off the line', () => {
		const moments = [{ climbers: [{ radius: 1, mass: 1 }] }];
		const schedule = { ...line, climbers: { kind: 'schedule', moments } };
		expect(refusal(climberEnvelope, schedule).faults).toMatchObject([
			{ path: 'climbers.moments.0.climbers.0.radius' }
		]);
	});
});

describe('the uniform line', () => {
	// Consistency figures computed with SciPy: H at 150 159 km, 382.5 GPa for steel (Aravind 2007, from memory).
	it('stands free to 150 159 km and bears 382.5 GPa in steel', () => {
		const found = outputs(uniformLine, { site: EARTH, density: 7900, stress: 5e9 });
		expect(found.freeRadius / 1e3).toBeCloseTo(150_159, 0);
		expect(found.peakStress / 1e9).toBeCloseTo(382.5, 1);
	});

	it('has its peak and its ends in the profile, with tension at the anchor as well', () => {
		const found = outputs(uniformLine, {
			site: EARTH,
			density: 1300,
			stress: 5e9,
			baseStress: 2e9
		});
		const stresses = found.profile.map((point: { stress: number }) => point.stress);
		expect(stresses[0]).toBe(2e9);
		expect(Math.max(...stresses) / found.peakStress).toBeCloseTo(1, 12);
		expect(Math.abs(stresses.at(-1))).toBeLessThan(1e-5 * 2e9);
	});
});

describe('the field', () => {
	it('tells the balance of Earth, and nothing beyond a primary', () => {
		const found = outputs(field, { site: EARTH, radii: [R] });
		// Consistency figures computed with SciPy/mpmath.
		expect(found.balanceRadius / 1e3).toBeCloseTo(42_164.17, 2);
		expect(found.climb / 1e7).toBeCloseTo(4.842267, 6);
		expect(refusal(field, { site: { kind: 'moon' }, radii: [4e8] }).faults).toMatchObject([
			{ path: 'radii.0' }
		]);
	});

	it('knows no balance inside a body', () => {
		const fast = { kind: 'own', gm: 4e14, radius: 6.4e6, period: 3600 };
		expect(refusal(field, { site: fast, radii: [] }).message).toContain('inside the body');
	});
});

describe('whatever comes in', () => {
	const figure = fc.oneof(
		fc.constantFrom(R, 42_164_173, 1e8, 3.8e8, 1300, 1e-6, 5e10, 1e-12),
		fc.double({ min: 1e-300, max: 1e300, noNaN: true }),
		fc.double({ min: -30, max: 30, noNaN: true }).map((power) => 10 ** power)
	);
	const place = fc.oneof(
		fc.constant(EARTH),
		fc.record({ kind: fc.constant('moon'), side: fc.constantFrom('near', 'far') }),
		fc.record({ kind: fc.constant('own'), gm: figure, radius: figure, rate: figure })
	);
	const ascending = fc
		.array(figure, { minLength: 2, maxLength: 5 })
		.map((radii) => radii.sort((a, b) => a - b));
	const given = fc.record({
		site: place,
		density: figure,
		allowable: figure,
		factorOfSafety: fc.constantFrom(1, 2.5)
	});
	const anySizing = fc
		.record({ lift: figure, top: figure })
		.chain(({ lift, top }) =>
			given.map((more) => ({ ...more, base: { kind: 'lift', lift }, top, rangePoints: 3 }))
		);
	const anyLine = fc.record({ given, ascending, figure, mass: figure }).map((drawn) => ({
		...drawn.given,
		section: {
			kind: 'table',
			rows: drawn.ascending.map((radius, i) => ({ radius, area: drawn.figure ** (1 / (i + 1)) }))
		},
		masses: [{ radius: drawn.ascending[1], mass: drawn.mass }],
		counterweight: drawn.mass,
		elasticity: { modulus: drawn.figure },
		points: 5
	}));

	it.each([
		['taper', taper, anySizing],
		['as-built', asBuilt, anyLine]
	] as const)('%s answers in numbers or refuses in words', (_, method, input) => {
		fc.assert(
			fc.property(input as fc.Arbitrary<unknown>, (input) => {
				const found = answer(method as AnyMethod, input);
				if (!found.ok) expect(found.refusal.message).toMatch(/\w.*\./);
				else expect(JSON.stringify(found.outputs)).not.toContain('null');
			}),
			{ numRuns: 400 }
		);
	});
});
