/** Lists that stand over a radius, as panels on one axis: the line as it stands. */
import type { ListParameter, NumberParameter, Parameter } from '$lib/engine/methods/parameter';
import { AREA, LENGTH, equal } from '$lib/engine/quantities/dimension';
import { unitText } from '$lib/engine/quantities/format';
import { fromSi, parseUnit } from '$lib/engine/quantities/units';
import type { Panel } from '../charts/panels';

export type Series = {
	/** What the axis is, e.g. "radius, km". */
	axis: string;
	/** Rising, in the unit of the axis. */
	at: number[];
	panels: Panel[];
};

const FEWEST = 3;
/** More than a screen has rows of pixels. */
const MOST_POINTS = 1500;

type Row = Record<string, unknown>;

/** Null where the list does not rise along a length, or has no figures over it. */
export function seriesOf({ of }: ListParameter, rows: readonly unknown[]): Series | null {
	if (of.kind !== 'group' || rows.length < FEWEST) return null;
	const [[key, axis], ...others] = Object.entries(of.fields) as [
		[string, Parameter],
		...[string, Parameter][]
	];
	if (!isLength(axis)) return null;
	const hasEnds = 'to' in of.fields;
	const points = hasEnds ? bothEnds(rows as Row[], key) : (rows as Row[]);
	const step = Math.ceil(points.length / MOST_POINTS);
	const kept = points.filter((_, i) => i % step === 0 || i === points.length - 1);
	const at = inUnit(axis, kept, key);
	if (!at || at.some((value, i) => i > 0 && value < at[i - 1]!)) return null;
	const panels = others.flatMap(([name, parameter]): Panel[] => {
		// Where a section ends is no figure over where it begins.
		if (!isFigure(parameter) || name === 'to') return [];
		const values = inUnit(parameter, kept, name);
		const symmetric = parameter.dimension !== null && equal(parameter.dimension, AREA);
		const { label: title, symbol = '' } = parameter;
		return values
			? [{ key: name, title, symbol, unit: unitText(parameter.unit), values, symmetric }]
			: [];
	});
	const along = hasEnds ? 'radius' : axis.label;
	return panels.length > 0 ? { axis: `${along}, ${unitText(axis.unit)}`, at, panels } : null;
}

/** What holds from one radius to another stands at both, so that it is drawn as a step. */
const bothEnds = (rows: readonly Row[], from: string): Row[] =>
	rows.flatMap((row) => [row, { ...row, [from]: row.to }]);

type Figure = Extract<Parameter, { kind: 'number' | 'told' }>;

const isFigure = (parameter: Parameter): parameter is Figure =>
	parameter.kind === 'number' || parameter.kind === 'told';

const isLength = (parameter: Parameter): parameter is NumberParameter =>
	parameter.kind === 'number' && parameter.dimension !== null && equal(parameter.dimension, LENGTH);

/** Null where a row has no figure, or one beyond any build. */
function inUnit({ unit }: Figure, rows: readonly Row[], key: string): number[] | null {
	const parsed = parseUnit(unit);
	const values = rows.map((row) => row[key]);
	if (!parsed.ok || !values.every((value) => typeof value === 'number')) return null;
	return values.map((value) => fromSi(value as number, parsed.unit));
}
