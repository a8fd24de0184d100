import { describe, expect, it } from 'vitest';
import { answer } from './method';
import { reach } from './reach';

const AU = 149_597_870_700;
const at = (input: object) => answer(reach, input);
const earth = { kind: 'body', body: 'earth' };

function outputs(input: object) {
	const found = at(input);
	if (!found.ok) throw new Error(found.refusal.message);
	return found;
}

describe('reach', () => {
	it('takes the planets but the one the line stands on, inwards and outwards of it', () => {
		const names = (body: string) =>
			outputs({ site: { kind: 'body', body } }).outputs.targets.map(
				({ name, direction }) => `${name} ${direction}`
			);
		expect(names('earth')).toEqual([
			'Mercury inward',
			'Venus inward',
			'Mars outward',
			'Jupiter outward',
			'Saturn outward',
			'Uranus outward',
			'Neptune outward'
		]);
		expect(names('mars')).toContain('Earth inward');
		expect(names('mars')).not.toContain('Mars outward');
	});

	it('gets to the target from the least radius: the paths and the table agree', () => {
		const targets = [
			{ name: 'in', distance: 0.4 * AU },
			{ name: 'out', distance: 3 * AU }
		];
		const [inner, outer] = outputs({ site: earth, targets }).outputs.targets;
		const radii = [inner!.radius, outer!.radius];
		const [inwards, outwards] = outputs({ site: earth, targets, radii }).outputs.paths;
		expect(inwards!.inward!.nearPoint / (0.4 * AU)).toBeCloseTo(1, 10);
		expect(outwards!.outward!.farPoint! / (3 * AU)).toBeCloseTo(1, 10);
	});

	it('tells no path where the mass stays bound to the body', () => {
		const [row] = outputs({ site: earth, radii: [5e7] }).outputs.paths;
		expect(row!.c3).toBeLessThan(0);
		expect(row!.outward).toBeUndefined();
	});

	it('names the targets that lie beyond the line’s top', () => {
		const { outputs: out, warnings } = outputs({ site: earth, top: 1e8 });
		const beyond = out.targets.filter(({ beyondTop }) => beyondTop).map(({ name }) => name);
		expect(beyond).toEqual(['Mercury', 'Jupiter', 'Saturn', 'Uranus', 'Neptune']);
		expect(warnings.filter((text) => text.includes('out of reach'))).toHaveLength(5);
	});

	it('refuses what has no path of its own about the Sun', () => {
		const own = { kind: 'own', gm: 4e14, radius: 6.4e6, period: 90_000 };
		expect(at({ site: own })).toMatchObject({ refusal: { faults: [{ path: 'sunDistance' }] } });
		expect(at({ site: own, sunDistance: 2 * AU }).ok).toBe(true);
		expect(at({ site: { kind: 'body', body: 'moon' } }).ok).toBe(false);
		expect(at({ site: { kind: 'moon' } }).ok).toBe(false);
	});

	it('refuses a target on the body’s own path', () => {
		const targets = [{ name: 'here', distance: AU }];
		expect(at({ site: earth, targets })).toMatchObject({
			refusal: { faults: [{ path: 'targets.0.distance' }] }
		});
	});
});
