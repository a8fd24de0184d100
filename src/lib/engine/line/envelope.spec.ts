import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyse } from './as-built';
import { climberGrid, envelope, leastOf } from './envelope';
import { BODY, TOP, lineWith, stepped, table, taper } from './lines.fixture';

const lines = {
	taper: lineWith(taper(), 9e5),
	stepped: lineWith(stepped([4e-6, 9e-6, 12e-6, 11e-6, 9e-6]), 9e5, [{ radius: 3e7, mass: 5e3 }]),
	table: lineWith(table([BODY.radius, 4e-6], [2e7, 9e-6], [5e7, 13e-6], [TOP, 7e-6]), 9e5)
};

describe.each(Object.entries(lines))('climbers on a line, %s', (_, line) => {
	const climbers = fc.array(
		fc.record({
			radius: fc.double({ min: BODY.radius, max: TOP, noNaN: true }),
			mass: fc.double({ min: 1, max: 3e4, noNaN: true })
		}),
		{ maxLength: 4 }
	);

	it('do what they do as point masses of the line', () => {
		fc.assert(
			fc.property(climbers, (load) => {
				const [moment] = envelope(line, 50e9, [load]);
				const masses = [...line.masses, ...load].sort((a, b) => a.radius - b.radius);
				const { extremes, leastMargin } = analyse({ ...line, masses }, 50e9, 2);
				expect(moment!.margin! / leastMargin!).toBeCloseTo(1, 7);
				expect(moment!.anchorTension / extremes.greatestTension).toBeCloseTo(
					extremes.anchorTension / extremes.greatestTension,
					11
				);
				expect(moment!.leastTension / extremes.greatestTension).toBeCloseTo(
					extremes.leastTension / extremes.greatestTension,
					11
				);
			}),
			{ numRuns: 60 }
		);
	});
});

describe('an envelope', () => {
	it('looks at both ends of a grid', () => {
		const grid = climberGrid(lines.taper, 1e4, { count: 3 });
		expect(grid.map(([climber]) => climber!.radius)).toEqual([
			BODY.radius,
			(BODY.radius + TOP) / 2,
			TOP
		]);
	});

	it('finds the first of the worst moments', () => {
		expect(leastOf([3, 1, undefined, 1], (x) => x)).toBe(1);
		expect(leastOf([undefined], (x) => x)).toBeNull();
	});

	it('hangs a long table once, however many positions there are', () => {
		const rows = Array.from({ length: 2000 }, (_, i): [number, number] => [
			BODY.radius + ((TOP - BODY.radius) * i) / 1999,
			4e-6 * (1 + Math.sin(i / 700))
		]);
		const line = lineWith(table(...rows), 9e5);
		let integrals = 0;
		const counted = line.pieces.map((piece) => ({
			...piece,
			weight: (a: number, b: number) => ((integrals += 1), piece.weight(a, b))
		}));
		envelope({ ...line, pieces: counted }, 50e9, climberGrid(line, 1e4, { count: 200 }));
		// Once each for the line, and for each position where the climber stands and where the stress peaks.
		expect(integrals).toBeLessThan(2000 + 200 * 40);
	});
});
