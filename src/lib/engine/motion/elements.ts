/**
 * A line cut into high-order elements with nodes at the Gauss–Lobatto points, so that masses sit on the
 * nodes alone. An edge lies at every boundary of a section, every point mass and the balance radius.
 */
import type { Line } from '../line/line';
import { topOf } from '../line/line';
import { tensionAt, type Hanging, type Stretch } from '../line/tension';
import { lobatto } from '../numerics/lobatto';

export type Element = {
	/** Half its length, m. */
	half: number;
	/** At its nodes, upwards: radius m, tension N, section m². */
	radius: Float64Array;
	tension: Float64Array;
	area: Float64Array;
};

export type Mesh = {
	order: number;
	elements: Element[];
	/** Mass on each node, kg: the line's and the point masses'. The anchor is node 0. */
	mass: Float64Array;
	radius: Float64Array;
};

/** Longest stretch of one element as a ratio of radii, and the largest change of ln T and ln A over it. */
const RATIO = 1.8;
const CHANGE = 2;
const HALVINGS = 30;

export function meshOf(line: Line, { stretches }: Hanging, order: number): Mesh {
	const spans = stretches.flatMap((stretch) => divide(line, stretch));
	const elements = spans.map(({ stretch, from, to }) => elementOf(line, stretch, from, to, order));
	const count = elements.length * order + 1;
	const mass = new Float64Array(count);
	const radius = new Float64Array(count);
	const { weights } = lobatto(order);
	elements.forEach((element, e) => {
		for (let i = 0; i <= order; i += 1) {
			mass[e * order + i]! += weights[i]! * element.half * line.density * element.area[i]!;
			radius[e * order + i] = element.radius[i]!;
		}
	});
	for (const { radius: at, mass: lump } of [
		...line.masses,
		{ radius: topOf(line), mass: line.counterweight }
	]) {
		const node = elements.findIndex(({ radius }) => radius[order]! >= at);
		const end = at <= elements[node]!.radius[0]! ? 0 : order;
		mass[node * order + end]! += lump;
	}
	return { order, elements, mass, radius };
}

type Span = { stretch: Stretch; from: number; to: number };

function divide(line: Line, stretch: Stretch): Span[] {
	const measure = (r: number) => ({
		tension: Math.log(Math.max(tensionAt(line, stretch, r), Number.MIN_VALUE)),
		area: Math.log(stretch.piece.area(r))
	});
	const spans: Span[] = [];
	const part = (from: number, to: number, depth: number) => {
		const [a, b] = [measure(from), measure(to)];
		const short =
			to <= from * RATIO &&
			Math.abs(a.tension - b.tension) <= CHANGE &&
			Math.abs(a.area - b.area) <= CHANGE;
		if (short || depth === 0) spans.push({ stretch, from, to });
		else {
			const middle = to > from * RATIO ? Math.sqrt(from * to) : (from + to) / 2;
			part(from, middle, depth - 1);
			part(middle, to, depth - 1);
		}
	};
	part(stretch.from, stretch.to, HALVINGS);
	return spans;
}

function elementOf(line: Line, stretch: Stretch, from: number, to: number, order: number): Element {
	const { nodes } = lobatto(order);
	const half = (to - from) / 2;
	const radius = nodes.map((x) => from + half * (1 + x));
	radius[order] = to;
	return {
		half,
		radius,
		tension: radius.map((r) =>
			r === stretch.to
				? stretch.upper
				: r === stretch.from
					? stretch.lower
					: tensionAt(line, stretch, r)
		),
		area: radius.map((r) => stretch.piece.area(r))
	};
}
