/** Outputs of a method in the units that it names, as rows of a table. */
import type {
	IntegerParameter,
	NumberParameter,
	Parameter,
	Parameters
} from '$lib/engine/methods/parameter';
import { formatFigure, unitText } from '$lib/engine/quantities/format';
import { significant } from '$lib/engine/quantities/number';
import { fromSi, parseUnit } from '$lib/engine/quantities/units';

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

export type Line = { label: string; symbol: string; value: string; unit: string };

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
				unit: value === undefined || value === null ? '' : unitOf(parameter, value)
			}
		];
	});
}

export type Table = { label: string; heads: string[]; rows: string[][]; left: number };

const MOST_ROWS = 200;

/** Lists, each as a table of its first rows. */
export function tablesOf(fields: Parameters, values: Record<string, unknown>): Table[] {
	return Object.entries(fields).flatMap(([name, parameter]): Table[] => {
		const rows = values[name];
		if (parameter.kind === 'group' && rows)
			return tablesOf(parameter.fields, rows as Record<string, unknown>);
		if (parameter.kind !== 'list' || !Array.isArray(rows)) return [];
		const columns: [string, Parameter][] =
			parameter.of.kind === 'group'
				? Object.entries(parameter.of.fields).filter(([, column]) => isPlain(column))
				: [['', parameter.of]];
		return [
			{
				label: parameter.label,
				heads: columns.map(([, column]) =>
					[column.label, unitOf(column)].filter((words) => words !== '').join(', ')
				),
				rows: rows
					.slice(0, MOST_ROWS)
					.map((row) =>
						columns.map(([key, column]) => cellOf(column, key === '' ? row : row[key]))
					),
				left: Math.max(0, rows.length - MOST_ROWS)
			}
		];
	});
}

const isPlain = ({ kind }: Parameter) => !['list', 'group', 'variant'].includes(kind);
