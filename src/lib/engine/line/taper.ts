/**
 * Constant-stress taper: A(r) = A₀ exp{ρ [U(r) − U(R)]/σ_d}, σ_d = allowable / factor of safety.
 * The counterweight m_c = σ_d A(r_t)/(−g(r_t)) holds the top at r_t > r_s. Exact section, any field; it does not
 * cover a climber above r_s. ρ and A are as deployed, under load.
 *
 * Everything is reckoned in logarithms from the section at r_s, so that a taper of 1e400 is told by its
 * exponent and a taper of 1e33 loses no digits.
 */
import { lnSum, told } from '../numerics/logarithm';
import type { Told } from '../methods/parameter';
import type { Field } from './field';
import { spreadOver } from './spread';
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

export function isAboveSynchronous(field: Field, top: number): boolean {
	return top > field.balance * (1 + 1e-9);
}

/** Sizes lines to one top; what depends on the place and the top alone is kept from line to line. */
export function taperSizer(
	field: Field,
	top: number
): (input: Omit<TaperInput, 'top'>) => TaperResult {
	const spreads = {
		below: spreadOver(field, field.balance, field.base),
		above: spreadOver(field, field.balance, top)
	};
	const depths = { base: field.depth(field.base), top: field.depth(top) };
	return (input) => new TaperResult(field, { ...input, top }, spreads, depths);
}

export const sizeTaper = (field: Field, input: TaperInput): TaperResult =>
	taperSizer(field, input.top)(input);

type Spreads = Record<'below' | 'above', (k: number) => number>;

/** A sized line. Its figures are found when they are read: a study of many lines reads only some. */
export class TaperResult {
	/** Section at the anchor, m². */
	readonly baseArea: number;
	private readonly k: number;
	private readonly lnPeak: number;
	private lnBelow = NaN;
	private lnAbove = NaN;

	constructor(
		private field: Field,
		private input: TaperInput,
		private spreads: Spreads,
		private depths: { base: number; top: number }
	) {
		this.k = input.density / input.designStress;
		this.baseArea = baseSection(field, input);
		this.lnPeak = Math.log(this.baseArea) + this.k * depths.base;
	}

	get designStress(): number {
		return this.input.designStress;
	}
	get taper(): Told {
		return told(this.k * this.depths.base);
	}
	get synchronousArea(): Told {
		return told(this.lnPeak);
	}
	get topArea(): Told {
		return told(this.lnPeak - this.k * this.depths.top);
	}
	get greatestTension(): Told {
		return told(this.lnPeak + Math.log(this.designStress));
	}
	get mass(): Told {
		return told(this.lnMass);
	}
	get massBelow(): Told {
		return told(this.lnMassBelow);
	}
	get massAbove(): Told {
		return told(this.lnMassAbove);
	}
	get counterweight(): Told {
		return told(this.lnCounterweight);
	}
	get total(): Told {
		return told(lnSum(this.lnMass, this.lnCounterweight));
	}
	get lift(): number {
		const { base, designStress, reserve } = this.input;
		if ('lift' in base) return base.lift;
		return (designStress * this.baseArea) / (this.field.g(this.field.base) * (1 + reserve));
	}
	/** m, anchor to top */
	get length(): number {
		return this.input.top - this.field.base;
	}
	get synchronousRadius(): number {
		return this.field.balance;
	}
	get uniformPeak(): number {
		return uniformPeakStress(this.field, this.input.density);
	}
	/** Height above the surface, m. */
	get freeStandingHeight(): number {
		return freeStandingRadius(this.field) - this.field.base;
	}

	private get lnMassBelow(): number {
		if (Number.isNaN(this.lnBelow)) this.lnBelow = this.lnOver('below');
		return this.lnBelow;
	}
	private get lnMassAbove(): number {
		if (Number.isNaN(this.lnAbove)) this.lnAbove = this.lnOver('above');
		return this.lnAbove;
	}
	private lnOver(side: 'below' | 'above'): number {
		return this.lnPeak + Math.log(this.input.density) + Math.log(this.spreads[side](this.k));
	}
	private get lnMass(): number {
		return lnSum(this.lnMassBelow, this.lnMassAbove);
	}
	private get lnCounterweight(): number {
		const { designStress, top } = this.input;
		return this.lnPeak - this.k * this.depths.top + Math.log(designStress / -this.field.g(top));
	}
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
		lnMass: (near, far) =>
			Math.log(density) + lnArea(near) + Math.log(spreadOver(field, near, far)(k)),
		lnCounterweight: (top) => lnArea(top) + Math.log(designStress / -field.g(top))
	};
}

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
