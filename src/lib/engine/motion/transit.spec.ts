import { describe, expect, it } from 'vitest';
import { fieldOf } from '../line/site';
import { answer } from '../methods/method';
import { transit as method } from '../methods/transit';
import { EARTH } from './motion.fixture';
import { transit } from './transit';

const field = fieldOf(EARTH);
const climber = { mass: 20e3, topSpeed: 200 / 3.6, power: 1e9, efficiency: 1, recovery: 0 };

describe('a climber that is never short of power', () => {
	const way = transit(field, climber, field.base, field.balance);

	it('takes 7.4554 d at 200 km/h to the balance radius and presses the line with 162.05 N', () => {
		// Consistency figures computed outside with SciPy.
		expect(way.time / 86_400).toBeCloseTo(7.4554, 4);
		expect(way.greatestSideForce).toBeCloseTo(162.05, 2);
	});

	it('draws what the potential rises by', () => {
		// 13.45 kWh/kg on Earth, common practice.
		expect(way.energy / climber.mass / 3.6e6).toBeCloseTo(13.45, 2);
		expect(way.braked).toBe(0);
	});
});

describe('a climber short of power', () => {
	const weak = { ...climber, power: 2e6, efficiency: 0.8, recovery: 0.5 };

	it('starts at ηP/(m g) and takes longer', () => {
		const way = transit(field, weak, field.base, field.balance);
		expect(way.leastSpeed).toBeCloseTo((0.8 * 2e6) / (20e3 * field.g(field.base)), 9);
		expect(way.leastSpeedRadius).toBe(field.base);
		expect(way.time).toBeGreaterThan(transit(field, climber, field.base, field.balance).time);
	});

	it('takes the two parts of a way in the time of the whole', () => {
		const [a, b, c] = [7e6, 3e7, 9e7];
		const parts = transit(field, weak, a, b).time + transit(field, weak, b, c).time;
		expect(transit(field, weak, a, c).time / parts).toBeCloseTo(1, 11);
	});

	it('brakes on the way down what it drew on the way up, but for the drive', () => {
		const up = transit(field, weak, 7e6, 4e7);
		const down = transit(field, weak, 4e7, 7e6);
		expect(down.braked).toBeCloseTo(up.energy * weak.efficiency, 0);
		expect(down.recovered).toBeCloseTo(down.braked / 2, 0);
		expect(down.time).toBeCloseTo(up.time, 3);
	});
});

describe('the method', () => {
	const input = {
		site: { kind: 'body', body: 'earth' },
		mass: 20e3,
		from: field.base,
		to: 1e8,
		topSpeed: 60,
		power: 3e6
	};

	it('tells a table that ends at the end with the whole time', () => {
		const found = answer(method, { ...input, points: 25 });
		if (!found.ok) throw new Error(found.refusal.message);
		const { rows, time } = found.outputs;
		expect(rows.at(-1)!.radius).toBe(1e8);
		expect(rows.at(-1)!.time / time).toBeCloseTo(1, 9);
		expect(rows.every(({ sideForce }) => sideForce > 0)).toBe(true);
	});

	it.each([
		[{ ...input, to: field.base }, 'to'],
		[{ ...input, from: 1e6 }, 'from'],
		[{ ...input, efficiency: 1.2 }, 'efficiency']
	])('refuses what cannot be', (wrong, path) => {
		expect(answer(method, wrong)).toMatchObject({ ok: false, refusal: { faults: [{ path }] } });
	});
});
