/** A line model in its first form: the constant-stress taper, with its refusals in words. */
import { equal, inWords, type Dimension } from '../quantities/dimension';
import { formatFigure } from '../quantities/format';
import { profileTaper, sizeTaper, type TaperInput } from '../line/taper';
import { outOfRange } from '../methods/check';
import type { Told } from '../methods/parameter';
import { fault } from './faults';
import type { Formula, FormulaOutcome } from './formula';
import { valueType } from './value-type';
import type { LineModelItem } from './items';
import {
	MODEL_FIELDS,
	MODEL_INPUTS,
	PLACE_FIELDS,
	type ModelField,
	type ModelValues
} from './model-inputs';
import { OUTPUTS } from './model-outputs';
import { fieldAt, placeFields, placeWarnings, siteOf, topRefusal } from './model-place';
import { DEFAULT_DIGITS, shown } from './quantity';
import type { Fault, LineModelResult, ModelOutput, Outcome } from './results';
import type { Scope } from './scope';

export type ModelFormulas = Record<ModelField, Formula>;

type Body = Omit<LineModelResult, 'id' | 'kind' | 'uses' | 'usedIn' | 'symbol'>;

/** The fields that the chosen way of sizing reads. */
export const fieldsRead = (item: LineModelItem): ModelField[] =>
	MODEL_FIELDS.filter((field) =>
		PLACE_ONLY.has(field)
			? placeFields(item).includes(field)
			: field !== (item.baseMode === 'lift' ? 'area' : 'lift')
	);

const PLACE_ONLY: ReadonlySet<string> = new Set(Object.values(PLACE_FIELDS).flat());

export function evaluateLineModel(
	item: LineModelItem,
	formulas: ModelFormulas,
	scope: Scope,
	/** What speaks against the model as a whole: its symbol, or a cycle. */
	objection: Fault | null
): Body {
	const fields = fieldsRead(item);
	const found = fields.map((field) => ({ field, outcome: formulas[field].evaluate(scope) }));
	const faults = found.flatMap(({ field, outcome }) =>
		inputFaults(field, outcome).map((fault) => ({ field: field as string, fault }))
	);
	if (objection)
		faults.unshift({ field: objection.code === 'cycle' ? '' : 'symbol', fault: objection });
	const waits = found.flatMap(({ outcome }) => (outcome.state === 'waits' ? [outcome] : []));
	const inputs = found.map(({ field, outcome }) => ({
		field,
		outcome: inputShown(field, outcome),
		tex: formulas[field].tex
	}));
	const without = (reason: Outcome, more: Partial<Body> = {}): Body => ({
		faults,
		waitsFor: [],
		inputs,
		outputs: OUTPUTS.map((output) => describe(output, reason)),
		profile: null,
		warnings: [],
		...more
	});
	if (faults.length > 0) return without({ state: 'waits', for: [], rootIds: [item.id] });
	if (waits.length > 0) {
		const waitsFor = [...new Set(waits.flatMap((outcome) => outcome.for))];
		const rootIds = [...new Set(waits.flatMap((outcome) => outcome.rootIds))];
		return without({ state: 'waits', for: waitsFor, rootIds }, { waitsFor });
	}
	const values = Object.fromEntries(
		found.map(({ field, outcome }) => [field, outcome.state === 'value' ? outcome.si : null])
	) as ModelValues;
	const site = siteOf(item, values);
	if (!site || !taperInput(values, 0)) return without({ state: 'blank' });
	const refused = (fault: Fault) =>
		without({ state: 'waits', for: [], rootIds: [item.id] }, { faults: [{ field: '', fault }] });
	const field = fieldAt(site);
	if ('code' in field) return refused(field);
	const input = taperInput(values, field.base)!;
	const refusal = topRefusal(site, field, input.top);
	if (refusal) return refused(refusal);
	const result = sizeTaper(field, input);
	return {
		faults,
		waitsFor: [],
		inputs,
		outputs: OUTPUTS.map((output) =>
			describe(output, outcomeOf(output.value(result), output.dimension, output.description))
		),
		profile: profileTaper(field, input),
		warnings: [
			...placeWarnings(site, field, input.top),
			...strengthWarnings(values.factorOfSafety!)
		]
	};
}

type Output = (typeof OUTPUTS)[number];

const describe = ({ name, description, tex }: Output, outcome: Outcome): ModelOutput => ({
	name,
	description,
	symbolTex: tex,
	outcome
});

function outcomeOf(told: Told, dimension: Dimension, what: string): Outcome {
	if (typeof told === 'number') {
		return shown(told, valueType(dimension), { unit: '', digits: DEFAULT_DIGITS });
	}
	const reason = fault(
		'beyond-any-build',
		`Beyond any build: ${what} is 10 to the power ${formatFigure(told.log10, 4)} in SI units.`,
		{ remedy: 'A stronger or lighter material, or another body, brings it down.' }
	);
	return { state: 'fault', faults: [reason] };
}

function inputShown(field: ModelField, outcome: FormulaOutcome): Outcome {
	if (outcome.state !== 'value') return outcome;
	const { si, type, unit, digits } = outcome;
	return shown(si, type, { unit: '', hint: unit, digits: digits ?? DEFAULT_DIGITS });
}

function inputFaults(field: ModelField, outcome: FormulaOutcome): Fault[] {
	if (outcome.state === 'fault') return outcome.faults;
	if (outcome.state !== 'value') return [];
	const { label, dimension, range } = MODEL_INPUTS[field];
	if (!equal(outcome.type.dimension, dimension)) {
		return [
			fault(
				'dimension',
				`The ${label} must be ${inWords(dimension)}; this is ${inWords(outcome.type.dimension)}.`
			)
		];
	}
	const wanted = outOfRange(range, outcome.si);
	return wanted === null ? [] : [fault('refused', `The ${label} must be ${wanted}.`)];
}

/** The figures of the outputs, null for one beyond any build; null where the model refuses these values. */
export function outputsAt(item: LineModelItem, values: ModelValues): (number | null)[] | null {
	const site = siteOf(item, values);
	const field = site && fieldAt(site);
	if (!field || 'code' in field) return null;
	const input = taperInput(values, field.base);
	if (!input || topRefusal(site, field, input.top)) return null;
	const result = sizeTaper(field, input);
	return OUTPUTS.map(({ value }) => {
		const told = value(result);
		return typeof told === 'number' ? told : null;
	});
}

function taperInput(values: ModelValues, radius: number): TaperInput | null {
	const { density, allowable, factorOfSafety, lift, area, reserve, top } = values;
	if (!density || !allowable || !factorOfSafety || !top) return null;
	const base = area ? { area } : lift ? { lift } : null;
	if (!base) return null;
	return {
		density,
		designStress: allowable / factorOfSafety,
		base,
		reserve: reserve ?? 0,
		top: radius + top
	};
}

function strengthWarnings(factorOfSafety: number): string[] {
	return [
		...(factorOfSafety < 1
			? ['The factor of safety is below 1: the design stress is above the allowable.']
			: []),
		'Sized for a climber below the balance point only: one above it adds its outward pull to everything below.'
	];
}
