import { describe, expect, it } from 'vitest';
import { typedFrom } from '$lib/components/methods/link';
import { readFields } from '$lib/components/methods/typed';
import { lineModel, modelOf } from '$lib/engine/calc/items.fixture';
import type { LineModelItem } from '$lib/engine/calc/items';
import { METHODS } from '$lib/engine/methods/catalogue';
import { answer } from '$lib/engine/methods/method';
import type { InputFault } from '$lib/engine/methods/refused';
import type { ItemOf } from '$lib/note/items';
import { furtherOf } from './further';

/** The answer of each method that is led to, or what is still to be typed there. */
function answers(more: Partial<LineModelItem> = {}) {
	const item = lineModel(more);
	const result = modelOf([item]);
	return new Map(
		furtherOf({ ...item, description: '' } as ItemOf<'lineModel'>, result).map(({ href }) => {
			const [path, hash] = href.split('#');
			const name = path!.replace('/methods/', '');
			const method = METHODS.get(name)!;
			const faults: InputFault[] = [];
			const input = readFields(method.inputs, typedFrom(method.inputs, `#${hash}`)!, faults);
			return [name, { faults, found: answer(method, input) }] as const;
		})
	);
}

const figure = (found: ReturnType<typeof answer>, name: string) => {
	if (!found.ok) throw new Error(found.refusal.message);
	return (found.outputs as Record<string, number>)[name]!;
};

describe('a sized line looked at further', () => {
	it('is the line that was sized', () => {
		const found = answers();
		expect([...found.keys()]).toEqual([
			'as-built',
			'climber-envelope',
			'periods',
			'transit',
			'release',
			'severed-line'
		]);
		// Case D1: 20 t at the base, GM/R² − ω²R = 9.7980 − 0.0339 m/s² by hand.
		const g = 3.986004418e14 / 6378137 ** 2 - 7.292115e-5 ** 2 * 6378137;
		expect(figure(found.get('as-built')!.found, 'anchorTension') / (20e3 * g)).toBeCloseTo(1, 8);
		for (const name of ['periods', 'release', 'severed-line', 'climber-envelope'])
			expect(found.get(name)!.found.ok, name).toBe(true);
	});

	it('asks for what a line does not say of its climbers', () => {
		const { found } = answers().get('transit')!;
		expect(found.ok ? [] : found.refusal.faults.map(({ path }) => path)).toEqual([
			'topSpeed',
			'power'
		]);
	});

	it('stands where the line stands: a body of one’s own, a moon', () => {
		const own = answers({
			...{ body: 'own', gm: '4.1e13 m^3/s^2', radius: '3300 km', period: '25 h' },
			oblateness: '1e-3',
			...{ allowable: '30 GPa', top: '50 000 km' }
		});
		for (const name of ['as-built', 'periods', 'release'])
			expect(own.get(name)!.found, name).toMatchObject({ ok: true });
		const moon = answers({ body: 'moonFar', allowable: '5 GPa', top: '100 000 km' });
		expect([...moon.keys()]).toEqual(['as-built', 'climber-envelope', 'periods', 'transit']);
		expect(moon.get('as-built')!.found).toMatchObject({ ok: true });
	});

	it('is nowhere to be looked at before it is sized', () => {
		expect(answers({ top: '30 000 km' }).size).toBe(0);
		expect(answers({ density: '' }).size).toBe(0);
	});
});
