/**
 * Adaptive Gauss–Kronrod quadrature (7, 15 points; nodes as in QUADPACK's qk15) over given panels.
 * Each panel is halved until its two rules agree, or the cap on evaluations is met.
 */
const NODES = [
	0.991455371120812639206854697526329, 0.949107912342758524526189684047851,
	0.864864423359769072789712788640926, 0.741531185599394439863864773280788,
	0.58608723546769113029414469325926, 0.405845151377397166906606412076961,
	0.207784955007898467600689403773245, 0
];
const KRONROD = [
	0.02293532201052922496373200805897, 0.063092092629978553290700663189204,
	0.104790010322250183839876322541518, 0.140653259715525918745189590510238,
	0.16900472663926790282658342659855, 0.190350578064785409913256402421014,
	0.204432940075298892414161999234649, 0.209482141084727828012999174891714
];
const GAUSS = [
	0.129484966168869693270611432679082, 0.27970539148927666790146777142378,
	0.381830050505118944950369775488975, 0.417959183673469387755102040816327
];

const MOST_PANELS = 4000;

export type Integral = {
	value: number;
	/** Sum of the differences between the two rules: far above the true error where the integrand is smooth. */
	error: number;
};

/**
 * ∫ f from the first to the last of `edges`, which part it where the integrand turns.
 * @throws RangeError when the tolerance is not met within the cap.
 */
export function integrate(
	f: (x: number) => number,
	edges: readonly number[],
	relativeTolerance: number
): Integral {
	const open = edges.slice(1).map((to, i) => panel(f, edges[i]!, to));
	let done: Integral = { value: 0, error: 0 };
	let count = open.length;
	const scale = open.reduce((sum, { value }) => sum + Math.abs(value), 0);
	while (open.length > 0) {
		const { from, to, value, error } = open.pop()!;
		// A share of the whole tolerance, so that panels of no weight are not halved for nothing.
		const enough = relativeTolerance * Math.max(Math.abs(value), scale / 50);
		if (error <= enough || to - from <= Math.abs(from) * 1e-14) {
			done = { value: done.value + value, error: done.error + error };
			continue;
		}
		count += 2;
		if (count > MOST_PANELS) throw new RangeError('The integral did not converge.');
		const middle = (from + to) / 2;
		open.push(panel(f, from, middle), panel(f, middle, to));
	}
	return done;
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
