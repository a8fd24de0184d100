/** Uniform section: what a line of one section must carry, and where it would stand free. */
import { DENSITY, LENGTH, PRESSURE, SPECIFIC_STRENGTH } from '../quantities/dimension';
import { fieldOf, site } from '../line/site';
import { breakingLength, freeStandingRadius, uniformPeakStress } from '../line/uniform';
import { defineMethod } from './method';
import { quantity } from './parameter';

export const uniformLine = defineMethod({
	name: 'uniform-line',
	title: 'Line of uniform section',
	summary:
		'Greatest stress of a line of one section with nothing pulling at either end, where it would end, and what its material could carry of itself.',
	subject: 'line',
	inputs: {
		site,
		density: quantity({
			label: 'density',
			symbol: 'ρ',
			dimension: DENSITY,
			unit: 'kg/m^3',
			range: { above: 0 }
		}),
		stress: quantity({
			label: 'stress of the material',
			symbol: 'σ',
			dimension: PRESSURE,
			unit: 'GPa',
			range: { above: 0 },
			help: 'For the breaking length and the specific strength.'
		})
	},
	outputs: {
		peakStress: quantity({
			label: 'greatest stress, at the balance radius',
			symbol: 'σ_u',
			dimension: PRESSURE,
			unit: 'GPa'
		}),
		balanceRadius: quantity({
			label: 'balance radius',
			symbol: 'r_s',
			dimension: LENGTH,
			unit: 'km'
		}),
		freeRadius: quantity({
			label: 'radius at which the line ends, its upper end free',
			symbol: 'H',
			dimension: LENGTH,
			unit: 'km'
		}),
		breakingLength: quantity({
			label: 'breaking length at g₀',
			dimension: LENGTH,
			unit: 'km'
		}),
		specificStrength: quantity({
			label: 'specific strength',
			symbol: 'σ/ρ',
			dimension: SPECIFIC_STRENGTH,
			unit: 'N/tex'
		})
	},
	sources: ['σ(r) = ρ [U(r) − U(R)], statics of a line in the co-rotating frame'],
	validity: 'Straight line in the plane of the equator, at rest in the co-rotating frame.',
	leftOut: ['the air', 'elasticity'],
	refuses: ['a balance radius inside the body'],
	caution: '',
	run({ site, density, stress }) {
		const field = fieldOf(site);
		return {
			outputs: {
				peakStress: uniformPeakStress(field, density),
				balanceRadius: field.balance,
				freeRadius: freeStandingRadius(field),
				breakingLength: breakingLength(stress, density),
				specificStrength: stress / density
			}
		};
	}
});
