import { describe, expect, it } from 'vitest';
import { answer } from './method';
import { release } from './release';
import { severedLine } from './severed-line';

const earth = { kind: 'body', body: 'earth' };
const EARTH_RADIUS = 6_378_137;

describe.each([release, severedLine])('$title', (method) => {
	const refusal = (input: object) => {
		const found = answer(method, { site: earth, radii: [1e8], ...input });
		return found.ok ? undefined : found.refusal;
	};

	it('refuses a radius inside the body, by its place in the list', () => {
		expect(refusal({ radii: [1e8, EARTH_RADIUS - 1] })).toMatchObject({
			code: 'input',
			message: 'Radius 2 lies inside the body.',
			faults: [{ path: 'radii.1' }]
		});
		expect(refusal({ radii: [EARTH_RADIUS] })).toBeUndefined();
	});

	it('refuses an interface that does not lie below the balance radius', () => {
		expect(refusal({ interfaceHeight: 36e6 })?.message).toContain('balance radius');
	});

	it('refuses a line between a moon and its primary, and one that nothing holds up', () => {
		expect(refusal({ site: { kind: 'moon' } })?.message).toContain('pulled by both');
		const spun = { kind: 'own', gm: 4e14, radius: 6.4e6, period: 3600 };
		expect(refusal({ site: spun })?.message).toContain('inside the body');
	});

	it('says that J2 does not count, and leaves the figures as they are', () => {
		const plain = answer(method, { site: earth, radii: [2e7, 1e8] });
		const oblate = answer(method, { site: { ...earth, j2: true }, radii: [2e7, 1e8] });
		expect(oblate).toMatchObject({ ok: true, warnings: [expect.stringContaining('J2')] });
		if (plain.ok && oblate.ok) expect(oblate.outputs).toEqual(plain.outputs);
	});

	it('warns where the Moon taken alone says nothing', () => {
		const found = answer(method, { site: { kind: 'body', body: 'moon' }, radii: [2e6] });
		expect(found).toMatchObject({ ok: true, warnings: [expect.stringContaining('L1')] });
	});
});

describe('the severed line', () => {
	const elements = (radii: number[]) => {
		const found = answer(severedLine, { site: earth, radii, interfaceHeight: 120e3 });
		if (!found.ok) throw new Error(found.refusal.message);
		return found.outputs.elements;
	};

	it('tells an entry only of what comes down from above the interface', () => {
		const found = elements([EARTH_RADIUS, EARTH_RADIUS + 120e3, 2e7, 4e7, 1e8]);
		expect(found.map(({ fate }) => fate)).toEqual([
			'belowInterface',
			'comesDown',
			'comesDown',
			'staysBound',
			'escapes'
		]);
		expect(found.map(({ entry }) => entry !== undefined)).toEqual([
			false,
			true,
			true,
			false,
			false
		]);
	});

	it('keeps its caution: a connected line does otherwise, this is a screening, others govern', () => {
		expect(severedLine.caution).toMatch(/wraps and whips/);
		expect(severedLine.caution).toMatch(/screening/);
		expect(severedLine.caution).toMatch(/range safety rules and licensed practice govern/);
	});
});
