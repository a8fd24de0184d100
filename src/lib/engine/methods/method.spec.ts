import { describe, expect, it } from 'vitest';
import { METHODS } from './catalogue';
import { answer } from './method';
import { uniformLine } from './uniform-line';

const earth = { kind: 'body', body: 'earth' };

describe('a method called from outside', () => {
	it('fills in defaults and answers in SI with the engine’s version', () => {
		const found = answer(uniformLine, { site: earth, density: 7900, stress: 5e9 });
		expect(found).toMatchObject({ ok: true, method: 'uniform-line', engine: expect.any(String) });
		// σ/(ρ g₀) by hand.
		if (found.ok) expect(found.outputs.breakingLength).toBeCloseTo(5e9 / (7900 * 9.80665), 6);
	});

	it('tells all that is wrong with the input at once, each with its place', () => {
		const found = answer(uniformLine, {
			site: { kind: 'body', body: 'venus' },
			density: -1,
			strss: 5e9
		});
		expect(found).toMatchObject({ ok: false, refusal: { code: 'input' } });
		if (found.ok) return;
		expect(found.refusal.faults).toEqual([
			{ path: 'strss', message: 'strss is not an input here. Is it stress?' },
			{ path: 'site.body', message: 'site.body must be one of earth, mars, moon, ceres.' },
			{ path: 'density', message: 'density must be above 0; it is -1.' },
			{ path: 'stress', message: 'stress (stress of the material) is missing.' }
		]);
	});

	it('refuses in words what cannot stand', () => {
		const heavy = { kind: 'own', mass: 1e24, radius: 6e6, period: 3600 };
		const found = answer(uniformLine, { site: heavy, density: 1000, stress: 1e9 });
		expect(found).toMatchObject({
			ok: false,
			refusal: { code: 'refused', message: expect.stringContaining('inside the body') }
		});
	});

	it('takes no harm from what is no input at all', () => {
		const hostile: unknown[] = [
			null,
			'text',
			[],
			7,
			{ __proto__: { density: 1 } },
			{ constructor: 1 }
		];
		for (const input of hostile)
			for (const method of METHODS.values())
				expect(answer(method, input)).toMatchObject({ ok: false });
	});
});
