/** Whether batches of coupons may be taken as one population. */
import { testBatches } from '../materials/batches';
import { CAUTION, couponValues } from '../materials/coupons';
import { PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { flag, group, integer, list, quantity, text } from './parameter';
import { Refused, refuseInput } from './refused';

export const batchTest = defineMethod({
	name: 'batch-test',
	title: 'Batch test',
	summary:
		'Whether batches of coupons come from one population, by the k-sample Anderson–Darling test.',
	subject: 'materials',
	inputs: {
		batches: list({
			label: 'batches',
			fewest: 2,
			most: 200,
			of: group({
				label: 'batch',
				fields: {
					name: text({ label: 'batch', longest: 80 }),
					values: couponValues
				}
			})
		})
	},
	outputs: {
		batches: integer({ label: 'batches', symbol: 'k' }),
		specimens: integer({ label: 'specimens together', symbol: 'N' }),
		statistic: quantity({
			label: 'standardised statistic',
			dimension: PURE,
			unit: '',
			help: 'A²_akN with ties, less its mean, over its standard deviation.'
		}),
		critical: quantity({ label: 'critical value at 2.5 %', dimension: PURE, unit: '' }),
		differ: flag({ label: 'the batches differ', default: false })
	},
	sources: ['F. W. Scholz and M. A. Stephens, J. Am. Stat. Assoc. 82 (1987) 918'],
	validity: 'Independent specimens; the critical value is interpolated in the number of batches.',
	leftOut: ['differences in spread alone are found less surely than in level'],
	refuses: ['fewer than two batches', 'fewer than four specimens together', 'results all the same'],
	caution: CAUTION,
	run({ batches }) {
		const values = batches.map((batch) => batch.values);
		const all = values.flat();
		if (all.length < 4)
			refuseInput('batches', 'Fewer than four specimens together: the test has no spread.');
		if (new Set(all).size < 2)
			throw new Refused('All results are the same: no batch can be told from another.');
		const found = testBatches(values);
		return {
			outputs: { batches: batches.length, specimens: all.length, ...found },
			warnings: found.differ
				? ['The batches differ at 2.5 %: to pool them needs a reason in words.']
				: []
		};
	}
});
