/** The panels of a line's charts: each a quantity over the one height axis. */
import type { LineProfile } from '$lib/engine/calc/results';

export type Panel = {
	key: string;
	title: string;
	symbol: string;
	unit: string;
	/** Values in the unit shown. */
	values: number[];
	/** The section is drawn symmetric about a centre line. */
	symmetric: boolean;
};

export function panelsOf(profile: LineProfile): Panel[] {
	return [
		panel('area', 'Section', 'A', scaled(profile.area, AREAS), true),
		panel('stress', 'Stress', 'σ', scaled(profile.stress, STRESSES), false),
		panel('tension', 'Tension', 'T', scaled(profile.tension, FORCES), false)
	];
}

const panel = (
	key: string,
	title: string,
	symbol: string,
	{ unit, values }: { unit: string; values: number[] },
	symmetric: boolean
): Panel => ({ key, title, symbol, unit, values, symmetric });

type Unit = { unit: string; size: number };

const AREAS: Unit[] = [
	{ unit: 'mm²', size: 1e-6 },
	{ unit: 'cm²', size: 1e-4 },
	{ unit: 'm²', size: 1 }
];
const STRESSES: Unit[] = [
	{ unit: 'MPa', size: 1e6 },
	{ unit: 'GPa', size: 1e9 }
];
const FORCES: Unit[] = [
	{ unit: 'N', size: 1 },
	{ unit: 'kN', size: 1e3 },
	{ unit: 'MN', size: 1e6 },
	{ unit: 'GN', size: 1e9 }
];

/** The largest unit in which the greatest value is at least one. */
function scaled(values: readonly number[], units: Unit[]): { unit: string; values: number[] } {
	const most = values.reduce((max, value) => Math.max(max, Math.abs(value)), 0);
	const { unit, size } = units.findLast((one) => most >= one.size) ?? units[0]!;
	return { unit, values: values.map((value) => value / size) };
}

/** Heights and all panels as CSV, one row a height, in full precision. */
export function profileCsv(profile: LineProfile): string {
	const panels = panelsOf(profile);
	const head = [
		'height, km',
		...panels.map(({ title, unit }) => `${title.toLowerCase()}, ${unit}`)
	];
	const rows = profile.height.map((height, index) =>
		[height / 1000, ...panels.map(({ values }) => values[index]!)].map((value) =>
			String(Number(value.toPrecision(12)))
		)
	);
	// Captions hold commas, so they are quoted (RFC 4180).
	return (
		[head.map((cell) => `"${cell}"`), ...rows].map((row) => row.join(',')).join('\r\n') + '\r\n'
	);
}
