/** Uniform section: what a line of one section must carry, and where it would stand free. */
import { DENSITY, LENGTH, PRESSURE, SPECIFIC_STRENGTH } from '../quantities/dimension';
import { radiusOf, stressOf } from '../line/parameters';
import { fieldOf, site } from '../line/site';
import { siteWarnings } from '../line/site-warnings';
import {
	breakingLength,
	freeStandingRadius,
	uniformPeakStress,
	uniformStress
} from '../line/uniform';
import { defineMethod } from './method';
import { group, integer, list, quantity } from './parameter';

export const uniformLine = defineMethod({
	name: 'uniform-line',
	title: 'Line of uniform section',
	summary:
		'Stress along a line of one section whose upper end is free, where that end lies, and what its material could carry of itself.',
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
		}),
		baseStress: quantity({
			label: 'stress at the anchor',
			symbol: 'σ₀',
			dimension: PRESSURE,
			unit: 'GPa',
			range: { least: 0 },
			default: 0,
			help: 'Zero: nothing pulls at either end.'
		}),
		points: integer({
			label: 'radii told, equally spaced from the anchor to the upper end',
			range: { least: 2, most: 5000 },
			default: 50
		})
	},
	outputs: {
		peakStress: stressOf('greatest stress, at the balance radius', 'σ_u'),
		balanceRadius: radiusOf('balance radius', 'r_s'),
		freeRadius: radiusOf('radius of the upper end, where the stress is zero again', 'H'),
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
		}),
		profile: list({
			label: 'stress along the line, upwards; the balance radius is among the radii',
			fewest: 2,
			most: 5001,
			of: group({
				label: 'radius',
				fields: {
					radius: radiusOf('radius'),
					stress: stressOf('stress')
				}
			})
		})
	},
	sources: ['σ(r) = σ₀ + ρ [U(r) − U(R)], statics of a line in the co-rotating frame'],
	validity: 'Straight line in the plane of the equator, at rest in the co-rotating frame.',
	leftOut: ['the air', 'elasticity'],
	refuses: ['a balance radius inside the body'],
	caution: '',
	run({ site, density, stress, baseStress, points }) {
		const field = fieldOf(site);
		const freeRadius = freeStandingRadius(field, baseStress / density);
		const step = (freeRadius - field.base) / (points - 1);
		const radii = Array.from({ length: points - 1 }, (_, i) => field.base + i * step);
		const upwards = [...radii, field.balance, freeRadius].sort((a, b) => a - b);
		return {
			outputs: {
				peakStress: uniformPeakStress(field, density, baseStress),
				balanceRadius: field.balance,
				freeRadius,
				breakingLength: breakingLength(stress, density),
				specificStrength: stress / density,
				profile: upwards.map((radius) => ({
					radius,
					stress: uniformStress(field, density, baseStress, radius)
				}))
			},
			warnings: siteWarnings(site, field, freeRadius)
		};
	}
});
