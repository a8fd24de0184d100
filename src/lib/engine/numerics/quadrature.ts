/**
 * Adaptive Gauss–Kronrod quadrature (7, 15 points; nodes as in QUADPACK's qk15) over given panels.
 * Each panel is halved until its two rules agree, or the cap on evaluations is met.
 */
import { Refused } from '../methods/refused';

const NODES = [
	0.9914553711208126, 0.9491079123427585, 0.8648644233597691, 0.7415311855993945,
	0.5860872354676911, 0.4058451513773972, 0.20778495500789848, 0
];
const KRONROD = [
	0.022935322010529224, 0.06309209262997856, 0.10479001032225019, 0.14065325971552592,
	0.1690047266392679, 0.19035057806478542, 0.20443294007529889, 0.20948214108472782
];
const GAUSS = [0.1294849661688697, 0.27970539148927664, 0.3818300505051189, 0.4179591836734694];

const MOST_PANELS = 4000;

export type Integral = {
	value: number;
	/** Sum of the differences between the two rules: far above the true error where the integrand is smooth. */
	error: number;
};

/**
 * ∫ f from the first to the last of `edges`, which part it where the integrand turns. Differences of f below
 * `noise` count as rounding.
 * @throws Refused when the tolerance is not met within the cap.
 */
export function integrate(
	f: (x: number) => number,
	edges: readonly number[],
	relativeTolerance: number,
	noise = 0
): Integral {
	const open = edges.slice(1).map((to, i) => panel(f, edges[i]!, to));
	let done: Integral = { value: 0, error: 0 };
	let count = open.length;
	const scale = open.reduce((sum, { value }) => sum + Math.abs(value), 0);
	while (open.length > 0) {
		const { from, to, value, error } = open.pop()!;
		// A share of the whole tolerance, so that panels of no weight are not halved for nothing.
		const enough = Math.max(
			relativeTolerance * Math.max(Math.abs(value), scale / 50),
			noise * (to - from)
		);
		if (error <= enough || to - from <= Math.abs(from) * 1e-14) {
			done = { value: done.value + value, error: done.error + error };
			continue;
		}
		count += 2;
		if (count > MOST_PANELS)
			throw new Refused('The integral did not converge.', { code: 'not-converged' });
		const middle = (from + to) / 2;
		open.push(panel(f, from, middle), panel(f, middle, to));
	}
	return done;
}

/** Edges that halve from `far` towards `near` until they are as narrow as `width`, in ascending order. */
export function gradedTowards(near: number, far: number, width: number): number[] {
	const halvings = Math.max(
		1,
		Math.min(60, 2 + Math.ceil(Math.log2(Math.abs(far - near) / width)))
	);
	const edges = [near];
	for (let i = halvings; i >= 0; i -= 1) edges.push(near + (far - near) / 2 ** i);
	return far < near ? edges.reverse() : edges;
}

function panel(f: (x: number) => number, from: number, to: number) {
	const centre = (from + to) / 2;
	const half = (to - from) / 2;
	const middle = f(centre);
	let kronrod = KRONROD[7]! * middle;
	let gauss = GAUSS[3]! * middle;
	for (let i = 0; i < 7; i += 1) {
		const step = half * NODES[i]!;
		const pair = f(centre - step) + f(centre + step);
		kronrod += KRONROD[i]! * pair;
		if (i % 2 === 1) gauss += GAUSS[(i - 1) / 2]! * pair;
	}
	return { from, to, value: kronrod * half, error: Math.abs(kronrod - gauss) * half };
}
