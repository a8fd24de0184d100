/**
 * ∫ A(r)/A(near) dr, m, of a constant-stress taper between two radii on one side of r_s, as a function of
 * k = ρ/σ_d, kg/J. The section falls from `near`, the end nearer to r_s, to `far`, so that nothing overflows.
 *
 * Gauss–Legendre on panels chosen beforehand instead of an adaptive rule, so that sizing a line takes some
 * forty exponentials: a study does it a hundred thousand times, and what does not hang on k is kept. A panel
 * is halved until it is short beside its distance from where U has a pole, and the exponent changes little
 * enough over it; sixteen nodes then leave less than 1e-11.
 */
import { NODES_16, WEIGHTS_16 } from '../numerics/gauss';
import type { Field } from './field';

/** Beyond a fall to e⁻⁶⁰ the line has no weight. */
const NO_WEIGHT = 60;
/** A peak narrower than this share of its radius has no radii to be summed over. */
const NARROWEST = 1e-12;

export function spreadOver(field: Field, near: number, far: number): (k: number) => number {
	const { balance, limit, depth, rise } = field;
	const fall = near === balance ? depth : (r: number) => rise(r, near);

	function over(panel: Panel, k: number, fallen: number, falls: number): number {
		if (!(fallen <= NO_WEIGHT)) return 0;
		if (falls - fallen <= panel.steepest) return sumOver(panel, k, fall);
		if (panel.length <= NARROWEST * near) return widthOfPeak(field, k, near);
		const { middle } = panel;
		if (middle === panel.from || middle === panel.to) return sumOver(panel, k, fall);
		panel.middleFall ??= fall(middle);
		panel.first ??= panelBetween(panel.from, middle, limit);
		panel.second ??= panelBetween(middle, panel.to, limit);
		const between = k * panel.middleFall;
		return over(panel.first, k, fallen, between) + over(panel.second, k, between, falls);
	}

	const whole = panelBetween(near, far, limit);
	const wholeFall = fall(far);
	// From the double nearest to r_s to r_s itself, for an end a hair away.
	const edge = near === balance && far !== near ? field.beyond(far) / (far - near) : 1;
	return (k) => over(whole, k, 0, k * wholeFall) * edge;
}

type Panel = {
	from: number;
	to: number;
	length: number;
	middle: number;
	/** By how much the exponent may change over it; negative where it is too long for any change. */
	steepest: number;
	middleFall: number | null;
	/** At the nodes, two and two as they lie about the middle. */
	falls: Float64Array | null;
	first: Panel | null;
	second: Panel | null;
};

function panelBetween(from: number, to: number, limit: number): Panel {
	const length = Math.abs(to - from);
	const clear = Math.min(from, to, limit - Math.max(from, to));
	return {
		from,
		to,
		length,
		middle: from + (to - from) / 2,
		steepest: length <= 3 * clear ? 16 : length <= 6 * clear ? 2 : -1,
		middleFall: null,
		falls: null,
		first: null,
		second: null
	};
}

function sumOver(panel: Panel, k: number, fall: (r: number) => number): number {
	const falls = (panel.falls ??= fallsAt(panel, fall));
	let sum = 0;
	for (let i = 0; i < 8; i += 1)
		sum += WEIGHTS_16[i]! * (Math.exp(-k * falls[2 * i]!) + Math.exp(-k * falls[2 * i + 1]!));
	return (sum * panel.length) / 2;
}

function fallsAt({ from, to }: Panel, fall: (r: number) => number): Float64Array {
	const half = (to - from) / 2;
	const centre = from + half;
	return Float64Array.from({ length: 16 }, (_, i) => {
		const step = half * NODES_16[i >> 1]!;
		return fall(i % 2 === 0 ? centre - step : centre + step);
	});
}

/** The same of a peak too narrow for radii to be told apart in it: half a Gaussian at r_s, else an exponential. */
const widthOfPeak = (field: Field, k: number, near: number) =>
	near === field.balance
		? Math.sqrt(Math.PI / (-2 * k * field.along(near)))
		: 1 / (k * Math.abs(field.g(near)));
