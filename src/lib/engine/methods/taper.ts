/** Constant-stress taper: sections, masses and counterweight of a line sized for one stress. */
import {
	givenRadius,
	massOf,
	radiusOf,
	stressOf,
	toldArea,
	toldForce,
	toldMass
} from '../line/parameters';
import type { Field } from '../line/field';
import { refuseTop, sizingInputs, sizingWarnings, taperInputOf, type Sizing } from '../line/sizing';
import { fieldOf } from '../line/site';
import { taperShape, taperSizer, type TaperResult } from '../line/taper';
import { topWithin, tradeCurve } from '../line/trade';
import { lnOf, told as toldOf } from '../numerics/logarithm';
import { AREA, PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity, told } from './parameter';
import { refuseInput } from './refused';

export const taper = defineMethod({
	name: 'taper',
	title: 'Constant-stress taper',
	summary:
		'Sizes a line whose section grows so that the stress is the same everywhere: taper ratio, sections, mass of line and counterweight, and how they follow the radius of the top.',
	subject: 'line',
	inputs: {
		...sizingInputs,
		rangeFrom: {
			...givenRadius('lowest top of the trade curve', 'r_t'),
			optional: true,
			help: 'A tenth of the way from the balance radius to the range’s top where left out.'
		},
		rangeTop: {
			...givenRadius('highest top of the trade curve', 'r_t'),
			optional: true,
			help: 'The top where left out.'
		},
		rangePoints: integer({
			label: 'points of the trade curve',
			range: { least: 2, most: 5000 },
			default: 50,
			help: 'At equal steps of the radius.'
		}),
		within: quantity({
			label: 'how near the total is to come to that at the range’s top, as a fraction',
			dimension: PURE,
			unit: '%',
			range: { least: 1e-6, most: 100 },
			default: 0.01
		})
	},
	outputs: {
		designStress: stressOf('design stress, allowable over factor of safety', 'σ_d'),
		taper: told({
			label: 'taper ratio, section at the balance radius over that at the anchor',
			symbol: 'A(r_s)/A₀',
			dimension: PURE,
			unit: ''
		}),
		baseArea: quantity({
			label: 'section at the anchor',
			symbol: 'A₀',
			dimension: AREA,
			unit: 'mm^2'
		}),
		balanceArea: toldArea('section at the balance radius', 'A(r_s)'),
		topArea: toldArea('section at the top', 'A(r_t)'),
		greatestTension: toldForce('greatest tension, at the balance radius', 'T_max'),
		lineMass: toldMass('mass of the line', 'm'),
		massBelow: toldMass('mass of the line below the balance radius', 'm_b'),
		massAbove: toldMass('mass of the line above it', 'm_a'),
		counterweight: toldMass('counterweight', 'm_c'),
		total: toldMass('line and counterweight, lift excluded', 'm_tot'),
		lift: {
			...massOf('lift that the anchor section carries', 'm_lift'),
			help: 'σ_d A₀/(g(R)(1 + reserve)).'
		},
		totalPerLift: told({ label: 'total over lift', dimension: PURE, unit: '' }),
		length: radiusOf('length, anchor to top', 'L'),
		balanceRadius: radiusOf('balance radius', 'r_s'),
		topWithin: {
			...radiusOf('least radius of the top at which the total is that near', 'r_t'),
			help: 'The total only falls with the radius of the top: a least total exists only with a cost per length.'
		},
		trade: list({
			label: 'trade curve',
			fewest: 2,
			most: 5000,
			of: group({
				label: 'top',
				fields: {
					top: radiusOf('radius of the top', 'r_t'),
					line: toldMass('line', 'm'),
					counterweight: toldMass('counterweight', 'm_c'),
					total: toldMass('line and counterweight', 'm_tot')
				}
			})
		})
	},
	sources: [
		'A(r) = A₀ exp{ρ [U(r) − U(R)]/σ_d}: P. K. Aravind, Am. J. Phys. 75 (2007) 125',
		'm_c = σ_d A(r_t)/(−g(r_t)), balance of the counterweight'
	],
	validity:
		'Straight line in the plane of the equator at rest in the co-rotating frame; exact section; density and section as deployed, under load; one climber, below the balance radius.',
	leftOut: [
		'climbers above the balance radius',
		'joints and coatings',
		'the air and elasticity',
		'on one body all other bodies'
	],
	refuses: [
		'a balance radius inside the body',
		'a top at or below r_s (1 + 1e-9), or at the centre of the primary',
		'figures above 1e300 are told by their decimal logarithm'
	],
	caution:
		'Sizing is no release for use: factors of safety and allowables follow the governing standard, and a line that carries people or passes over them is for local codes and licensed practice to judge.',
	prepare(input, varies) {
		if (varies('site')) return null;
		const field = fieldOf(input.site);
		const size = varies('top') ? null : taperSizer(field, input.top);
		return (now) => outputsOf(field, size, now);
	},
	run(input) {
		const field = fieldOf(input.site);
		const outputs = outputsOf(field, null, input);
		return {
			outputs,
			get warnings() {
				return sizingWarnings(input, field, outputs.balanceArea);
			}
		};
	}
});

type Input = Sizing & {
	rangeFrom?: number | undefined;
	rangeTop?: number | undefined;
	rangePoints: number;
	within: number;
};

/** @throws Refused where no line can end at one of the tops. */
function outputsOf(field: Field, size: ReturnType<typeof taperSizer> | null, input: Input) {
	refuseTop(field, 'top', input.top);
	const rangeTop = input.rangeTop ?? input.top;
	refuseTop(field, 'rangeTop', rangeTop);
	const rangeFrom = input.rangeFrom ?? field.balance + 0.1 * (rangeTop - field.balance);
	if (input.rangeFrom !== undefined) refuseTop(field, 'rangeFrom', rangeFrom);
	if (rangeFrom >= rangeTop)
		refuseInput('rangeFrom', 'The trade curve’s lowest top is not below its highest.');
	const sized = (size ?? taperSizer(field, input.top))(taperInputOf(input));
	return new TaperOutputs(field, sized, { ...input, rangeFrom, rangeTop });
}

/** Found when they are read: a study of the masses sizes many lines and needs no trade curve. */
class TaperOutputs {
	constructor(
		private field: Field,
		private sized: TaperResult,
		private input: Input & { rangeFrom: number; rangeTop: number }
	) {}

	get designStress() {
		return this.sized.designStress;
	}
	get taper() {
		return this.sized.taper;
	}
	get baseArea() {
		return this.sized.baseArea;
	}
	get balanceArea() {
		return this.sized.synchronousArea;
	}
	get topArea() {
		return this.sized.topArea;
	}
	get greatestTension() {
		return this.sized.greatestTension;
	}
	get lineMass() {
		return this.sized.mass;
	}
	get massBelow() {
		return this.sized.massBelow;
	}
	get massAbove() {
		return this.sized.massAbove;
	}
	get counterweight() {
		return this.sized.counterweight;
	}
	get total() {
		return this.sized.total;
	}
	get lift() {
		return this.sized.lift;
	}
	get totalPerLift() {
		return toldOf(lnOf(this.total) - Math.log(this.lift));
	}
	get length() {
		return this.sized.length;
	}
	get balanceRadius() {
		return this.field.balance;
	}
	get topWithin() {
		const { designStress } = this;
		const { rangeTop, within: share } = this.input;
		return topWithin(this.field, this.shape, { designStress, rangeTop, share });
	}
	get trade() {
		const { rangeFrom, rangeTop, rangePoints } = this.input;
		const step = (rangeTop - rangeFrom) / (rangePoints - 1);
		const tops = Array.from({ length: rangePoints }, (_, i) => rangeFrom + i * step);
		tops[tops.length - 1] = rangeTop;
		const lnPeak = Math.log(this.baseArea) + this.shape.lnTaper;
		return tradeCurve(this.field, this.shape, lnPeak, tops);
	}

	private get shape() {
		return taperShape(this.field, this.input.density, this.designStress);
	}
}
