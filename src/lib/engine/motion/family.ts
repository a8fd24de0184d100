/**
 * One family of small motions on a mesh, base fixed: its stiffness ∫ s q′² dr + Σ m k q², where s is what
 * resists a slope (T across the line, EA along it) and k the field's stiffness per unit mass.
 */
import type { Line } from '../line/line';
import { add, type Banded } from '../numerics/banded';
import { lobatto } from '../numerics/lobatto';
import type { Element, Mesh } from './elements';

export type Family = {
	/** What resists a slope at the nodes of an element, N. */
	slope: (element: Element) => Float64Array;
	/** Stiffness of the field per unit mass, 1/s². */
	field: (r: number) => number;
};

export const across = (line: Line, k: 'inPlane' | 'outOfPlane'): Family => ({
	slope: ({ tension }) => tension,
	field: line.field[k]
});

/** @param modulus E, Pa */
export const along = (line: Line, modulus: number): Family => ({
	slope: ({ area }) => area.map((a) => modulus * a),
	field: line.field.along
});

/** Adds K to the matrix; node i of the mesh stands at `at(i)`, below 0 where it is held. */
export function addStiffness(
	mesh: Mesh,
	family: Family,
	matrix: Banded,
	at: (node: number) => number
): void {
	const { order, elements, mass, radius } = mesh;
	const { weights, derivative } = lobatto(order);
	const width = order + 1;
	elements.forEach((element, e) => {
		const slope = family.slope(element);
		const first = e * order;
		for (let i = 0; i < width; i += 1) {
			if (at(first + i) < 0) continue;
			for (let j = 0; j <= i; j += 1) {
				if (at(first + j) < 0) continue;
				let sum = 0;
				for (let q = 0; q < width; q += 1)
					sum += weights[q]! * slope[q]! * derivative[q * width + i]! * derivative[q * width + j]!;
				add(matrix, at(first + i), at(first + j), sum / element.half);
			}
		}
	});
	mass.forEach((m, node) => {
		if (at(node) >= 0) add(matrix, at(node), at(node), m * family.field(radius[node]!));
	});
}

/**
 * qᵀ K q from the slopes themselves: the entries of K in short elements are large against the lowest
 * eigenvalues, and would cost their digits.
 */
export function stiffnessOf(mesh: Mesh, family: Family, q: (node: number) => number): number {
	const { order, elements, mass, radius } = mesh;
	const { weights, derivative } = lobatto(order);
	const width = order + 1;
	let sum = 0;
	elements.forEach((element, e) => {
		const slope = family.slope(element);
		const start = q(e * order);
		for (let at = 0; at < width; at += 1) {
			let change = 0;
			// Against the value at the lower end, so that a motion as a whole costs no digits.
			for (let i = 1; i < width; i += 1)
				change += derivative[at * width + i]! * (q(e * order + i) - start);
			sum += (weights[at]! * slope[at]! * change * change) / element.half;
		}
	});
	mass.forEach((m, node) => {
		const value = q(node);
		sum += m * family.field(radius[node]!) * value * value;
	});
	return sum;
}
