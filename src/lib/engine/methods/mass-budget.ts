/** Budget of masses, powers or costs with growth allowances, a system margin and an allocation. */
import { budgetOf } from '../budgets/budget';
import { nearest } from '../calc/near';
import { PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, list, quantity, text, type ValueOf } from './parameter';
import { Refused, refuseInput } from './refused';

const figure = (label: string, symbol?: string) =>
	quantity({ label, ...(symbol && { symbol }), dimension: null, unit: '' });

const share = (label: string) =>
	quantity({ label, dimension: PURE, unit: '%', range: { least: 0, most: 10 } });

const rows = list({
	label: 'items',
	fewest: 1,
	most: 5000,
	of: group({
		label: 'item',
		fields: {
			item: text({ label: 'item', longest: 200 }),
			basic: quantity({
				label: 'basic figure, without growth',
				dimension: null,
				unit: '',
				range: { least: 0 }
			}),
			maturity: text({
				label: 'maturity, as the table of allowances names it',
				longest: 100,
				optional: true,
				help: 'This or a growth allowance of the item’s own.'
			}),
			growth: { ...share('growth allowance of its own'), optional: true },
			allocation: quantity({
				label: 'allocation of the item',
				dimension: null,
				unit: '',
				range: { least: 0 },
				optional: true
			})
		}
	})
});

const allowances = list({
	label: 'growth allowances by maturity',
	fewest: 0,
	most: 100,
	optional: true,
	of: group({
		label: 'allowance',
		fields: {
			maturity: text({ label: 'maturity', longest: 100 }),
			growth: share('growth allowance')
		}
	})
});

export const massBudget = defineMethod({
	name: 'mass-budget',
	title: 'Budget of mass, power or cost',
	summary:
		'Basic figures with growth allowances by maturity, the predicted total, the system margin, and what remains of the allocation.',
	subject: 'budgets',
	inputs: {
		rows,
		allowances,
		systemMargin: {
			...share('system margin, as a fraction of the predicted total'),
			default: 0
		},
		allocation: quantity({
			label: 'allocation',
			dimension: null,
			unit: '',
			range: { least: 0 },
			optional: true
		})
	},
	outputs: {
		rows: list({
			label: 'items',
			fewest: 1,
			most: 5000,
			of: group({
				label: 'item',
				fields: {
					item: text({ label: 'item', longest: 200 }),
					basic: figure('basic'),
					growth: share('growth allowance'),
					allowance: figure('basic × growth allowance'),
					predicted: figure('predicted: basic and growth'),
					remaining: {
						...figure('of the item’s allocation less predicted'),
						optional: true
					}
				}
			})
		}),
		basic: figure('basic, total'),
		allowance: figure('growth allowances, total'),
		predicted: figure('predicted, total'),
		systemMargin: figure('system margin'),
		reserved: figure('predicted and system margin'),
		remaining: {
			...figure('remaining of the allocation'),
			optional: true,
			help: 'Allocation less predicted less system margin; negative where the budget is overdrawn.'
		}
	},
	sources: [
		'Basic, growth allowance, predicted: as in AIAA S-120A, common practice; the allowances are the user’s own table'
	],
	validity: 'All figures in one SI unit (kg, W, or a currency): one budget is of one kind.',
	leftOut: ['centres of mass and inertia', 'correlation between the growth of items'],
	refuses: [
		'a maturity that the table does not name, or names twice',
		'an item with neither or both of maturity and growth',
		'totals above 1e300'
	],
	caution: '',
	run({ rows, allowances = [], systemMargin, allocation }) {
		const items = rows.map((row, i) => ({ ...row, growth: growthOf(row, i, allowances) }));
		const { lines, ...totals } = budgetOf(items, systemMargin, allocation);
		if (!(totals.reserved <= 1e300))
			throw new Refused('The totals are above 1e300.', { code: 'beyond-any-build' });
		return {
			outputs: {
				rows: lines.map((line, i) => ({
					item: items[i]!.item,
					basic: items[i]!.basic,
					...line,
					remaining: line.remaining
				})),
				...totals,
				remaining: totals.remaining
			},
			warnings: warningsOf(rows, totals.remaining)
		};
	}
});

type Row = ValueOf<typeof rows>[number];

function growthOf(row: Row, i: number, allowances: { maturity: string; growth: number }[]): number {
	const { item, maturity, growth } = row;
	if ((maturity === undefined) === (growth === undefined))
		refuseInput(
			`rows.${i}`,
			`${item}: give its maturity or a growth allowance, and only one of them.`
		);
	if (maturity === undefined) return growth!;
	const named = allowances.filter((allowance) => allowance.maturity === maturity);
	if (named.length === 1) return named[0]!.growth;
	if (named.length > 1)
		refuseInput('allowances', `The table of allowances names “${maturity}” more than once.`);
	const [near] = nearest(
		maturity,
		allowances.map((allowance) => allowance.maturity)
	);
	const hint = near === undefined ? '' : ` Is it “${near}”?`;
	refuseInput(
		`rows.${i}.maturity`,
		`${item}: the table of allowances has no maturity “${maturity}”.${hint}`
	);
}

function warningsOf(rows: readonly Row[], remaining: number | undefined): string[] {
	const seen = new Set<string>();
	const twice = new Set<string>();
	for (const { item } of rows) (seen.has(item) ? twice : seen).add(item);
	return [
		...[...twice].map((name) => `${name} is listed more than once; each line counts.`),
		...(remaining !== undefined && remaining < 0 ? ['The budget is overdrawn.'] : [])
	];
}
