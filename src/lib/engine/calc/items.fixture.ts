/** Items in few words, for specs. */
import type { CalculationItem, CheckItem, GivenItem, LineModelItem, SheetItem } from './items';
import type { CheckResult, Fault, ItemResult, LineModelResult, QuantityResult } from './results';
import { createSheet } from './sheet';

export const given = (symbol: string, value: string, unit = '', uncertainty = ''): GivenItem => ({
	id: symbol,
	kind: 'given',
	symbol,
	value,
	unit,
	uncertainty
});

export const calculation = (
	symbol: string,
	expression: string,
	unit = '',
	digits = ''
): CalculationItem => ({ id: symbol, kind: 'calculation', symbol, expression, unit, digits });

export const check = (
	left: string,
	relation: CheckItem['relation'],
	right: string,
	more: Partial<CheckItem> = {}
): CheckItem => ({
	id: 'check',
	kind: 'check',
	left,
	relation,
	right,
	tolerance: '',
	required: '',
	...more
});

/** Case D1 of an Earth line: 1 300 kg/m³ at 50 GPa, 20 t, 100 000 km up. */
export const lineModel = (more: Partial<LineModelItem> = {}): LineModelItem => ({
	id: 'line',
	kind: 'lineModel',
	symbol: 'line',
	body: 'earth',
	j2: 'without',
	gm: '',
	radius: '',
	period: '',
	oblateness: '',
	primaryGm: '',
	distance: '',
	density: '1300 kg/m^3',
	allowable: '100 GPa',
	factorOfSafety: '2',
	baseMode: 'lift',
	lift: '20 t',
	reserve: '',
	area: '',
	top: '100 000 km',
	...more
});

/** Results by id of a sheet with these items. */
export function resultsOf(items: SheetItem[], thinLimit = 0.1): Map<string, ItemResult> {
	const sheet = createSheet();
	sheet.apply({ upsert: items, order: items.map(({ id }) => id), thinLimit });
	return new Map(sheet.results().map((result) => [result.id, result]));
}

export const quantityOf = (items: SheetItem[], id: string) =>
	resultsOf(items).get(id) as QuantityResult;

export const checkOf = (items: SheetItem[], thinLimit?: number) =>
	resultsOf(items, thinLimit).get('check') as CheckResult;

export const modelOf = (items: SheetItem[]) => resultsOf(items).get('line') as LineModelResult;

/** The value of one expression beside these items, in the shown unit; or its first fault. */
export function evaluated(expression: string, others: SheetItem[] = [], unit = '') {
	const { outcome } = quantityOf([...others, calculation('result', expression, unit)], 'result');
	if (outcome.state === 'value')
		return `${round(outcome.quantity.value)} ${outcome.quantity.unit}`.trim();
	if (outcome.state === 'fault') return outcome.faults[0]!;
	return outcome;
}

const round = (value: number) => Number(value.toPrecision(12));

export const faultOf = (expression: string, others: SheetItem[] = [], unit = ''): Fault =>
	evaluated(expression, others, unit) as Fault;
