import { describe, expect, it } from 'vitest';
import { analyse } from './as-built';
import { BODY, TOP, lineWith, stepped, table, taper } from './lines.fixture';

/** The counterweight under which a taper of 50 GPa carries its design stress: σ_d A(r_t)/(−g(r_t)). */
function balanced(masses: { radius: number; mass: number }[] = []) {
	const bare = lineWith(taper(), 0);
	const counterweight = (50e9 * bare.pieces.at(-1)!.area(TOP)) / -bare.field.g(TOP);
	return lineWith(taper(), counterweight, masses);
}

describe('a line as built', () => {
	it('carries its design stress everywhere when it is the exact taper', () => {
		const { rows, leastMargin, slack } = analyse(balanced(), 50e9, 500);
		for (const { stress } of rows) expect(stress / 50e9).toBeCloseTo(1, 11);
		expect(leastMargin).toBeCloseTo(0, 11);
		expect(slack).toEqual([]);
	});

	it('tells the lowest radius where the margin is flat', () => {
		expect(analyse(balanced(), 50e9, 100).extremes.stressRadius).toBe(BODY.radius);
	});

	it('steps by the weight of a point mass, and looks at both sides of it', () => {
		const radius = 2e7;
		const line = balanced([{ radius, mass: 10e3 }]);
		const { rows } = analyse(line, 50e9, 50);
		const [below, above] = rows.filter((row) => row.radius === radius);
		expect(above!.tension - below!.tension).toBeCloseTo(10e3 * line.field.g(radius), 6);
		expect(rows.filter((row) => row.radius === radius)).toHaveLength(2);
	});

	it('has less tension below a climber under the balance radius and more below one above it', () => {
		const at = (radius: number) =>
			analyse(balanced([{ radius, mass: 10e3 }]), 50e9, 2).extremes.anchorTension;
		const bare = analyse(balanced(), 50e9, 2).extremes.anchorTension;
		expect(at(1e7)).toBeLessThan(bare);
		expect(at(9e7)).toBeGreaterThan(bare);
	});

	it('counts a mass at the anchor above the anchor’s tension, and one at the top as counterweight', () => {
		const line = balanced();
		const tension = (masses: { radius: number; mass: number }[]) =>
			analyse({ ...line, masses }, 50e9, 2).extremes.anchorTension;
		const bare = tension([]);
		const atBase = tension([{ radius: BODY.radius, mass: 1e3 }]);
		expect(bare - atBase).toBeCloseTo(1e3 * line.field.g(BODY.radius), 6);
		const heavier = { ...line, counterweight: line.counterweight + 1e3 };
		expect(tension([{ radius: TOP, mass: 1e3 }])).toBeCloseTo(
			analyse(heavier, 50e9, 2).extremes.anchorTension,
			6
		);
	});

	it('says where the line is slack', () => {
		const line = lineWith(stepped([1e-6]), 0);
		const { slack, rows, extremes } = analyse(line, 50e9, 3);
		expect(extremes.anchorTension).toBeLessThan(0);
		expect(slack).toHaveLength(1);
		expect(slack[0]!.from).toBe(BODY.radius);
		// Below the radius at the depth of the top nothing is pulled: U(r) = U(r_t).
		expect(line.field.rise(slack[0]!.to, TOP) / line.field.depth(TOP)).toBeCloseTo(0, 12);
		expect(rows[0]!.margin).toBeUndefined();
	});

	it('has no margin where nothing is under tension', () => {
		const short = lineWith(stepped([1e-6], 1e7), 0);
		const { leastMargin, slack } = analyse(short, 50e9, 10);
		expect(leastMargin).toBeUndefined();
		expect(slack).toEqual([{ from: BODY.radius, to: 1e7 }]);
	});

	it('finds the greatest stress inside a long row of a table', () => {
		const line = lineWith(table([BODY.radius, 5e-6], [TOP, 1e-6]), 5e5);
		const coarse = analyse(line, 50e9, 2);
		const fine = analyse(line, 50e9, 20_000);
		const seen = Math.max(...fine.rows.map(({ stress }) => stress));
		expect(coarse.extremes.stress / seen).toBeCloseTo(1, 7);
		expect(coarse.extremes.stress).toBeGreaterThanOrEqual(seen * (1 - 1e-12));
		expect(coarse.extremes.stressRadius).toBeGreaterThan(1e7);
	});
});
