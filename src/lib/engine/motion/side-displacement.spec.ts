import { describe, expect, it } from 'vitest';
import { lineOf } from '../line/line';
import { hang } from '../line/tension';
import { answer } from '../methods/method';
import { sideDisplacement } from '../methods/side-displacement';
import { integrate } from '../numerics/quadrature';
import { D1, lineD1 } from './motion.fixture';
import { displace } from './side-displacement';

const climber = { radius: 1.2e7, mass: 20e3, speed: 200 / 3.6 };

/** The line with the climber's mass on it. */
const laden = lineOf({ ...D1, masses: [{ radius: climber.radius, mass: climber.mass }] });

describe('a line under side loads', () => {
	it('is in equilibrium as a whole: loads, field and anchor add up to nothing', () => {
		const loads = {
			points: [{ radius: 1.2e7, force: -162 }],
			spread: [{ from: 2e7, to: 5e7, force: 1e-6 }]
		};
		const { at, anchorForce } = displace(laden, loads);
		const { field, density, pieces, counterweight } = laden;
		const area = (r: number) => pieces.find(({ to }) => r <= to)!.area(r);
		const edges = [field.base, 8e6, 1.2e7, 2e7, field.balance, 5e7, 8e7, field.base + 1e8];
		const ofLine = integrate((r) => density * area(r) * field.inPlane(r) * at(r), edges, 1e-11);
		const lumped =
			counterweight * field.inPlane(field.base + 1e8) * at(field.base + 1e8) +
			climber.mass * field.inPlane(climber.radius) * at(climber.radius);
		const applied = -162 + 1e-6 * 3e7;
		expect((applied - ofLine.value - lumped - anchorForce) / applied).toBeCloseTo(0, 8);
	});

	it('answers twice the load with twice the displacement', () => {
		const once = displace(laden, { points: [{ radius: 1e7, force: 10 }], spread: [] });
		const twice = displace(laden, { points: [{ radius: 1e7, force: 20 }], spread: [] });
		expect(twice.anchorLean / once.anchorLean).toBeCloseTo(2, 10);
	});

	it('moves at one place for a load at another as there for a load here', () => {
		// Maxwell and Betti.
		const load = (radius: number) => ({ points: [{ radius, force: 1 }], spread: [] });
		const [a, b] = [9e6, 7e7];
		expect(displace(lineD1, load(a)).at(b) / displace(lineD1, load(b)).at(a)).toBeCloseTo(1, 9);
	});

	it('holds the torque of the loads about the centre at the anchor', () => {
		// A turn of the whole line about the centre works against nothing: Σ F r = F₀ R, exact on one body.
		const found = answer(sideDisplacement, { ...D1, climbers: [climber] });
		if (!found.ok) throw new Error(found.refusal.message);
		const side = -2 * climber.mass * laden.field.omega * climber.speed;
		const { anchorForce, anchorLean } = found.outputs;
		expect(anchorForce / ((side * climber.radius) / laden.field.base)).toBeCloseTo(1, 9);
		// Westwards, by the force over the tension.
		expect(anchorLean).toBeLessThan(0);
		expect(anchorLean).toBeCloseTo(anchorForce / hang(laden).anchorTension, 12);
	});

	it('is refused where the line is slack, or a load lies off it', () => {
		expect(answer(sideDisplacement, { ...D1, counterweight: 1e3 })).toMatchObject({ ok: false });
		const off = { ...D1, pointLoads: [{ radius: 2e8, force: 1 }] };
		expect(answer(sideDisplacement, off)).toMatchObject({
			ok: false,
			refusal: { faults: [{ path: 'pointLoads.0.radius' }] }
		});
	});
});
