/** Outputs of a method in the units that it names, as rows of a table. */
import type {
	IntegerParameter,
	NumberParameter,
	Parameter,
	Parameters
} from '$lib/engine/methods/parameter';
import type { CsvCell } from '$lib/csv';
import { formatFigure, unitText } from '$lib/engine/quantities/format';
import { significant } from '$lib/engine/quantities/number';
import { fromSi, parseUnit } from '$lib/engine/quantities/units';
import { seriesOf, type Series } from './series';

const DIGITS = 6;

/** One figure or word, without its unit. */
export function cellOf(parameter: Parameter, value: unknown): string {
	if (value === undefined || value === null) return 'none';
	if (parameter.kind === 'choice') return parameter.options[String(value)] ?? String(value);
	if (typeof value === 'boolean') return value ? 'yes' : 'no';
	if (parameter.kind === 'open') return JSON.stringify(value);
	if (typeof value === 'object' && 'log10' in value)
		return `10 to the power ${formatFigure(Number(value.log10), DIGITS)}, beyond any build`;
	if (typeof value !== 'number') return String(value);
	if (parameter.kind === 'integer') return String(value);
	const unit = parseUnit('unit' in parameter ? parameter.unit : '');
	return formatFigure(unit.ok ? fromSi(value, unit.unit) : value, DIGITS);
}

/** A bound or a default as short as it was written. */
export function figureOf(parameter: Parameter, value: unknown): string {
	if (parameter.kind !== 'number' || typeof value !== 'number') return cellOf(parameter, value);
	const unit = parseUnit(parameter.unit);
	const figure = unit.ok ? fromSi(value, unit.unit) : value;
	return formatFigure(figure, significant(String(Number(figure.toPrecision(10)))));
}

/** The bounds of a number, in the unit that it is shown in. */
export function rangeWords(parameter: NumberParameter | IntegerParameter): string[] {
	const { above, least, below, most } = parameter.range;
	const shown = (bound: number) =>
		[figureOf(parameter, bound), bound === 0 ? '' : unitOf(parameter)]
			.filter((word) => word !== '')
			.join('\u202f');
	return [
		...(above !== undefined ? [`above ${shown(above)}`] : []),
		...(least !== undefined ? [`${shown(least)} or more`] : []),
		...(below !== undefined ? [`below ${shown(below)}`] : []),
		...(most !== undefined ? [`${shown(most)} or less`] : [])
	];
}

export const unitOf = (parameter: Parameter, value?: unknown): string => {
	if (!('unit' in parameter)) return '';
	const beyond = typeof value === 'object' && value !== null;
	// A power of ten is told in SI.
	return beyond ? 'in SI units' : unitText(parameter.unit);
};

export type Line = { label: string; symbol: string; value: string; unit: string; full: CsvCell };

/** Single figures, those of groups included. */
export function linesOf(fields: Parameters, values: Record<string, unknown>, before = ''): Line[] {
	return Object.entries(fields).flatMap(([name, parameter]): Line[] => {
		const value = values[name];
		const label = before === '' ? parameter.label : `${before}: ${parameter.label}`;
		if (parameter.kind === 'list') return [];
		if (parameter.kind === 'group')
			return value ? linesOf(parameter.fields, value as Record<string, unknown>, label) : [];
		if (parameter.kind === 'variant') {
			const parts = value as Record<string, unknown> & { kind: string };
			const one = parameter.cases[parts.kind];
			return one ? linesOf(one.fields, parts, `${label}, ${one.label}`) : [];
		}
		return [
			{
				label,
				symbol: parameter.symbol ?? '',
				value: cellOf(parameter, value),
				full: csvCell(parameter, value),
				unit: value === undefined || value === null ? '' : unitOf(parameter, value)
			}
		];
	});
}

export type Table = {
	label: string;
	heads: string[];
	/** The first rows, as text. */
	rows: string[][];
	left: number;
	/** All rows under their heads, in full precision. */
	csv: () => CsvCell[][];
	series: Series | null;
};

const MOST_ROWS = 200;

/** Lists, each as a table of its first rows. */
export function tablesOf(fields: Parameters, values: Record<string, unknown>): Table[] {
	return Object.entries(fields).flatMap(([name, parameter]): Table[] => {
		const rows = values[name];
		if (parameter.kind === 'group' && rows)
			return tablesOf(parameter.fields, rows as Record<string, unknown>);
		if (parameter.kind !== 'list' || !Array.isArray(rows)) return [];
		const columns = columnsOf(parameter.of, rows);
		const heads = columns.map(({ label, parameter: column }) =>
			[label, unitOf(column)].filter((words) => words !== '').join(', ')
		);
		return [
			{
				label: parameter.label,
				heads,
				rows: rows
					.slice(0, MOST_ROWS)
					.map((row) => columns.map(({ parameter: one, of }) => cellOf(one, of(row)))),
				left: Math.max(0, rows.length - MOST_ROWS),
				csv: () => [
					heads,
					...rows.map((row) => columns.map(({ parameter: one, of }) => csvCell(one, of(row))))
				],
				series: seriesOf(parameter, rows)
			}
		];
	});
}

type Column = { label: string; parameter: Parameter; of: (row: unknown) => unknown };

const partOf = (row: unknown, key: string | number) =>
	(row as Record<string | number, unknown> | null | undefined)?.[key];

/** The parts of a row side by side: those of groups, and the values of short lists, one column each. */
function columnsOf(parameter: Parameter, rows: readonly unknown[]): Column[] {
	const below = (key: string | number, part: Parameter): Column[] =>
		columnsOf(
			part,
			rows.map((row) => partOf(row, key))
		).map((column) => ({
			...column,
			label: part.kind === 'group' ? `${part.label}: ${column.label}` : column.label,
			of: (row) => column.of(partOf(row, key))
		}));
	if (parameter.kind === 'group')
		return Object.entries(parameter.fields).flatMap(([key, part]) => below(key, part));
	if (parameter.kind === 'list') {
		const longest = rows.reduce<number>(
			(most, row) => Math.max(most, Array.isArray(row) ? row.length : 0),
			0
		);
		if (longest > MOST_VALUES) return [];
		return Array.from({ length: longest }, (_, i) =>
			below(i, parameter.of).map((column) => ({ ...column, label: `${column.label} ${i + 1}` }))
		).flat();
	}
	return parameter.kind === 'variant'
		? []
		: [{ label: parameter.label, parameter, of: (row) => row }];
}

/** Longer lists in a row would be a table of their own. */
const MOST_VALUES = 20;

/** A figure in the unit of its column, in full precision. */
function csvCell(parameter: Parameter, value: unknown): CsvCell {
	if (value === undefined || value === null) return null;
	if (typeof value !== 'number') return cellOf(parameter, value);
	const unit = parseUnit('unit' in parameter ? parameter.unit : '');
	return Number((unit.ok ? fromSi(value, unit.unit) : value).toPrecision(12));
}

/** Single figures in full precision. */
export const linesCsv = (lines: readonly Line[]): CsvCell[][] => [
	['result', 'symbol', 'value', 'unit'],
	...lines.map(({ label, symbol, full, unit }) => [label, symbol, full, unit])
];
