/** One item in the sheet: its texts parsed once, what it defines and mentions, and how it is evaluated. */
import { evaluateCheck, type CheckFormulas } from './check';
import { fault } from './faults';
import { Formula } from './formula';
import { evaluateGiven } from './given';
import { valueType, type ValueType } from './infer';
import type { SheetItem } from './items';
import { MODEL_FIELDS, evaluateLineModel, fieldsRead, type ModelFormulas } from './line-model';
import { OUTPUTS } from './model-outputs';
import { canonical, symbolTrouble } from './names';
import { parseDigits, shown } from './quantity';
import { parseUnit } from '../quantities/units';
import type { CheckResult, Fault, LineModelResult, Outcome, QuantityResult } from './results';
import type { Scope, Supply } from './scope';
import { symbolTex } from './tex';

export type Body =
	| Omit<QuantityResult, 'uses' | 'usedIn'>
	| Omit<CheckResult, 'uses' | 'usedIn'>
	| Omit<LineModelResult, 'uses' | 'usedIn'>;

export type Evaluated = {
	body: Body;
	/** What stands behind each name that the item defines. */
	supplies: ReadonlyMap<string, Supply>;
};

export type Entry = {
	item: SheetItem;
	/** The symbol as others name it; empty where there is none that can be named. */
	symbol: string;
	/** Names that others may use. A line model defines its symbol as well, which is no quantity. */
	defines: readonly string[];
	/** Names whose definition bears on this item, in order of mention. */
	mentions: readonly string[];
	/** With the sheet's own objection to the symbol (defined twice, in a cycle), if there is one. */
	evaluate(scope: Scope, thinLimit: number, objection: Fault | null): Evaluated;
};

const NOTHING: ReadonlyMap<string, Supply> = new Map();

export function createEntry(item: SheetItem): Entry {
	switch (item.kind) {
		case 'given':
		case 'calculation':
			return quantityEntry(item);
		case 'check':
			return checkEntry(item);
		case 'lineModel':
			return modelEntry(item);
	}
}

/** The symbol of an item, or what is wrong with it. */
function readSymbol(typed: string): { symbol: string; trouble: Fault | null } {
	const symbol = canonical(typed.trim());
	const trouble = symbol === '' ? null : symbolTrouble(symbol);
	if (!trouble) return { symbol, trouble: null };
	const span = { field: 'symbol', from: 0, to: typed.length };
	return {
		symbol: '',
		trouble: fault('bad-symbol', trouble.message, { remedy: trouble.remedy, span })
	};
}

function quantityEntry(item: SheetItem & { kind: 'given' | 'calculation' }): Entry {
	const { symbol, trouble } = readSymbol(item.symbol);
	const formula = item.kind === 'calculation' ? new Formula(item.expression, 'expression') : null;
	const about = {
		id: item.id,
		kind: item.kind,
		symbol: item.symbol.trim(),
		tex: formula?.tex ?? '',
		symbolTex: symbol === '' ? '' : symbolTex(symbol)
	};
	return {
		item,
		symbol,
		defines: symbol === '' ? [] : [symbol],
		mentions: [...new Set(formula?.mentions)],
		evaluate(scope, _thinLimit, objection) {
			const against = trouble ?? objection;
			const { outcome, type } = against
				? { outcome: { state: 'fault', faults: [against] } as Outcome, type: null }
				: evaluateQuantity(item, formula, scope);
			const body: Body = { ...about, outcome };
			return {
				body,
				supplies: symbol === '' ? NOTHING : new Map([[symbol, supply(item.id, outcome, type)]])
			};
		}
	};
}

function evaluateQuantity(
	item: SheetItem & { kind: 'given' | 'calculation' },
	formula: Formula | null,
	scope: Scope
): { outcome: Outcome; type: ValueType | null } {
	if (item.kind === 'given') {
		const unit = parseUnit(item.unit);
		const point = unit.ok && unit.unit.offset !== 0;
		const type = unit.ok ? valueType(unit.unit.dimension, point ? 'point' : 'plain') : null;
		return { outcome: evaluateGiven(item), type };
	}
	const found = formula!.evaluate(scope);
	if (found.state !== 'value') return { outcome: found, type: null };
	const digits = parseDigits(item.digits);
	if (typeof digits !== 'number')
		return { outcome: { state: 'fault', faults: [digits] }, type: null };
	const { si, type, unit: hint } = found;
	return { outcome: shown(si, type, { unit: item.unit, hint, digits }), type };
}

function supply(id: string, outcome: Outcome, type: ValueType | null): Supply {
	if (outcome.state === 'value' && type) {
		const { si, unit, digits } = outcome.quantity;
		return { state: 'value', si, type, unit, digits };
	}
	return { state: 'missing', roots: outcome.state === 'waits' ? outcome.rootIds : [id] };
}

function checkEntry(item: SheetItem & { kind: 'check' }): Entry {
	const formulas: CheckFormulas = {
		left: new Formula(item.left, 'left'),
		right: new Formula(item.right, 'right'),
		tolerance: new Formula(item.relation === 'within' ? item.tolerance : '', 'tolerance'),
		required: new Formula(item.required, 'required')
	};
	return {
		item,
		symbol: '',
		defines: [],
		mentions: [...new Set(Object.values(formulas).flatMap(({ mentions }) => mentions))],
		evaluate: (scope, thinLimit) => ({
			body: { id: item.id, kind: 'check', ...evaluateCheck(item, formulas, scope, thinLimit) },
			supplies: NOTHING
		})
	};
}

function modelEntry(item: SheetItem & { kind: 'lineModel' }): Entry {
	const { symbol, trouble } = readSymbol(item.symbol);
	const formulas = Object.fromEntries(
		MODEL_FIELDS.map((field) => [field, new Formula(item[field], field)])
	) as ModelFormulas;
	const read = fieldsRead(item).map((field) => formulas[field]);
	return {
		item,
		symbol,
		defines: symbol === '' ? [] : [symbol, ...OUTPUTS.map(({ name }) => `${symbol}.${name}`)],
		mentions: [...new Set(read.flatMap(({ mentions }) => mentions))],
		evaluate(scope, _thinLimit, objection) {
			const model = evaluateLineModel(item, formulas, scope, trouble ?? objection);
			const body: Body = { id: item.id, kind: 'lineModel', symbol: item.symbol.trim(), ...model };
			if (symbol === '') return { body, supplies: NOTHING };
			const supplies = model.outputs.map(({ name, outcome }, i): [string, Supply] => [
				`${symbol}.${name}`,
				supply(item.id, outcome, valueType(OUTPUTS[i]!.dimension))
			]);
			return { body, supplies: new Map(supplies) };
		}
	};
}
