/** The inputs that all methods on coupon results share, and what is refused of them in words. */
import { list, quantity } from '../methods/parameter';
import { Refused } from '../methods/refused';
import { PRESSURE, PURE } from '../quantities/dimension';

export const couponValues = list({
	label: 'results of the coupons, all of one property',
	fewest: 2,
	most: 10_000,
	of: quantity({ label: 'result', symbol: 'x', dimension: PRESSURE, unit: 'GPa' }),
	help: 'Of another property, give its values in SI as if they were pascals.'
});

export const basisInputs = {
	share: quantity({
		label: 'share of the population that exceeds the limit',
		symbol: 'P',
		dimension: PURE,
		unit: '',
		range: { least: 0.5, most: 0.9999 },
		default: 0.9,
		help: '0.90 for a B-basis, 0.99 for an A-basis.'
	}),
	confidence: quantity({
		label: 'confidence',
		symbol: 'γ',
		dimension: PURE,
		unit: '',
		range: { least: 0.5, most: 0.9999 },
		default: 0.95
	})
} as const;

/** @throws Refused where the results have no spread. */
export function requireSpread(values: readonly number[]): void {
	if (values.every((x) => x === values[0]))
		throw new Refused('All results are the same: they have no spread from which a limit follows.', {
			remedy: 'Look at the rounding of the results, and whether they are of different specimens.'
		});
}

export const CAUTION =
	'A statistic of these coupons, not an approved allowable: sampling, test method, environment and the acceptance of a basis follow the governing standard and licensed practice.';
