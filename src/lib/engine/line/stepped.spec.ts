import { describe, expect, it } from 'vitest';
import { Refused } from '../methods/refused';
import { equalHeights, equalRises } from './boundaries';
import { bodyField } from './field';
import { sizeStepped } from './stepped';
import { taperShape } from './taper';

const field = bodyField({ gm: 4e14, radius: 6.4e6, rate: 7.3e-5, j2: 0 });
const top = 1.06e8;
const base = { density: 1300, designStress: 50e9, lnBaseTension: Math.log(2e5), jointMass: 0 };

const refusal = (run: () => unknown) => {
	try {
		run();
	} catch (error) {
		if (error instanceof Refused) return error;
	}
	throw new Error('Nothing was refused.');
};

describe('sections of a stepped line', () => {
	it('meet between the anchor and the top', () => {
		for (const radii of [equalHeights(field, top, 7), equalRises(field, top, 7)]) {
			expect(radii).toHaveLength(8);
			expect([radii[0], radii.at(-1)]).toEqual([field.base, top]);
			expect([...radii].sort((a, b) => a - b)).toEqual(radii);
		}
	});

	it('share the rise and the fall of the potential equally, when asked to', () => {
		const radii = equalRises(field, top, 9);
		const path = (r: number) =>
			r < field.balance
				? field.depth(field.base) - field.depth(r)
				: field.depth(field.base) + field.depth(r);
		for (let i = 1; i <= 9; i += 1) expect((path(radii[i]!) / path(top)) * 9).toBeCloseTo(i, 9);
	});

	it('have the design stress as their greatest, and tension that goes on across the boundaries', () => {
		const { sections } = sizeStepped(field, { ...base, boundaries: equalRises(field, top, 20) });
		sections.forEach((section, i) => {
			const peak = Math.max(section.from, Math.min(section.to, field.balance));
			const greatest = section.lowerStress + base.density * field.rise(section.from, peak);
			expect(greatest / base.designStress).toBeCloseTo(1, 12);
			expect(section.upperStress).toBeLessThanOrEqual(base.designStress * (1 + 1e-12));
			expect(section.lnLower).toBeCloseTo(sections[i - 1]?.lnUpper ?? base.lnBaseTension, 12);
		});
	});

	it('step by the weight of a joint', () => {
		const boundaries = equalRises(field, top, 5);
		const { sections } = sizeStepped(field, { ...base, boundaries, jointMass: 40 });
		sections.slice(1).forEach((section, i) => {
			const step = Math.exp(section.lnLower) - Math.exp(sections[i]!.lnUpper);
			expect(step / (40 * field.g(section.from))).toBeCloseTo(1, 6);
		});
	});

	it('weigh more than the exact taper, and ever less so', () => {
		const { lnTaper, lnMass } = taperShape(field, base.density, base.designStress);
		const exact =
			(2e5 / base.designStress) *
			Math.exp(lnTaper) *
			(Math.exp(lnMass(field.balance, field.base)) + Math.exp(lnMass(field.balance, top)));
		const excess = [10, 100, 1000].map((count) => {
			const boundaries = equalRises(field, top, count);
			return Math.exp(sizeStepped(field, { ...base, boundaries }).lnSections) / exact - 1;
		});
		expect(excess[0]!).toBeGreaterThan(0);
		// Of first order in the length of a section.
		expect(excess[1]! / excess[2]!).toBeCloseTo(10, 0);
		expect(excess[2]!).toBeLessThan(2e-3);
	});

	it('are refused by number and length where one cannot carry itself', () => {
		const run = (boundaries: number[], designStress: number) => () =>
			sizeStepped(field, { ...base, designStress, boundaries });
		const boundaries = [field.base, 1e7, 4e7, top];
		const { message } = refusal(run(boundaries, 33e9));
		const limit =
			Number(/under ([\d\u202f.]+) km/.exec(message)![1]!.replaceAll('\u202f', '')) * 1e3;
		expect(message).toMatch(/^Section 2, .* cannot carry itself/);
		const at = (length: number, designStress: number) =>
			run([field.base, 1e7, 1e7 + length, 4.2e7, top], designStress);
		expect(refusal(at(limit * (1 + 1e-6), 33e9)).message).toMatch(/^Section 2/);
		expect(base.density * field.rise(1e7, 1e7 + limit)).toBeCloseTo(33e9, -5);
	});

	it('are refused above the balance radius where the line would be slack before their end', () => {
		const heavy = { ...base, designStress: 5e9, boundaries: [...equalRises(field, 5e7, 60), 2e8] };
		expect(refusal(() => sizeStepped(field, heavy)).message).toMatch(
			/^Section 61, .* pulls outwards by more than the tension/
		);
	});

	it('are refused where a joint pulls outwards by more than the tension', () => {
		const boundaries = [field.base, 1e7, 2e7, 4e7, 9e7, top];
		const joints = { ...base, designStress: 100e9, lnBaseTension: 0, jointMass: 1e3, boundaries };
		const light = sizeStepped(field, joints);
		expect(light.sections).toHaveLength(5);
		const outward = { ...joints, boundaries: [field.base, 9e7, top], designStress: 200e9 };
		expect(refusal(() => sizeStepped(field, outward)).message).toMatch(/^Joint 1, .* slack/);
	});
});
