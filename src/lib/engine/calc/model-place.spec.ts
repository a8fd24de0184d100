/** Line models on other places than the Earth alone. */
import { describe, expect, it } from 'vitest';
import { given, lineModel, modelOf, quantityOf } from './items.fixture';
import type { LineModelItem } from './items';
import type { LineModelResult } from './results';

const figures = ({ outputs }: LineModelResult) =>
	Object.fromEntries(
		outputs.map(({ name, outcome }) => [
			name,
			outcome.state === 'value' ? outcome.quantity.si : outcome.state
		])
	);
const model = (more: Partial<LineModelItem>, ...givens: Parameters<typeof given>[]) =>
	modelOf([...givens.map((of) => given(...of)), lineModel(more)]);

/** Mars by its published figures (JPL, IAU WGCCRE). */
const MARS = {
	body: 'own',
	gm: '4.2828375e13 m^3/s^2',
	radius: '3396.19 km',
	period: '88642.66 s',
	...{ density: '1300 kg/m^3', allowable: '20 GPa', lift: '5 t', top: '60 000 km' }
} as const;

describe('a body of one’s own', () => {
	it('with the figures of Mars carries the line of Mars', () => {
		const ours = figures(model(MARS));
		const known = figures(model({ ...MARS, body: 'mars' }));
		for (const [name, value] of Object.entries(known))
			expect(Number(ours[name]) / Number(value)).toBeCloseTo(1, 12);
		// Areostationary orbit: 20 428 km from the centre, common practice.
		expect(Number(ours.r_s) / 1e3).toBeCloseTo(20428, 0);
	});

	it('with J2 differs from itself without, as the known one does', () => {
		const [own, ownFlat] = [
			figures(model(MARS)),
			figures(model({ ...MARS, oblateness: '1.96045e-3' }))
		];
		const [mars, marsFlat] = [
			figures(model({ ...MARS, body: 'mars' })),
			figures(model({ ...MARS, body: 'mars', j2: 'with' }))
		];
		expect(Number(ownFlat.mass) / Number(own.mass)).not.toBeCloseTo(1, 6);
		expect(Number(ownFlat.mass) / Number(own.mass)).toBeCloseTo(
			Number(marsFlat.mass) / Number(mars.mass),
			10
		);
	});

	it('is blank until its gravitation, radius and period are given', () => {
		for (const missing of ['gm', 'radius', 'period']) {
			const { outputs, faults } = model({ ...MARS, [missing]: '' });
			expect(faults).toEqual([]);
			expect(outputs[0]!.outcome).toEqual({ state: 'blank' });
		}
	});

	it('hands the uncertainty of its figures on', () => {
		const uncertain = model({ ...MARS, gm: 'GM_b' }, ['GM_b', '4.2828375e13', 'm^3/s^2', '1 %']);
		const balance = uncertain.outputs.find(({ name }) => name === 'r_s')!.outcome;
		if (balance.state !== 'value') throw new Error('No balance radius.');
		// r_s goes with the cube root of GM.
		expect(balance.quantity.uncertainty! / balance.quantity.value).toBeCloseTo(0.01 / 3, 8);
	});

	it.each([
		[{ radius: '3 h' }, 'radius', 'The equatorial radius must be a length, L; this is a time, T.'],
		[{ gm: '-1 m^3/s^2' }, 'gm', 'The gravitational parameter must be above 0.'],
		[
			{ oblateness: '0.7' },
			'oblateness',
			'The second zonal harmonic must be 0 or more and below 0.5.'
		],
		[{ period: '1 h' }, '', 'The balance radius lies inside the body: nothing holds a line up.']
	])('is refused in words: %j', (more, field, message) => {
		expect(model({ ...MARS, ...more }).faults).toMatchObject([{ field, fault: { message } }]);
	});
});

describe('a line from a moon', () => {
	const LUNAR = { allowable: '5 GPa', lift: '1 t', density: '1 000 kg/m^3' } as const;

	it('towards the Earth is held up at L1, away from it at L2', () => {
		const near = model({ ...LUNAR, body: 'moonNear', top: '100 000 km' });
		const far = model({ ...LUNAR, body: 'moonFar', top: '100 000 km' });
		expect([...near.faults, ...far.faults]).toEqual([]);
		// The balance of both pulls and the turning about the barycentre at 384 400 km, by bisection in Python.
		expect(Number(figures(near).r_s)).toBeCloseTo(58_019_138.24, 1);
		expect(Number(figures(far).r_s)).toBeCloseTo(64_514_906.65, 1);
		expect(near.warnings.join()).toContain('whose own radius is not looked at');
		expect(near.profile!.synchronous).toBeCloseTo(Number(figures(near).r_s) - 1_737_400, 0);
	});

	it('takes the figures of another moon and its primary', () => {
		const more = {
			...LUNAR,
			body: 'moonFar',
			...{ gm: '1e10 m^3/s^2', radius: '100 km' },
			...{ primaryGm: '1e13 m^3/s^2', distance: '30 000 km', top: '8 000 km' }
		} as const;
		const { faults, outputs } = model(more);
		expect(faults).toEqual([]);
		expect(outputs[0]!.outcome.state).toBe('value');
	});

	it.each([
		[{ top: '50 000 km' }, /not above the balance point at 56\u202f282 km/],
		[{ top: '400 000 km' }, /reaches the centre of the primary/],
		[{ gm: '1e20 m^3/s^2', top: '60 000 km' }, /heavier than its primary/]
	])('is refused in words: %j', (more, message) => {
		const { faults } = model({ ...LUNAR, body: 'moonNear', ...more });
		expect(faults).toMatchObject([{ field: '', fault: { code: 'refused' } }]);
		expect(faults[0]!.fault.message).toMatch(message);
	});
});

it('names a field of another place in no way', () => {
	const { uses } = quantityOf(
		[given('x', '1'), lineModel({ gm: 'x', radius: 'nonsense +' })],
		'line'
	) as never;
	expect(uses).toEqual([]);
});
