/** A check: left ≤ right, left ≥ right, or left within right ± tolerance. */
import { equal, inWords, isPure } from '../quantities/dimension';
import { fromSi, parseUnit } from '../quantities/units';
import { conditionTex } from './condition-tex';
import { fault } from './faults';
import type { Refreshed } from './entry';
import type { Formula, FormulaOutcome } from './formula';
import type { ValueType } from './value-type';
import type { CheckItem } from './items';
import { joined, type Derived } from './linear';
import { marginKind, marginOf, marginSlopes, verdictOf } from './margin';
import { DEFAULT_DIGITS, shown, uncertaintyIn, withUncertainty } from './quantity';
import type { CheckResult, Fault, Outcome } from './results';
import type { Scope } from './scope';
import type { Slot } from './slot';

export type CheckFormulas = Record<'left' | 'right' | 'tolerance' | 'required', Formula>;
type Body = Omit<CheckResult, 'id' | 'kind' | 'uses' | 'usedIn'>;
type Value = FormulaOutcome & { state: 'value' };
type Figures = { left: Value; right: Value; tolerance: Value | null; required: Value | null };

/** Finds the figure of each part that the check reads. */
export function evaluateParts(
	{ relation }: CheckItem,
	formulas: CheckFormulas,
	scope: Scope
): void {
	for (const name of partsRead(relation)) formulas[name].evaluate(scope);
}

/** The same where the names stand as they stood; null where that does not do. */
export function refreshParts({ relation }: CheckItem, formulas: CheckFormulas): Refreshed | null {
	let moved: Refreshed = 'stayed';
	for (const name of partsRead(relation)) {
		const { blank, outcome } = formulas[name];
		if (blank) continue;
		const now = formulas[name].refresh();
		if (now === null || outcome.state !== 'value') return null;
		if (now === outcome.si) continue;
		outcome.si = now;
		moved = 'moved';
	}
	return moved;
}

const partsRead = (relation: CheckItem['relation']): (keyof CheckFormulas)[] =>
	relation === 'within'
		? ['left', 'right', 'tolerance', 'required']
		: ['left', 'right', 'required'];

/** How the sides and the margin follow from what is named, in the order of `UNCERTAIN`. */
export function linearParts(
	{ relation }: CheckItem,
	formulas: CheckFormulas,
	isUncertain: (slot: Slot) => boolean
): (Derived | null)[] {
	const names = ['left', 'right', 'tolerance'] as const;
	const [left, right, tolerance] = names.map((name) => {
		const { outcome } = formulas[name];
		return outcome.state === 'value' ? outcome.si : 0;
	}) as [number, number, number];
	const slopes = marginSlopes({ relation, left, right, tolerance, required: 0, pure: false });
	const sides = names.map((name) => formulas[name].linear(isUncertain));
	const uncertain = sides.flatMap((side, i) => (side ? [{ side, slope: slopes[i]! }] : []));
	if (uncertain.length === 0) return [null, null, null, null];
	const margin = joined(
		uncertain.map(({ side }) => side),
		uncertain.map(({ slope }) => slope)
	);
	return [...sides, margin];
}

/** Standard uncertainties in SI. */
export type Uncertain = Record<'left' | 'right' | 'tolerance' | 'margin', number | null>;
export const UNCERTAIN = ['left', 'right', 'tolerance', 'margin'] as const;

/** What the check says, from its parts as they were evaluated last. */
export function decideCheck(
	item: CheckItem,
	formulas: CheckFormulas,
	thinLimit: number,
	uncertain: Uncertain
): Body {
	const left = formulas.left.outcome;
	const right = formulas.right.outcome;
	const tolerance = item.relation === 'within' ? formulas.tolerance.outcome : null;
	const required = formulas.required.blank ? null : formulas.required.outcome;
	const waiting: Body = {
		state: 'waits',
		left: alone(left, uncertain.left),
		right: alone(right, uncertain.right),
		tolerance: tolerance && alone(tolerance, uncertain.tolerance),
		required: 0,
		margin: null,
		shortBy: null,
		faults: [left, right, tolerance, required].flatMap((side) =>
			side?.state === 'fault' ? side.faults : []
		),
		tex: conditionTex(item.relation, formulas, null)
	};
	if (left.state !== 'value' || right.state !== 'value') return waiting;
	if (tolerance && tolerance.state !== 'value') return waiting;
	if (required && required.state !== 'value') return waiting;
	const figures = { left, right, tolerance, required };
	return decide(item, formulas, figures, thinLimit, uncertain, waiting);
}

/** A side shown by itself, in a unit of its own. */
function alone(side: FormulaOutcome, uncertainty: number | null): Outcome {
	if (side.state !== 'value') return side;
	const manner = { unit: '', hint: side.unit, digits: digitsOf(side) };
	return withUncertainty(shown(side.si, side.type, manner), uncertainty);
}

const digitsOf = (side: Value) => side.digits ?? DEFAULT_DIGITS;

function decide(
	item: CheckItem,
	formulas: CheckFormulas,
	figures: Figures,
	thinLimit: number,
	uncertain: Uncertain,
	waiting: Body
): Body {
	const { left, right, tolerance, required } = figures;
	const lead = formulas.right.isZero ? left : right;
	const misfit = unfitSide(formulas, figures, lead.type);
	if (misfit) return { ...waiting, faults: [misfit] };

	const unit = commonUnit(lead, left);
	const show = (side: Value, uncertainty: number | null) =>
		withUncertainty(shown(side.si, lead.type, { unit, digits: digitsOf(side) }), uncertainty);
	const sides = {
		left: show(left, uncertain.left),
		right: show(right, uncertain.right),
		tolerance: tolerance && show(tolerance, uncertain.tolerance)
	};
	const given = {
		relation: item.relation,
		left: left.si,
		right: right.si,
		tolerance: tolerance?.si ?? 0,
		required: required?.si ?? 0,
		pure: isPure(lead.type.dimension)
	};
	const unfit = required && unfitRequired(formulas.required, required, given, lead.type);
	if (unfit) return { ...waiting, ...sides, faults: [unfit] };

	const margin = marginOf(given);
	const ratio = margin.kind === 'ratio';
	const state = verdictOf(margin, given, thinLimit);
	const inUnit = (si: number) => difference(si, unit);
	return {
		...waiting,
		...sides,
		state,
		required: ratio ? given.required : inUnit(given.required),
		margin: {
			kind: margin.kind,
			value: ratio ? margin.size : inUnit(margin.size),
			unit: ratio ? '' : unit,
			uncertainty: ratio ? uncertain.margin : spread(uncertain.margin, unit),
			relative: margin.relative
		},
		shortBy: state !== 'fails' ? null : { value: inUnit(margin.shortBy), unit },
		tex: conditionTex(item.relation, formulas, { ...sides, unit })
	};
}

/** The unit in which both sides are shown: that of the right side as long as it has a size of its own. */
function commonUnit(lead: Value, left: Value): string {
	const side = lead.si === 0 ? left : lead;
	const measure = shown(side.si, lead.type, {
		unit: '',
		hint: lead.unit ?? left.unit,
		digits: DEFAULT_DIGITS
	});
	return measure.state === 'value' ? measure.quantity.unit : '';
}

function spread(uncertainty: number | null, unit: string): number | null {
	const parsed = parseUnit(unit);
	return parsed.ok ? uncertaintyIn(uncertainty, parsed.unit) : null;
}

/** A length of the scale, without its zero: 10 K is 10 °C apart. */
function difference(si: number, unit: string): number {
	const parsed = parseUnit(unit);
	return parsed.ok ? fromSi(si, { ...parsed.unit, offset: 0 }) : si;
}

function unfitSide(formulas: CheckFormulas, figures: Figures, type: ValueType): Fault | null {
	const { left, tolerance } = figures;
	if (!formulas.left.isZero && !equal(left.type.dimension, type.dimension)) {
		return fault(
			'dimension',
			`The two sides cannot be compared: the left is ${inWords(left.type.dimension)}, ` +
				`the right ${inWords(figures.right.type.dimension)}.`
		);
	}
	if (!tolerance) return null;
	if (tolerance.si < 0) return fault('domain', 'A tolerance is not negative.');
	if (formulas.tolerance.isZero || equal(tolerance.type.dimension, type.dimension)) return null;
	return fault(
		'dimension',
		`The tolerance is ${inWords(tolerance.type.dimension)}, the sides are ${inWords(type.dimension)}.`
	);
}

function unfitRequired(
	formula: Formula,
	required: Value,
	sides: Parameters<typeof marginKind>[0],
	type: ValueType
): Fault | null {
	if (formula.isZero) return null;
	if (marginKind(sides) === 'ratio') {
		if (!isPure(required.type.dimension)) {
			return fault(
				'dimension',
				`The required margin is ${inWords(required.type.dimension)}; the margin is a pure number.`
			);
		}
		if (required.si > -1) return null;
		return fault('domain', 'A required margin of −1 or less asks for nothing.');
	}
	if (equal(required.type.dimension, type.dimension)) return null;
	return fault(
		'dimension',
		`The required margin is ${inWords(required.type.dimension)}; the margin is ${inWords(type.dimension)}.`
	);
}
