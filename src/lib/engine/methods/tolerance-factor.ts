/** Tolerance factors: how many standard deviations below the mean, and how many specimens. */
import { leastSpecimens, orderRank } from '../materials/basis';
import { basisInputs } from '../materials/coupons';
import { toleranceFactor as factorOf } from '../numerics/tolerance';
import { PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { integer, quantity } from './parameter';

export const toleranceFactor = defineMethod({
	name: 'tolerance-factor',
	title: 'Tolerance factor',
	summary:
		'One-sided tolerance factor of a normal population for a number of specimens, and the order statistic that serves whatever the distribution.',
	subject: 'materials',
	inputs: {
		specimens: integer({
			label: 'specimens',
			symbol: 'n',
			range: { least: 2, most: 10_000 }
		}),
		...basisInputs
	},
	outputs: {
		factor: quantity({
			label: 'tolerance factor: the limit is x̄ − k s',
			symbol: 'k',
			dimension: PURE,
			unit: ''
		}),
		rank: integer({
			label: 'rank of the result that is the limit whatever the distribution',
			help: '0 where there are too few specimens.'
		}),
		leastSpecimens: integer({
			label: 'least number of specimens for a limit whatever the distribution'
		})
	},
	sources: [
		'k = t′_{γ; n−1, z_P √n}/√n, non-central t: M. G. Natrella, NBS Handbook 91; NIST/SEMATECH e-Handbook 7.2.6.3',
		'order statistics: the binomial distribution'
	],
	validity: 'Independent specimens of one population; the factor for a normal one.',
	leftOut: ['censored results', 'batches that differ'],
	refuses: ['fewer than two specimens'],
	caution: '',
	run({ specimens, share, confidence }) {
		const basis = { share, confidence };
		return {
			outputs: {
				factor: factorOf(specimens, share, confidence),
				rank: orderRank(specimens, basis),
				leastSpecimens: leastSpecimens(basis)
			}
		};
	}
});
