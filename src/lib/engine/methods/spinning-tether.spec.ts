import { describe, expect, it } from 'vitest';
import { answer } from './method';
import { spinningAsBuilt } from './spinning-as-built';
import { spinningTether } from './spinning-tether';

const arm = { density: 1000, designStress: 2e9, tipSpeed: 2000, length: 1e5, tipMass: 1000 };

function tether(input: object) {
	const found = answer(spinningTether, { ...arm, ...input });
	if (!found.ok) throw new Error(found.refusal.message);
	return found.outputs;
}

describe('a spinning tether', () => {
	it('has V = ΩL and V²/L at the tip, and there the section that holds the mass', () => {
		// By hand.
		const found = tether({});
		expect(found.rate).toBeCloseTo(0.02, 15);
		expect(found.tipAcceleration).toBeCloseTo(40, 12);
		expect(found.tipArea).toBeCloseTo(40e3 / 2e9, 15);
		expect(found.profile.at(-1)!.radius).toBe(1e5);
		expect(found.profile.at(-1)!.area).toBeCloseTo(found.tipArea, 15);
		expect(found.profile[0]!.area).toEqual(found.hubArea);
	});

	it('is told by its logarithm where the exponential overflows', () => {
		// ln of the ratio is (V/V_c)² = 30², log10 that over ln 10.
		expect(tether({ tipSpeed: 60_000 }).areaRatio).toMatchObject({
			log10: expect.closeTo(900 / Math.LN10, 9)
		});
	});

	it('weighs more per tip mass the faster it spins, the same whatever its length', () => {
		const ratio = (tipSpeed: number, length = 1e5) =>
			Number(tether({ tipSpeed, length }).massRatio);
		expect(ratio(2100)).toBeGreaterThan(ratio(2000));
		expect(ratio(2000, 1e3)).toBe(ratio(2000, 1e6));
	});

	it('weighs as many arms as it has', () => {
		const { armMass, tetherMass } = tether({ arms: 3 });
		expect(Number(tetherMass) / Number(armMass)).toBeCloseTo(3, 12);
	});
});

describe('a spinning arm as built', () => {
	const strength = { allowable: 3e9, factorOfSafety: 1.5 };
	const built = (rows: object[]) => {
		const { density, tipSpeed, tipMass } = arm;
		return answer(spinningAsBuilt, { density, tipSpeed, tipMass, rows, ...strength });
	};

	it('bears ρV²/2 and the tip’s pull at the hub when it is uniform', () => {
		const found = built([
			{ radius: 0, area: 4e-5 },
			{ radius: 1e5, area: 4e-5 }
		]);
		if (!found.ok) throw new Error(found.refusal.message);
		// By hand: 1000 · 2000²/2 + 1000 kg · 40 m/s² / 4e-5 m² = 2 GPa + 1 GPa.
		expect(found.outputs.greatestStress).toBeCloseTo(3e9, 0);
		expect(found.outputs.leastMargin).toBeCloseTo(2 / 3 - 1, 12);
		expect(found.outputs.leastMarginRadius).toBe(0);
		expect(found.outputs.armMass).toBeCloseTo(4000, 8);
		expect(found.warnings[0]).toContain('above the allowed');
	});

	it('refuses rows that do not ascend', () => {
		const twice = { radius: 10, area: 4e-5 };
		expect(built([twice, twice])).toMatchObject({
			refusal: { faults: [{ path: 'rows.1.radius' }] }
		});
	});
});
