/**
 * Constant-stress taper: A(r) = A₀ exp{ρ [U(r) − U(R)]/σ_d}, σ_d = allowable / factor of safety.
 * The counterweight m_c = σ_d A(r_t)/(−g(r_t)) holds the top at r_t > r_s. Exact section, one body; it does not
 * cover a climber above r_s. ρ and A are as deployed, under load.
 *
 * Everything is reckoned in logarithms from the section at r_s, so that a taper of 1e400 is told by its
 * exponent and a taper of 1e33 loses no digits.
 */
import { integrate } from '../numerics/quadrature';
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
	lift: Told;
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
	const { density, designStress, reserve, top } = input;
	const { base, balance: synchronous } = field;
	const k = density / designStress;
	const liftWeight = field.g(base) * (1 + reserve);
	const baseArea = baseSection(field, input);
	const lnTaper = k * field.rise(base, synchronous);
	const lnArea = Math.log(baseArea) + lnTaper;
	const lnTop = lnArea - k * field.rise(top, synchronous);
	// Section over that at r_s: at most 1, so no panel overflows.
	const shape = (r: number) => Math.exp(-k * field.rise(r, synchronous));
	const lnScale = lnArea + Math.log(density);
	const below = lnScale + lnLengthwise(shape, synchronous, base);
	const above = lnScale + lnLengthwise(shape, synchronous, top);
	const counterweight = lnTop + Math.log(designStress / -field.g(top));
	const line = lnSum(below, above);

	return {
		designStress,
		taper: told(lnTaper),
		baseArea,
		synchronousArea: told(lnArea),
		topArea: told(lnTop),
		greatestTension: told(lnArea + Math.log(designStress)),
		mass: told(line),
		massBelow: told(below),
		massAbove: told(above),
		counterweight: told(counterweight),
		total: told(lnSum(line, counterweight)),
		lift: 'lift' in input.base ? input.base.lift : (designStress * baseArea) / liftWeight,
		length: top - base,
		synchronousRadius: synchronous,
		uniformPeak: uniformPeakStress(field, density),
		freeStandingHeight: freeStandingRadius(field) - base
	};
}

/** Section at the anchor, m². */
export function baseSection(field: Field, { base, designStress, reserve }: TaperInput): number {
	if ('area' in base) return base.area;
	return (base.lift * field.g(field.base) * (1 + reserve)) / designStress;
}

/**
 * ln ∫ shape dr between r_s and one end. Panels halve towards r_s, where the shape peaks however steep
 * the taper; with more than a few hundred decades of taper the rest of the line has no weight.
 */
function lnLengthwise(shape: (r: number) => number, synchronous: number, end: number): number {
	const edges = [synchronous];
	for (let halvings = 40; halvings >= 0; halvings -= 1) {
		edges.push(synchronous + (end - synchronous) / 2 ** halvings);
	}
	const { value } = integrate(shape, end < synchronous ? edges.reverse() : edges, 1e-12);
	return Math.log(Math.max(value, Number.MIN_VALUE));
}

const lnSum = (a: number, b: number) => Math.max(a, b) + Math.log1p(Math.exp(-Math.abs(a - b)));

const LARGEST_LN = 300 * Math.LN10;

const told = (ln: number): Told => (ln <= LARGEST_LN ? Math.exp(ln) : { log10: ln / Math.LN10 });

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
	const { density, designStress, top } = input;
	const baseArea = baseSection(field, input);
	const k = density / designStress;
	if (Math.log(baseArea) + k * field.rise(base, synchronous) > LARGEST_LN / 2) return null;
	const graded = (from: number, to: number, count: number) =>
		Array.from({ length: count }, (_, i) => from * (to / from) ** (i / count));
	const radii = [...graded(base, synchronous, 120), ...graded(synchronous, top, 80), top];
	const area = radii.map((r) => baseArea * Math.exp(k * field.rise(base, r)));
	return {
		height: radii.map((r) => r - base),
		area,
		stress: radii.map(() => designStress),
		tension: area.map((a) => a * designStress),
		synchronous: synchronous - base
	};
}
