/** Baselines and comparisons as tables to take away. Figures stand in the unit shown, at full precision. */
import type { Outcome } from '$lib/engine/calc/results';
import { outcomeWords } from '$lib/components/note/figures';
import type { CsvCell } from '$lib/csv';
import { causeWords } from '$lib/components/baseline/cause';
import { numberItems } from '$lib/note/numbering';
import { readingsOf, type Reading } from '$lib/note/readings';
import type { Baseline } from './read';
import type { ComparedSides } from './sides';

export const CAUTION = 'Preliminary design data. Not for construction or operation.';

/** Value, unit, standard uncertainty and, where there is no value, why. */
export function figureCells(outcome: Outcome): CsvCell[] {
	if (outcome.state !== 'value') return [null, '', null, outcomeWords(outcome)];
	const { value, unit, uncertainty } = outcome.quantity;
	return [value, unit, uncertainty, ''];
}

/** The values of a list, each in a row of its own. */
function valueRows(number: string, { symbol, outcome }: Reading): CsvCell[][] {
	if (outcome.state !== 'list') return [];
	const { values, unit, uncertainties } = outcome.list;
	return values.map((value, i) => [
		number,
		`${symbol}[${i + 1}]`,
		'',
		value,
		unit,
		uncertainties?.[i] ?? null,
		'',
		null,
		''
	]);
}

export function quantityTable({ content, results, head, digest }: Baseline): CsvCell[][] {
	const numbers = numberItems(content.items);
	const byId = new Map(results.map((result) => [result.id, result]));
	return [
		[`${head.note.number} baseline ${head.revision}`, `SHA-256 ${digest}`, CAUTION],
		[
			'number',
			'symbol',
			'what it is',
			'value',
			'unit',
			'std uncertainty',
			'without value',
			'margin',
			'state'
		],
		...content.items.flatMap((item) =>
			readingsOf(item, byId.get(item.id)).flatMap((reading) => [
				[
					numbers.get(item.id) ?? '',
					reading.symbol,
					reading.description,
					...figureCells(reading.outcome),
					reading.check?.margin?.value ?? null,
					reading.check?.state ?? ''
				],
				...valueRows(numbers.get(item.id) ?? '', reading)
			])
		)
	];
}

export function comparisonTable(name: string, { comparison }: ComparedSides): CsvCell[][] {
	return [
		[name, CAUTION],
		[
			'number',
			'symbol',
			'what it is',
			'before',
			'unit',
			'after',
			'unit',
			'relative change',
			'by',
			'margin before',
			'state before',
			'margin after',
			'state after'
		],
		...comparison.movements.map(({ number, before, after, change, cause }) => [
			number,
			after.symbol,
			after.description,
			...figureCells(before.outcome).slice(0, 2),
			...figureCells(after.outcome).slice(0, 2),
			change,
			causeWords(cause),
			before.check?.margin?.value ?? null,
			before.check?.state ?? '',
			after.check?.margin?.value ?? null,
			after.check?.state ?? ''
		])
	];
}
