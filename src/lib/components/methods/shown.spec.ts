import { describe, expect, it } from 'vitest';
import { group, list, quantity, text } from '$lib/engine/methods/parameter';
import { LENGTH, PRESSURE } from '$lib/engine/quantities/dimension';
import { linesCsv, linesOf, tablesOf } from './shown';

const radius = quantity({ label: 'radius', dimension: LENGTH, unit: 'km' });
const stress = quantity({ label: 'stress', symbol: 'σ', dimension: PRESSURE, unit: 'GPa' });
const rows = (fields: Parameters<typeof tablesOf>[0]) =>
	list({ label: 'rows', fewest: 0, most: 1e5, of: group({ label: 'row', fields }) });

describe('a list that comes out', () => {
	it('is a table of its first rows, and whole as CSV in full precision', () => {
		const many = Array.from({ length: 250 }, (_, i) => ({ radius: i * 1000, stress: 1e9 / 3 }));
		const [table] = tablesOf({ rows: rows({ radius, stress }) }, { rows: many });
		expect(table).toMatchObject({ heads: ['radius, km', 'stress, GPa'], left: 50 });
		expect(table!.rows[1]).toEqual(['1.00000', '0.333333']);
		expect(table!.csv()).toHaveLength(251);
		expect(table!.csv()[2]).toEqual([1, 0.333333333333]);
	});

	it('over a rising radius is a series as well, thinned for the screen', () => {
		const many = Array.from({ length: 5000 }, (_, i) => ({ radius: i * 1000, stress: i * 1e6 }));
		const series = tablesOf({ rows: rows({ radius, stress }) }, { rows: many })[0]!.series!;
		expect(series.axis).toBe('radius, km');
		expect(series.at.length).toBeLessThanOrEqual(1501);
		expect([series.at[0], series.at.at(-1)]).toEqual([0, 4999]);
		expect(series.panels[0]).toMatchObject({ unit: 'GPa' });
		expect(series.panels[0]!.values.at(-1)).toBeCloseTo(4.999, 12);
	});

	it('of sections has a step where one ends and the next begins', () => {
		const sections = [0, 1, 2].map((n) => ({
			from: n * 1000,
			to: (n + 1) * 1000,
			stress: (n + 1) * 1e9
		}));
		const fields = { from: radius, to: radius, stress };
		const { series } = tablesOf({ rows: rows(fields) }, { rows: sections })[0]!;
		expect(series!.at).toEqual([0, 1, 1, 2, 2, 3]);
		expect(series!.panels.map(({ values }) => values)).toEqual([[1, 1, 2, 2, 3, 3]]);
	});

	it('is no series where it does not rise', () => {
		const up = [3, 2, 1].map((r) => ({ radius: r, stress: 1 }));
		const [table] = tablesOf({ rows: rows({ radius, stress }) }, { rows: up });
		expect(table!.series).toBeNull();
	});

	it('has the parts of groups and the values of short lists side by side', () => {
		const way = group({ label: 'outward', fields: { stress } });
		const at = list({ label: 'values', fewest: 0, most: 2, of: radius });
		const why = text({ label: 'why', longest: 9 });
		const [table] = tablesOf(
			{ rows: rows({ at, way, why }) },
			{
				rows: [
					{ at: [1000, 2000], why: 'x' },
					{ at: [], way: { stress: 1e9 } }
				]
			}
		);
		expect(table!.csv()).toEqual([
			['radius 1, km', 'radius 2, km', 'outward: stress, GPa', 'why'],
			[1, 2, null, 'x'],
			[null, null, 1, null]
		]);
	});
});

it('single figures go to CSV in full precision', () => {
	const lines = linesOf({ stress }, { stress: 1e9 / 3 });
	expect(linesCsv(lines)).toEqual([
		['result', 'symbol', 'value', 'unit'],
		['stress', 'σ', 0.333333333333, 'GPa']
	]);
});
