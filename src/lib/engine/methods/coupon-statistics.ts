/** Coupon results: their statistics, outliers, and how well the usual distributions fit. */
import { CAUTION, couponValues, requireSpread } from '../materials/coupons';
import { FEWEST_FITTED, fitLognormal, fitNormal, testWeibull, type Fit } from '../materials/fits';
import { outliers, summarise } from '../materials/sample';
import { normalQuantile } from '../numerics/normal';
import { PRESSURE, PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { flag, group, integer, list, quantity, text } from './parameter';
import { refuseInput } from './refused';

const figure = (label: string, symbol?: string) =>
	quantity({ label, ...(symbol && { symbol }), dimension: PURE, unit: '' });
const result = (label: string, symbol?: string) =>
	quantity({ label, ...(symbol && { symbol }), dimension: PRESSURE, unit: 'GPa' });

export const couponStatistics = defineMethod({
	name: 'coupon-statistics',
	title: 'Coupon statistics',
	summary:
		'Mean and spread of coupon results, results far from the rest, and how well normal, lognormal and Weibull distributions fit them.',
	subject: 'materials',
	inputs: { values: { ...couponValues, fewest: 3 } },
	outputs: {
		specimens: integer({ label: 'specimens', symbol: 'n' }),
		mean: result('mean', 'x̄'),
		deviation: result('standard deviation, with n − 1', 's'),
		variation: { ...figure('coefficient of variation', 's/x̄'), optional: true },
		least: result('least result'),
		greatest: result('greatest result'),
		outliers: list({
			label: 'outliers, by the maximum normed residual at 5 %; told, not taken out',
			fewest: 0,
			most: 10_000,
			of: group({
				label: 'outlier',
				fields: {
					specimen: integer({ label: 'specimen, counted from 1' }),
					value: result('its result'),
					residual: figure('its normed residual'),
					critical: figure('critical value')
				}
			})
		}),
		fits: list({
			label: 'fits, for four results or more',
			fewest: 0,
			most: 3,
			of: group({
				label: 'distribution',
				fields: {
					distribution: text({ label: 'distribution', longest: 20 }),
					first: figure('mean, of the logarithms for the lognormal; scale for the Weibull, SI'),
					second: figure('standard deviation; shape for the Weibull'),
					statistic: figure('Anderson–Darling statistic', 'A²'),
					corrected: figure('corrected for the size of the sample', 'A*'),
					significance: figure('observed significance level', 'OSL'),
					rejected: flag({ label: 'rejected at 5 %', default: false })
				}
			})
		}),
		plot: list({
			label: 'probability plot',
			fewest: 3,
			most: 10_000,
			of: group({
				label: 'point',
				fields: {
					value: result('result, ascending'),
					position: figure('plotting position (i − 0.5)/n'),
					quantile: figure('standard normal quantile there')
				}
			})
		})
	},
	sources: [
		'Anderson–Darling test with the small-sample forms of the handbooks (CMH-17; common practice)',
		'maximum normed residual: W. Stefansky, Technometrics 14 (1972); CMH-17, common practice',
		'Weibull by maximum likelihood, the data scaled by their geometric mean'
	],
	validity: 'Independent specimens of one population.',
	leftOut: ['censored results', 'batches: see the batch test'],
	refuses: ['fewer than three results', 'results without spread'],
	caution: CAUTION,
	run({ values }) {
		requireSpread(values);
		const { n, mean, deviation, least, greatest } = summarise(values);
		if (!(deviation > Math.abs(mean) * 1e-14))
			refuseInput('values', 'The results differ in rounding only.');
		const far = outliers(values);
		const positive = values.every((x) => x > 0);
		const fits =
			n < FEWEST_FITTED
				? []
				: [
						told('normal', fitNormal(values)),
						...(positive
							? [told('lognormal', fitLognormal(values)), told('Weibull', testWeibull(values))]
							: [])
					];
		return {
			outputs: {
				specimens: n,
				mean,
				deviation,
				variation: mean === 0 ? undefined : deviation / Math.abs(mean),
				least,
				greatest,
				outliers: far.map(({ index, residual, critical }) => ({
					specimen: index + 1,
					value: values[index]!,
					residual,
					critical
				})),
				fits,
				plot: [...values]
					.sort((a, b) => a - b)
					.map((value, i) => {
						const position = (i + 0.5) / n;
						return { value, position, quantile: normalQuantile(position) };
					})
			},
			warnings: [
				...far.map(
					({ index }) =>
						`Specimen ${index + 1} is an outlier at 5 %: it stays among the results until a reason in words takes it out.`
				),
				...(positive
					? []
					: ['Results of 0 and below: lognormal and Weibull distributions have no such values.']),
				...(n < FEWEST_FITTED
					? ['Three specimens: no distribution can be tested on them.']
					: n < 8
						? ['Fewer than 8 specimens: the tests of fit tell little.']
						: [])
			]
		};
	}
});

const told = (distribution: string, { parameters, ...fit }: Fit) => ({
	distribution,
	first: parameters[0],
	second: parameters[1],
	...fit,
	rejected: fit.significance <= 0.05
});
