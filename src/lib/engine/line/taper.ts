/**
 * Constant-stress taper: A(r) = A₀ exp{ρ [U(r) − U(R)]/σ_d}, σ_d = allowable / factor of safety.
 * The counterweight m_c = σ_d A(r_t)/(−g(r_t)) holds the top at r_t > r_s. Exact section, any field; it does not
 * cover a climber above r_s. ρ and A are as deployed, under load.
 *
 * Everything is reckoned in logarithms from the section at r_s, so that a taper of 1e400 is told by its
 * exponent and a taper of 1e33 loses no digits.
 */
import { gauss16 } from '../numerics/gauss';
import { lnSum, told } from '../numerics/logarithm';
import type { Told } from '../methods/parameter';
import type { Field } from './field';
import { freeStandingRadius, uniformPeakStress } from './uniform';

export type TaperInput = {
	/** kg/m³ */
	density: number;
	/** Pa */
	designStress: number;
	/** Section at the anchor, m², or the lift, kg, that it must carry. */
	base: { area: number } | { lift: number };
	/** Further lift held in reserve, as a fraction. */
	reserve: number;
	/** Radius of the top from the body's centre, m; beyond r_s (1 + 1e-9). */
	top: number;
};

export type TaperResult = {
	designStress: number;
	taper: Told;
	baseArea: number;
	synchronousArea: Told;
	topArea: Told;
	greatestTension: Told;
	mass: Told;
	massBelow: Told;
	massAbove: Told;
	counterweight: Told;
	total: Told;
	lift: number;
	/** m, anchor to top */
	length: number;
	synchronousRadius: number;
	uniformPeak: number;
	/** Height above the surface, m. */
	freeStandingHeight: number;
};

export function isAboveSynchronous(field: Field, top: number): boolean {
	return top > field.balance * (1 + 1e-9);
}

export function sizeTaper(field: Field, input: TaperInput): TaperResult {
	const { density, designStress, reserve, top, base } = input;
	const baseArea = baseSection(field, input);
	const { lnTaper, lnArea, lnMass, lnCounterweight } = taperShape(field, density, designStress);
	const lnPeak = Math.log(baseArea) + lnTaper;
	const below = lnPeak + lnMass(field.balance, field.base);
	const above = lnPeak + lnMass(field.balance, top);
	const line = lnSum(below, above);
	const counterweight = lnPeak + lnCounterweight(top);

	return {
		designStress,
		taper: told(lnTaper),
		baseArea,
		synchronousArea: told(lnPeak),
		topArea: told(lnPeak + lnArea(top)),
		greatestTension: told(lnPeak + Math.log(designStress)),
		mass: told(line),
		massBelow: told(below),
		massAbove: told(above),
		counterweight: told(counterweight),
		total: told(lnSum(line, counterweight)),
		lift:
			'lift' in base
				? base.lift
				: (designStress * baseArea) / (field.g(field.base) * (1 + reserve)),
		length: top - field.base,
		synchronousRadius: field.balance,
		uniformPeak: uniformPeakStress(field, density),
		freeStandingHeight: freeStandingRadius(field) - field.base
	};
}

/** Section at the anchor, m². */
export function baseSection(field: Field, { base, designStress, reserve }: TaperInput): number {
	if ('area' in base) return base.area;
	return (base.lift * field.g(field.base) * (1 + reserve)) / designStress;
}

/** A taper by the logarithms of its figures over A(r_s), its section at r_s. */
export type TaperShape = {
	/** ρ/σ_d, kg/J */
	k: number;
	/** ln A(r_s)/A₀ */
	lnTaper: number;
	/** ln A(r)/A(r_s) */
	lnArea: (r: number) => number;
	/** The same of the mass, kg/m², between two radii on one side of r_s; `near` is the one nearer to it. */
	lnMass: (near: number, far: number) => number;
	/** The same of m_c, kg/m², of a line that ends at `top`. */
	lnCounterweight: (top: number) => number;
};

export function taperShape(field: Field, density: number, designStress: number): TaperShape {
	const k = density / designStress;
	const lnArea = (r: number) => -k * field.depth(r);
	return {
		k,
		lnTaper: k * field.depth(field.base),
		lnArea,
		lnMass: (near, far) => Math.log(density) + lnArea(near) + Math.log(spread(field, k, near, far)),
		lnCounterweight: (top) => lnArea(top) + Math.log(designStress / -field.g(top))
	};
}

const STEEPEST = 16;
/** Beyond a fall to e⁻⁶⁰ the line has no weight. */
const NO_WEIGHT = 60;
/** A peak narrower than this share of its radius has no radii to be summed over. */
const NARROWEST = 1e-12;

/**
 * ∫ A(r)/A(near) dr, m, of a constant-stress taper between two radii on one side of r_s. The
 * section falls from `near`, the end nearer to r_s, to `far`, so that nothing overflows.
 *
 * Gauss–Legendre on panels chosen beforehand instead of an adaptive rule, so that sizing a line takes some
 * fifty exponentials: a study does it a hundred thousand times. A panel is halved until it is no longer
 * than three times its distance from where U has a pole, and the exponent changes by 16 at the most over
 * it; sixteen nodes then leave less than 1e-11.
 */
export function spread(field: Field, k: number, near: number, far: number): number {
	const { balance, limit, depth, rise } = field;
	const fall = near === balance ? depth : (r: number) => rise(r, near);
	const shape = (r: number) => Math.exp(-k * fall(r));

	function over(from: number, to: number, fallen: number, falls: number): number {
		if (!(fallen <= NO_WEIGHT)) return 0;
		const clear = Math.min(from, to, limit - Math.max(from, to));
		if (falls - fallen <= STEEPEST && Math.abs(to - from) <= 3 * clear)
			return Math.abs(gauss16(shape, from, to));
		if (Math.abs(to - from) <= NARROWEST * near) return widthOfPeak(field, k, near);
		const middle = from + (to - from) / 2;
		if (middle === from || middle === to) return Math.abs(gauss16(shape, from, to));
		const between = k * fall(middle);
		return over(from, middle, fallen, between) + over(middle, to, between, falls);
	}

	const sum = over(near, far, 0, k * fall(far));
	// From the double nearest to r_s to r_s itself, for an end a hair away.
	return near === balance && far !== near ? (sum * field.beyond(far)) / (far - near) : sum;
}

/** The same of a peak too narrow for radii to be told apart in it: half a Gaussian at r_s, else an exponential. */
const widthOfPeak = (field: Field, k: number, near: number) =>
	near === field.balance
		? Math.sqrt(Math.PI / (-2 * k * field.along(near)))
		: 1 / (k * Math.abs(field.g(near)));

export type Profile = {
	height: number[];
	area: number[];
	stress: number[];
	tension: number[];
	synchronous: number;
};

/** The line at graded heights, finer near the base; r_s is among them. Null where a section cannot be told. */
export function profileTaper(field: Field, input: TaperInput): Profile | null {
	const { base, balance: synchronous } = field;
	const { designStress, top, density } = input;
	const baseArea = baseSection(field, input);
	const { lnTaper, lnArea } = taperShape(field, density, designStress);
	const lnPeak = Math.log(baseArea) + lnTaper;
	if (typeof told(2 * lnPeak) !== 'number') return null;
	const graded = (from: number, to: number, count: number) =>
		Array.from({ length: count }, (_, i) => from * (to / from) ** (i / count));
	const radii = [...graded(base, synchronous, 120), ...graded(synchronous, top, 80), top];
	const area = radii.map((r) => Math.exp(lnPeak + lnArea(r)));
	return {
		height: radii.map((r) => r - base),
		area,
		stress: radii.map(() => designStress),
		tension: area.map((a) => a * designStress),
		synchronous: synchronous - base
	};
}
