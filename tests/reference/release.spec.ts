/**
 * Release, reach, calendar, severed line, cut rate and spinning tether against mpmath at 60 digits and SciPy
 * (make_release.py), which share nothing with the engine. Tolerance 1e-9 for closed forms; 1e-8 against SciPy's steps.
 */
import { describe, expect, it } from 'vitest';
import { answer, type AnyMethod } from '$lib/engine/methods/method';
import { cutRate } from '$lib/engine/methods/cut-rate';
import { reach } from '$lib/engine/methods/reach';
import { release } from '$lib/engine/methods/release';
import { releaseCalendar } from '$lib/engine/methods/release-calendar';
import { severedLine } from '$lib/engine/methods/severed-line';
import { spinningAsBuilt } from '$lib/engine/methods/spinning-as-built';
import { spinningTether } from '$lib/engine/methods/spinning-tether';
import { taperShape } from '$lib/engine/line/taper';
import { spinField } from '$lib/engine/release/spin-field';
import data from './data/release.json';

const CLOSED = 1e-9;

function outputsOf<M extends AnyMethod>(method: M, input: unknown) {
	const found = answer(method, input);
	if (!found.ok) throw new Error(`${found.refusal.message} ${JSON.stringify(input)}`);
	return found.outputs as ReturnType<M['run']>['outputs'];
}

/** Every figure that the reference has, to the tolerance; one that it has not must be missing. */
function agrees(got: unknown, expected: unknown, where: string, tolerance = CLOSED): void {
	if (expected === null) expect(got, where).toBeUndefined();
	else if (typeof expected === 'number') {
		const error = Math.abs(Number(got) - expected) / Math.abs(expected);
		if (!(expected === 0 ? got === 0 : error <= tolerance))
			expect.fail(`${where}: ${got} instead of ${expected}, relative error ${error}`);
	} else if (typeof expected === 'object')
		for (const [key, part] of Object.entries(expected as object))
			agrees((got as Record<string, unknown>)?.[key], part, `${where}.${key}`, tolerance);
	else expect(got, where).toBe(expected);
}

describe('release', () => {
	it('agrees on 20 bodies at 640 radii, also a hair from where the fate changes', () => {
		expect(data.releases).toHaveLength(20);
		expect(data.releases.flatMap(({ releases }) => releases)).toHaveLength(640);
		for (const { site, interfaceHeight, ...expected } of data.releases) {
			const radii = expected.releases.map(({ radius }) => radius);
			const got = outputsOf(release, { site, radii, interfaceHeight });
			agrees(got, expected, JSON.stringify(site));
		}
	});
});

describe('a severed line', () => {
	it('agrees for 380 elements, also just above the interface and where the periapsis grazes it', () => {
		expect(data.severed.flatMap(({ elements }) => elements)).toHaveLength(380);
		for (const { site, interfaceHeight, elements } of data.severed) {
			const radii = elements.map(({ radius }) => radius);
			const got = outputsOf(severedLine, { site, radii, interfaceHeight });
			agrees(got, { elements }, JSON.stringify(site));
			for (const { fate } of got.elements) expect(fate).toBe('comesDown');
		}
	});

	it('falls as the equations of motion say, integrated by SciPy’s DOP853', () => {
		expect(data.integratedFalls).toHaveLength(7);
		for (const { site, radius, interfaceHeight, entry } of data.integratedFalls) {
			const got = outputsOf(severedLine, { site, radii: [radius], interfaceHeight });
			agrees(got.elements[0]!.entry, entry, `${site.body} from ${radius}`, 1e-8);
		}
	});
});

describe('reach about the Sun', () => {
	it('agrees for 184 targets and 552 paths from 23 bodies, near a fall into the Sun and an escape from it', () => {
		expect(data.reaches).toHaveLength(23);
		expect(data.reaches.flatMap(({ targets }) => targets)).toHaveLength(184);
		expect(data.reaches.flatMap(({ paths }) => paths)).toHaveLength(552);
		for (const { site, sunDistance, ...expected } of data.reaches) {
			const radii = expected.paths.map(({ radius }) => radius);
			const targets = expected.targets.map(({ distance }, i) => ({ name: `${i}`, distance }));
			const got = outputsOf(reach, { site, sunDistance, radii, targets });
			agrees(got, expected, JSON.stringify(site));
		}
	});
});

describe('the release calendar', () => {
	it('agrees on 320 days with vectors in three dimensions', () => {
		const calendars: { days: { sunLongitude: number }[] }[] = data.calendars;
		expect(calendars.flatMap(({ days }) => days)).toHaveLength(320);
		for (const { days, ...place } of calendars) {
			const longitudes = days.map(({ sunLongitude }) => sunLongitude);
			const got = outputsOf(releaseCalendar, {
				...place,
				when: { kind: 'longitudes', longitudes }
			});
			agrees(got, { days }, JSON.stringify(place));
		}
	});
});

describe('the cut rate', () => {
	it('agrees for 40 tables of bands', () => {
		expect(data.cutRates).toHaveLength(40);
		for (const { bands, time, ...expected } of data.cutRates)
			agrees(outputsOf(cutRate, { bands, time }), expected, JSON.stringify(bands));
	});
});

describe('a spinning tether', () => {
	it('agrees for 60 arms, from V/V_c of 1e-4 to 4000', () => {
		expect(data.spinning).toHaveLength(60);
		for (const { expected, ...arm } of data.spinning)
			agrees(outputsOf(spinningTether, arm), expected, JSON.stringify(arm));
	});

	it('agrees for 24 arms as built', () => {
		expect(data.spinningAsBuilt).toHaveLength(24);
		for (const { expected, ...arm } of data.spinningAsBuilt) {
			const strength = { allowable: 1e9, factorOfSafety: 2 };
			agrees(outputsOf(spinningAsBuilt, { ...arm, ...strength }), expected, JSON.stringify(arm));
		}
	});
});

const earth = { kind: 'body', body: 'earth' };
const EARTH_RADIUS = 6_378_137;

describe('figures of the trade for the Earth', () => {
	// Consistency figure computed with SciPy/mpmath.
	it('escapes from 46 745 km up', () => {
		const { escapeHeight } = outputsOf(release, { site: earth, radii: [1e8] });
		expect(escapeHeight / 1e3).toBeCloseTo(46_745, 0);
	});

	// Consistency figure computed with SciPy/mpmath; common practice: about 23 400 km.
	it('grazes the surface when let go 23 412 km up', () => {
		const { grazingHeight } = outputsOf(release, { site: earth, radii: [1e8] });
		expect(grazingHeight / 1e3).toBeCloseTo(23_412, 0);
	});

	// Consistency figures computed with SciPy/mpmath; common practice for Jupiter: about 119 000 km.
	it('gets to Jupiter’s distance from 119 070 km up, and from r = 100 000 km inwards to 0.428 au', () => {
		const au = 149_597_870_700;
		const targets = [{ name: 'Jupiter', distance: 5.2044 * au }];
		const found = outputsOf(reach, { site: earth, radii: [1e8], targets });
		expect(found.targets[0]!.height / 1e4).toBeCloseTo(11_907, 0);
		expect(found.paths[0]!.inward!.nearPoint / au).toBeCloseTo(0.428, 3);
	});

	it('comes down, stays bound and escapes on the two sides of the thresholds', () => {
		const heights = [23_411e3, 23_413e3, 46_744e3, 46_747e3];
		const radii = heights.map((height) => EARTH_RADIUS + height);
		const { releases } = outputsOf(release, { site: earth, radii });
		expect(releases.map(({ fate }) => fate)).toEqual([
			'comesDown',
			'staysBound',
			'staysBound',
			'escapes'
		]);
	});
});

describe('the year of a release', () => {
	const year = outputsOf(releaseCalendar, {
		site: earth,
		radius: 1.2e8,
		when: { kind: 'days', from: '2027-01-01', count: 365 }
	}).days;

	it('has the body’s motion in the equator’s plane at the solstices, and furthest off at the equinoxes', () => {
		// sin δ = sin ε |cos L|: from the tilt alone, mean obliquity at J2000 84 381.406″ (IAU 2006).
		const tilt = 84_381.406 / 3600;
		const degrees = year.map(({ declination }) => (declination * 180) / Math.PI);
		const least = degrees.indexOf(Math.min(...degrees));
		const most = degrees.indexOf(Math.max(...degrees));
		expect(['2027-06-21', '2027-06-22', '2027-12-22']).toContain(year[least]!.date);
		expect(['2027-03-20', '2027-03-21', '2027-09-23']).toContain(year[most]!.date);
		expect(degrees[most]).toBeCloseTo(tilt, 2);
		expect(degrees[least]).toBeLessThan(0.5);
	});

	it('reaches no further than in the plane, and as far at the solstices', () => {
		const flat = outputsOf(reach, { site: earth, radii: [1.2e8], targets: [] }).paths[0]!.outward!;
		const furthest = year.map(({ outward }) => outward.farPoint! / flat.farPoint!);
		for (const share of furthest) expect(share).toBeLessThanOrEqual(1);
		expect(Math.max(...furthest)).toBeGreaterThan(0.9999);
	});
});

describe('a spinning tether by other ways', () => {
	const arm = { density: 1440, designStress: 1.8e9, tipSpeed: 2400, length: 85e3, tipMass: 1500 };

	// H. Moravec (1977), from memory: at V = V_c the hub is e times the tip, and √π e erf 1 = 4.0602 (erf 1 = 0.8427008, Abramowitz and Stegun table 7.1).
	it('has the published ratios at the characteristic speed', () => {
		const unit = { density: 1000, designStress: 2e9, tipSpeed: 2000, length: 1e5, tipMass: 1 };
		const found = outputsOf(spinningTether, unit);
		expect(found.characteristicSpeed).toBe(2000);
		agrees(found.areaRatio, Math.E, 'area');
		agrees(found.massRatio, Math.sqrt(Math.PI) * Math.E * 0.8427007929497149, 'mass');
	});

	it('weighs what the constant-stress taper weighs in the field −Ω²r', () => {
		const { designStress, density, length } = arm;
		const closed = outputsOf(spinningTether, arm);
		const line = taperShape(spinField(arm.tipSpeed / length), density, designStress);
		const hub = Number(closed.hubArea);
		// That taper's quadrature needs radii above 0; the first millionth of the arm is all but uniform.
		const core = 1e-6 * length;
		const rest = hub * Math.exp(line.lnMass(core, length));
		agrees(density * hub * core + rest, closed.armMass, 'arm', 1e-8);
		agrees(hub * Math.exp(line.lnCounterweight(length)), arm.tipMass, 'tip');
	});

	it('bears the design stress everywhere once it is built along the taper, more nearly the finer the rows', () => {
		const { density, designStress, tipSpeed, tipMass } = arm;
		const off = [10, 100, 1000].map((count) => {
			const { profile, hubTension } = outputsOf(spinningTether, { ...arm, points: count + 1 });
			const built = outputsOf(spinningAsBuilt, {
				density,
				tipSpeed,
				tipMass,
				rows: profile.map(({ radius, area }) => ({ radius, area })),
				allowable: designStress,
				factorOfSafety: 1
			});
			return [built.leastMargin, built.hubTension / Number(hubTension) - 1].map(Math.abs);
		});
		// Straight stretches along a curve: the error falls with the square of their length.
		for (const k of [0, 1]) {
			expect(off[1]![k]! / off[0]![k]!).toBeLessThan(0.02);
			expect(off[2]![k]! / off[1]![k]!).toBeLessThan(0.02);
		}
	});
});
