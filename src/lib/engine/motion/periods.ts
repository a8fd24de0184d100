/**
 * Natural periods of small motions about a straight line, base fixed, counterweight at the top.
 *
 * Uncoupled: λ μ y = −(T y′)′ + μ k y across the line, with k_y in the plane of rotation and k_z out of it;
 * λ μ u = −(EA u′)′ + μ k_x u along it. Coupled: in plane with along by the Coriolis terms (ẍ − 2ωẏ,
 * ÿ + 2ωẋ); with x = a cos Ωt and y = b sin Ωt that is a symmetric problem in Ω.
 * Left out: damping, bending, the air, the climbers' own motion.
 */
import type { Line } from '../line/line';
import { Refused } from '../methods/refused';
import { banded, type Banded } from '../numerics/banded';
import { lowest, type Eigenpair } from '../numerics/spectrum';
import type { Hanging } from '../line/tension';
import { meshOf, type Mesh } from './elements';
import { across, addStiffness, along, stiffnessOf, type Family } from './family';

export type Mode = {
	/** Ω² in 1/s²; below 0 the motion grows. */
	lambda: number;
	/** s; undefined where it grows. */
	period: number | undefined;
};

export type CoupledMode = Mode & {
	/** Share of the kinetic energy that is in the plane across the line. */
	acrossShare: number;
};

export type Uncoupled = { inPlane: Mode[]; outOfPlane: Mode[]; along: Mode[] };

/** @param modulus E, Pa; without it nothing is told of the motions along the line */
export function uncoupledModes(
	line: Line,
	hanging: Hanging,
	count: number,
	modulus?: number
): Uncoupled {
	const scale = line.field.omega ** 2;
	return settled(line, hanging, (mesh) => {
		const modes = (family: Family) =>
			singleFamily(mesh, family, count, scale).map(({ value }) => modeOf(value));
		return {
			inPlane: modes(across(line, 'inPlane')),
			outOfPlane: modes(across(line, 'outOfPlane')),
			along: modulus === undefined ? [] : modes(along(line, modulus))
		};
	});
}

/**
 * In plane with along, where both are stable alone: on that the count of the coupled modes stands. A line that only
 * the Coriolis terms would hold is none: with any damping it is unstable (Thomson, Tait and Chetaev).
 */
export function coupledModes(
	line: Line,
	hanging: Hanging,
	count: number,
	modulus: number
): CoupledMode[] {
	const families: [Family, Family] = [along(line, modulus), across(line, 'inPlane')];
	return settled(line, hanging, (mesh) => ({
		coupled: twoFamilies(mesh, families, line.field.omega, count)
	})).coupled;
}

const modeOf = (lambda: number): Mode => ({
	lambda,
	period: lambda > 0 ? (2 * Math.PI) / Math.sqrt(lambda) : undefined
});

/** Below it a mode counts as unstable: −1e6 ω² is beyond any line. */
const FLOOR = -1e6;

/** In units of ω², so that all figures are of ordinary size. */
function singleFamily(mesh: Mesh, family: Family, count: number, scale: number): Eigenpair[] {
	const size = mesh.mass.length - 1;
	const stiffness = banded(size, mesh.order);
	addStiffness(mesh, family, stiffness, (node) => node - 1);
	const { mass } = mesh;
	const width = mesh.order + 1;
	const value = (v: Float64Array) => (node: number) => (node === 0 ? 0 : v[node - 1]!);
	const pairs = lowest(
		{
			matrix: banded(size, mesh.order),
			load(s, { entries }) {
				entries.set(stiffness.entries);
				for (let i = 0; i < size; i += 1)
					entries[i * width + mesh.order]! -= s * scale * mass[i + 1]!;
			},
			rayleigh(v) {
				let weight = 0;
				for (let i = 0; i < size; i += 1) weight += mass[i + 1]! * v[i]! ** 2;
				return stiffnessOf(mesh, family, value(v)) / weight / scale;
			},
			weigh(v) {
				for (let i = 0; i < size; i += 1) v[i]! *= mass[i + 1]!;
			}
		},
		count,
		1,
		FLOOR
	);
	return pairs.map(({ value, vector }) => ({ value: value * scale, vector }));
}

/** Nodes stand in pairs: along, across. */
function twoFamilies(
	mesh: Mesh,
	[longitudinal, transverse]: [Family, Family],
	omega: number,
	count: number
): CoupledMode[] {
	const nodes = mesh.mass.length - 1;
	const size = 2 * nodes;
	const band = 2 * mesh.order;
	const stiffness: Banded = banded(size, band);
	addStiffness(mesh, longitudinal, stiffness, (node) => (node === 0 ? -1 : 2 * node - 2));
	addStiffness(mesh, transverse, stiffness, (node) => (node === 0 ? -1 : 2 * node - 1));
	const { mass } = mesh;
	const width = band + 1;
	const part = (v: Float64Array, offset: number) => (node: number) =>
		node === 0 ? 0 : v[2 * node - 2 + offset]!;
	const sums = (v: Float64Array) => {
		let [weight, cross, transverseWeight] = [0, 0, 0];
		for (let i = 0; i < nodes; i += 1) {
			const [a, b, m] = [v[2 * i]!, v[2 * i + 1]!, mass[i + 1]!];
			weight += m * (a * a + b * b);
			transverseWeight += m * b * b;
			cross += 4 * m * a * b;
		}
		return { weight, cross, share: transverseWeight / weight };
	};
	const pairs = lowest(
		{
			matrix: banded(size, band),
			load(s, { entries }) {
				entries.set(stiffness.entries);
				const [square, coriolis] = [(s * omega) ** 2, 2 * s * omega * omega];
				for (let i = 0; i < nodes; i += 1) {
					const m = mass[i + 1]!;
					entries[2 * i * width + band]! -= square * m;
					entries[(2 * i + 1) * width + band]! -= square * m;
					entries[(2 * i + 1) * width + band - 1]! += coriolis * m;
				}
			},
			rayleigh(v) {
				const { weight, cross } = sums(v);
				const k =
					(stiffnessOf(mesh, longitudinal, part(v, 0)) +
						stiffnessOf(mesh, transverse, part(v, 1))) /
					omega ** 2;
				// weight s² − cross s − k = 0, its positive root without cancellation.
				const root = Math.sqrt(cross * cross + 4 * weight * k);
				return cross > 0 ? (cross + root) / (2 * weight) : (2 * k) / (root - cross);
			},
			weigh(v) {
				for (let i = 0; i < nodes; i += 1) {
					v[2 * i]! *= mass[i + 1]!;
					v[2 * i + 1]! *= mass[i + 1]!;
				}
			}
		},
		count,
		1,
		0
	);
	return pairs.map(({ value, vector }) => ({
		...modeOf((value * omega) ** 2),
		acrossShare: sums(vector).share
	}));
}

/** Largest change of a period that still counts as settled. */
const SETTLED = 2e-8;
const MOST_NODES = 60_000;

/** Raises the order of the elements until nothing moves any more. */
function settled<T extends Record<string, Mode[]>>(
	line: Line,
	hanging: Hanging,
	modes: (mesh: Mesh) => T
): T {
	const count = meshOf(line, hanging, 1).elements.length;
	const orders = count > 300 ? [2, 4, 6, 8] : count > 40 ? [5, 8, 11] : [9, 12, 16, 22];
	let before: T | null = null;
	for (const order of orders) {
		if (order * count > MOST_NODES) break;
		const now = modes(meshOf(line, hanging, order));
		if (before && Object.keys(now).every((key) => same(before![key]!, now[key]!))) return now;
		before = now;
	}
	throw new Refused('The periods did not settle as the line was cut finer.', {
		code: 'not-converged',
		remedy: 'Look for sections or tensions that change by many powers of ten over a short stretch.'
	});
}

function same(before: readonly Mode[], now: readonly Mode[]): boolean {
	return now.every(
		({ lambda }, i) =>
			before[i] !== undefined &&
			Math.abs(lambda - before[i]!.lambda) <= 2 * SETTLED * Math.abs(lambda)
	);
}
