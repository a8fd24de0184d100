import { describe, expect, it } from 'vitest';
import { lineOf } from '../line/line';
import { hang } from '../line/tension';
import { answer } from '../methods/method';
import { periods } from '../methods/periods';
import { banded } from '../numerics/banded';
import { meshOf } from './elements';
import { addStiffness, across, stiffnessOf } from './family';
import { D1, sized } from './motion.fixture';
import { coupledModes, uncoupledModes } from './periods';

const MODULUS = 1e12;
const moon = {
	kind: 'moon',
	side: 'near',
	moonGm: 4.902800066e12,
	moonRadius: 1_737_400,
	primaryGm: 3.986004418e14,
	distance: 384_400e3
} as const;
const LINES = {
	D1: D1,
	'a line from the Moon through L1': sized(moon, 4e9, 2.2e8, { density: 970, lift: 2000 }),
	'a line from the Moon through L2': sized({ ...moon, side: 'far' }, 4e9, 1.5e8, {
		density: 970,
		lift: 2000
	}),
	'D1 with climbers and a stepped section': {
		...D1,
		section: {
			kind: 'stepped' as const,
			baseRadius: undefined,
			sections: [
				{ to: 2e7, area: 9e-6 },
				{ to: 6e7, area: 1.4e-5 },
				{ to: 1.06e8, area: 1e-5 }
			]
		},
		masses: [
			{ radius: 8e6, mass: 5e3 },
			{ radius: 3e7, mass: 5e3 }
		],
		counterweight: 9e5
	}
};

describe.each(Object.entries(LINES))('the modes of %s', (_, input) => {
	const line = lineOf(input);
	const hanging = hang(line);

	it('out of plane differ from those in plane by ω² in λ', () => {
		const { inPlane, outOfPlane } = uncoupledModes(line, hanging, 6);
		const { omega } = line.field;
		inPlane.forEach(({ lambda }, i) =>
			expect(Math.abs(outOfPlane[i]!.lambda / (lambda + omega ** 2) - 1)).toBeLessThan(1e-8)
		);
	});

	it('include the whole line turning about its body when the base is free', () => {
		if (line.field.limit !== Infinity || input.site.kind === 'moon') return;
		const mesh = meshOf(line, hanging, 12);
		// A point mass at the base carries the tension there.
		mesh.mass[0]! += hanging.stretches[0]!.lower / line.field.g(line.field.base);
		const family = across(line, 'inPlane');
		const matrix = banded(mesh.radius.length, mesh.order);
		addStiffness(mesh, family, matrix, (node) => node);
		const force = new Float64Array(mesh.radius.length);
		const size = new Float64Array(mesh.radius.length);
		for (let i = 0; i < force.length; i += 1)
			for (let j = Math.max(0, i - mesh.order); j <= i; j += 1) {
				const k = matrix.entries[i * (mesh.order + 1) + mesh.order - (i - j)]!;
				force[i]! += k * mesh.radius[j]!;
				size[i]! += Math.abs(k * mesh.radius[j]!);
				if (j !== i) {
					force[j]! += k * mesh.radius[i]!;
					size[j]! += Math.abs(k * mesh.radius[i]!);
				}
			}
		// y = r: λ = 0 in plane.
		force.forEach((f, i) => expect(Math.abs(f) / size[i]!).toBeLessThan(1e-11));
		// The same shape: ω² out of plane.
		const square = mesh.mass.reduce((sum, m, i) => sum + m * mesh.radius[i]! ** 2, 0);
		const out = stiffnessOf(mesh, across(line, 'outOfPlane'), (node) => mesh.radius[node]!);
		expect(out / square / line.field.omega ** 2).toBeCloseTo(1, 9);
	});

	it('lie, coupled, on both sides of those that they come from', () => {
		const alone = uncoupledModes(line, hanging, 3, MODULUS);
		const [first] = coupledModes(line, hanging, 3, MODULUS);
		// The Coriolis terms hold no energy back: the longest period can only grow.
		expect(first!.period!).toBeGreaterThan(alone.inPlane[0]!.period!);
	});
});

describe('the method', () => {
	it('refuses a slack line and says where', () => {
		const found = answer(periods, { ...D1, counterweight: 1e3, modulus: MODULUS });
		expect(found).toMatchObject({
			ok: false,
			refusal: { message: expect.stringMatching(/slack from the radius .* km to .* km/) }
		});
	});

	it('says that a line too soft to hold itself along is unstable, and couples nothing then', () => {
		const found = answer(periods, { ...D1, modulus: 1e8 });
		expect(found).toMatchObject({ ok: true, outputs: { coupled: [] } });
		if (!found.ok) return;
		expect(found.outputs.along[0]!.lambda).toBeLessThan(0);
		expect(found.outputs.along[0]!.period).toBeUndefined();
		expect(found.warnings.join()).toContain(
			'Unstable along: a small displacement grows. Coriolis terms could hold it only without any damping'
		);
	});

	it('holds each period against the tides on Earth, the turn of the body and the climbers', () => {
		const found = answer(periods, {
			...D1,
			modulus: MODULUS,
			climberInterval: 90 * 3600,
			separationLimit: 0.05
		});
		if (!found.ok) throw new Error(found.refusal.message);
		const of = (mode: string, forcing: string) =>
			found.outputs.separations.find((pair) => pair.mode === mode && pair.forcing === forcing)!;
		// Out of plane 23.5459 h against K1 at 23.9345 h: 1.6 %.
		expect(of('out of plane 1', 'K1').separation).toBeCloseTo(0.01624, 4);
		expect(of('out of plane 1', 'K1').clear).toBe(false);
		expect(of('coupled 1', 'climber interval').separation).toBeCloseTo(148.165 / 90 - 1, 4);
		expect(found.warnings.join()).toContain(
			'out of plane 1 lies within the separation limit of K1'
		);
	});

	it('counts no tides elsewhere', () => {
		const found = answer(periods, {
			...sized({ kind: 'body', body: 'mars', j2: false }, 50e9, 4e7),
			count: 1
		});
		if (!found.ok) throw new Error(found.refusal.message);
		expect(found.outputs.separations.map(({ forcing }) => forcing)).not.toContain('M2');
	});
});
