/**
 * Static side displacement y (east positive) of a taut line under side loads in the plane of rotation:
 * (T y′)′ − μ k_y y = −q, point masses m adding m k_y y; y = 0 at the anchor, T y′ + m_c k_y y = 0 at the
 * top. By the elements of the natural periods: K y = f.
 */
import { topOf, type Line } from '../line/line';
import { hang } from '../line/tension';
import { Refused } from '../methods/refused';
import { banded, factorise, solve } from '../numerics/banded';
import { lobatto } from '../numerics/lobatto';
import { meshOf, type Mesh } from './elements';
import { across, addStiffness } from './family';

/** N, eastwards. */
export type PointLoad = { radius: number; force: number };
/** N/m, eastwards, constant between two radii. */
export type SpreadLoad = { from: number; to: number; force: number };
export type Loads = { points: readonly PointLoad[]; spread: readonly SpreadLoad[] };

export type Displaced = {
	/** y′ at the anchor, eastwards, from the reaction. */
	anchorLean: number;
	/** T y′ at the anchor, N: what the line pulls it sideways with. */
	anchorForce: number;
	/** m, at a radius. */
	at: (radius: number) => number;
	/** Of the greatest size at a node. */
	greatest: { radius: number; displacement: number };
};

export function displace(line: Line, loads: Loads): Displaced {
	const cuts = [
		...loads.points.map(({ radius }) => radius),
		...loads.spread.flatMap(({ from, to }) => [from, to])
	].sort((a, b) => a - b);
	const hanging = hang(line, cuts);
	const count = meshOf(line, hanging, 1).elements.length;
	const orders = count > 300 ? [2, 4, 6, 8] : count > 40 ? [5, 8, 11] : [9, 12, 16, 22];
	let before: Displaced | null = null;
	for (const order of orders) {
		const now = solved(line, meshOf(line, hanging, order), loads);
		if (before && settled(before, now)) return now;
		before = now;
	}
	throw new Refused('The side displacement did not settle as the line was cut finer.', {
		code: 'not-converged'
	});
}

function settled(before: Displaced, now: Displaced): boolean {
	const near = (a: number, b: number, size: number) => Math.abs(a - b) <= 1e-9 * size;
	const size = Math.abs(now.greatest.displacement);
	return (
		near(before.anchorLean, now.anchorLean, Math.abs(now.anchorLean)) &&
		near(before.at(now.greatest.radius), now.greatest.displacement, size)
	);
}

function solved(line: Line, mesh: Mesh, loads: Loads): Displaced {
	const { order, elements, radius } = mesh;
	const nodes = radius.length;
	const whole = banded(nodes, order);
	const family = across(line, 'inPlane');
	addStiffness(mesh, family, whole, (node) => node);
	const load = loadOf(mesh, loads);
	const matrix = banded(nodes - 1, order);
	addStiffness(mesh, family, matrix, (node) => node - 1);
	if (factorise(matrix) > 0)
		throw new Refused('The line is unstable in the plane: no side displacement holds it.', {
			remedy: 'Look at the counterweight and the masses on the line.'
		});
	const inner = load.slice(1);
	solve(matrix, inner);
	const y = new Float64Array(nodes);
	y.set(inner, 1);

	let pull = 0;
	for (let j = 0; j <= order; j += 1) pull += whole.entries[j * (order + 1) + order - j]! * y[j]!;
	const anchorForce = load[0]! - pull;
	let peak = 0;
	for (let i = 1; i < nodes; i += 1) if (Math.abs(y[i]!) > Math.abs(y[peak]!)) peak = i;
	return {
		anchorLean: anchorForce / elements[0]!.tension[0]!,
		anchorForce,
		at: (r) => interpolated(mesh, y, r),
		greatest: { radius: radius[peak]!, displacement: y[peak]! }
	};
}

function loadOf(mesh: Mesh, { points, spread }: Loads): Float64Array {
	const { order, elements, radius } = mesh;
	const load = new Float64Array(radius.length);
	const { weights } = lobatto(order);
	elements.forEach(({ half, radius: own }, e) => {
		const middle = (own[0]! + own[order]!) / 2;
		for (const { from, to, force } of spread) {
			if (middle < from || middle > to) continue;
			for (let i = 0; i <= order; i += 1) load[e * order + i]! += weights[i]! * half * force;
		}
	});
	for (const { radius: at, force } of points) {
		const element = elements.findIndex((part) => part.radius[order]! >= at);
		const end = at <= elements[element]!.radius[0]! ? 0 : order;
		load[element * order + end]! += force;
	}
	return load;
}

/** The polynomial of the element, barycentric. */
function interpolated({ order, elements }: Mesh, y: Float64Array, r: number): number {
	const e = Math.max(
		0,
		elements.findIndex(({ radius }) => r <= radius[order]!)
	);
	const { radius } = elements[e]!;
	const { nodes } = lobatto(order);
	let [sum, weight] = [0, 0];
	for (let i = 0; i <= order; i += 1) {
		if (r === radius[i]) return y[e * order + i]!;
		let product = 1;
		for (let j = 0; j <= order; j += 1) if (j !== i) product /= 2 * (nodes[i]! - nodes[j]!);
		const share = product / (r - radius[i]!);
		sum += share * y[e * order + i]!;
		weight += share;
	}
	return sum / weight;
}

/** Loads of climbers, N: a climber going up at v presses the line westwards with 2mωv. */
export const climberLoads = (
	line: Line,
	climbers: readonly { radius: number; mass: number; speed: number }[]
): PointLoad[] =>
	climbers.map(({ radius, mass, speed }) => ({
		radius,
		force: -2 * mass * line.field.omega * speed
	}));

/** Where a load stands on the line. */
export const isOn = (line: Line, radius: number): boolean =>
	radius >= line.pieces[0]!.from && radius <= topOf(line);
