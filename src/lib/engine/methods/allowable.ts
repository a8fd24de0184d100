/** From coupon results to a basis value, the whole way. */
import { testBatches } from '../materials/batches';
import {
	leastSpecimens,
	lognormalBasis,
	normalBasis,
	orderRank,
	weibullBasis
} from '../materials/basis';
import { basisInputs, CAUTION, couponValues, requireSpread } from '../materials/coupons';
import { FEWEST_FITTED, fitLognormal, fitNormal, testWeibull } from '../materials/fits';
import { outliers, summarise } from '../materials/sample';
import { PRESSURE, PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { choice, flag, integer, list, quantity, text } from './parameter';
import { refuseInput } from './refused';

const result = (label: string) => quantity({ label, dimension: PRESSURE, unit: 'GPa' });
const optionalResult = (label: string) => ({ ...result(label), optional: true as const });
const level = (label: string) => ({
	...quantity({ label, dimension: PURE, unit: '' }),
	optional: true as const
});

const DISTRIBUTIONS = {
	normal: 'normal',
	lognormal: 'lognormal',
	weibull: 'Weibull',
	order: 'whatever the distribution, by order statistics'
} as const;

export const allowable = defineMethod({
	name: 'allowable',
	title: 'Basis value of an allowable',
	summary:
		'Basis values of coupon results for normal, lognormal and Weibull populations and whatever the distribution, the batches and outliers looked at, and which of them the tests of fit speak for.',
	subject: 'materials',
	inputs: {
		values: { ...couponValues, fewest: FEWEST_FITTED },
		batches: list({
			label: 'batch of each result, in the same order',
			fewest: 0,
			most: 10_000,
			optional: true,
			of: text({ label: 'batch', longest: 80 })
		}),
		poolingReason: text({
			label: 'why batches that differ are pooled all the same',
			longest: 2000,
			optional: true
		}),
		...basisInputs
	},
	outputs: {
		specimens: integer({ label: 'specimens', symbol: 'n' }),
		mean: result('mean'),
		deviation: result('standard deviation'),
		outliers: integer({ label: 'outliers at 5 %, still among the results' }),
		batchesDiffer: {
			...flag({ label: 'the batches differ at 2.5 %', default: false }),
			optional: true
		},
		normalSignificance: level('observed significance level, normal'),
		lognormalSignificance: level('observed significance level, lognormal'),
		weibullSignificance: level('observed significance level, Weibull'),
		factor: quantity({ label: 'tolerance factor', symbol: 'k', dimension: PURE, unit: '' }),
		normal: result('basis value, normal'),
		normalStandardError: result('standard error of the normal basis value'),
		lognormal: optionalResult('basis value, lognormal'),
		weibull: optionalResult('basis value, Weibull'),
		order: {
			...optionalResult('basis value whatever the distribution'),
			help: 'None where there are too few specimens.'
		},
		leastSpecimens: integer({ label: 'least specimens for that' }),
		distribution: {
			...choice({ label: 'distribution that the tests speak for', options: DISTRIBUTIONS }),
			optional: true
		},
		value: {
			...optionalResult('basis value by it'),
			help: 'None where the batches differ and no reason is given, or where nothing fits and there are too few specimens.'
		}
	},
	sources: [
		'tolerance limits: M. G. Natrella, NBS Handbook 91; Weibull limits exact by conditioning, J. F. Lawless, Statistical Models and Methods for Lifetime Data',
		'Anderson–Darling tests with the small-sample forms of the handbooks; k-sample test of Scholz and Stephens (1987)',
		'the first of normal, lognormal and Weibull that is not rejected at 5 %, else order statistics: common practice, in an order that standards fix differently'
	],
	validity: 'Independent specimens of one population, or of batches that may be pooled.',
	leftOut: ['variance between batches as a part of its own', 'censored results', 'environment'],
	refuses: ['fewer than four results', 'results without spread', 'batches not as many as results'],
	caution: CAUTION,
	run({ values, batches, poolingReason, share, confidence }) {
		requireSpread(values);
		const basis = { share, confidence };
		const { n, mean, deviation } = summarise(values);
		const far = outliers(values);
		const differ = batchesDiffer(values, batches);
		const positive = values.every((x) => x > 0);
		const normal = normalBasis(values, basis);
		const rank = orderRank(n, basis);
		const sorted = [...values].sort((a, b) => a - b);
		const levels = {
			normal: fitNormal(values).significance,
			lognormal: positive ? fitLognormal(values).significance : undefined,
			weibull: positive ? testWeibull(values).significance : undefined
		};
		const limits = {
			normal: normal.value,
			lognormal: positive ? lognormalBasis(values, basis) : undefined,
			weibull: positive ? weibullBasis(values, basis) : undefined,
			order: rank > 0 ? sorted[rank - 1]! : undefined
		};
		const fitting = (['normal', 'lognormal', 'weibull'] as const).find(
			(name) => (levels[name] ?? 0) > 0.05
		);
		const pooled = !differ || (poolingReason ?? '').trim() !== '';
		const chosen = pooled ? (fitting ?? (rank > 0 ? 'order' : undefined)) : undefined;
		return {
			outputs: {
				specimens: n,
				mean,
				deviation,
				outliers: far.length,
				batchesDiffer: differ,
				normalSignificance: levels.normal,
				lognormalSignificance: levels.lognormal,
				weibullSignificance: levels.weibull,
				factor: normal.factor,
				...limits,
				normalStandardError: normal.standardError,
				leastSpecimens: leastSpecimens(basis),
				distribution: chosen,
				value: chosen && limits[chosen]
			},
			warnings: [
				...(far.length > 0
					? [
							`${far.length} of the results are outliers at 5 %; they are among those reckoned with.`
						]
					: []),
				...(differ && pooled ? [`Batches that differ are pooled: ${poolingReason!.trim()}`] : []),
				...(pooled
					? []
					: [
							'The batches differ at 2.5 %: without a reason to pool them there is no basis value.'
						]),
				...(pooled && chosen === undefined
					? [
							`No distribution fits, and ${n} specimens are fewer than the ${leastSpecimens(basis)} that serve whatever the distribution.`
						]
					: []),
				...((limits[chosen ?? 'normal'] ?? 1) <= 0
					? ['The basis value is not above 0: the spread is too large for a limit.']
					: []),
				...(n < 10
					? ['Fewer than 10 specimens: a basis value from so few is rarely accepted.']
					: [])
			]
		};
	}
});

function batchesDiffer(
	values: readonly number[],
	batches: readonly string[] | undefined
): boolean | undefined {
	if (!batches || batches.length === 0) return undefined;
	if (batches.length !== values.length)
		refuseInput(
			'batches',
			`There are ${values.length} results and ${batches.length} batches: name the batch of each result.`
		);
	const names = [...new Set(batches)];
	if (names.length < 2 || values.length < 4) return undefined;
	return testBatches(names.map((name) => values.filter((_, i) => batches[i] === name))).differ;
}
