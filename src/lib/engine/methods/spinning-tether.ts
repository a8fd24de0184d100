/** Spinning tether: arms tapered for constant stress, by the closed form. */
import { armInputs, armLength, spinOf, spinOutputs } from '../release/arm';
import {
	characteristicSpeed,
	lnAreaAt,
	lnAreaRatio,
	lnMassRatio,
	tipArea
} from '../release/spinning';
import { told as toldOf } from '../numerics/logarithm';
import { AREA, FORCE, LENGTH, MASS, PRESSURE, PURE, VELOCITY } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity, told } from './parameter';

const ratio = (label: string) => told({ label, dimension: PURE, unit: '' });
const section = (label: string) => told({ label, symbol: 'A', dimension: AREA, unit: 'mm^2' });
const force = (label: string) => told({ label, symbol: 'T', dimension: FORCE, unit: 'kN' });
const mass = (label: string) => told({ label, dimension: MASS, unit: 't' });

export const spinningTether = defineMethod({
	name: 'spinning-tether',
	title: 'Spinning tether',
	summary:
		'A tether that spins about its middle, its arms tapered for constant stress: sections, masses and tension for a tip speed and a mass at each tip.',
	subject: 'release',
	inputs: {
		...armInputs,
		length: armLength,
		designStress: quantity({
			label: 'design stress',
			symbol: 'σ_d',
			dimension: PRESSURE,
			unit: 'GPa',
			range: { above: 0 },
			help: 'Allowable over factor of safety, from the governing standard.'
		}),
		arms: integer({
			label: 'number of arms, each with a mass at its tip',
			range: { least: 1, most: 100 },
			default: 2,
			help: 'They must balance about the centre; one arm needs something at the hub to do so.'
		}),
		points: integer({
			label: 'radii told, equally spaced from the centre to the tip',
			range: { least: 2, most: 2000 },
			default: 51
		})
	},
	outputs: {
		characteristicSpeed: quantity({
			label: 'characteristic speed of the material, √(2σ_d/ρ)',
			symbol: 'V_c',
			dimension: VELOCITY,
			unit: 'km/s'
		}),
		speedRatio: quantity({
			label: 'tip speed over characteristic speed',
			symbol: 'V/V_c',
			dimension: PURE,
			unit: ''
		}),
		...spinOutputs,
		areaRatio: ratio('section at the hub over that at the tip'),
		massRatio: ratio('mass of one arm over the mass at its tip'),
		tipArea: quantity({
			label: 'section at the tip',
			symbol: 'A',
			dimension: AREA,
			unit: 'mm^2'
		}),
		hubArea: section('section at the hub'),
		hubTension: force('tension at the hub'),
		armMass: mass('mass of one arm'),
		tetherMass: mass('mass of all arms'),
		profile: list({
			label: 'along an arm, outwards',
			fewest: 2,
			most: 2000,
			of: group({
				label: 'radius',
				fields: {
					radius: quantity({
						label: 'from the centre',
						symbol: 'r',
						dimension: LENGTH,
						unit: 'km'
					}),
					area: section('section'),
					tension: force('tension')
				}
			})
		})
	},
	sources: [
		'H. Moravec, J. Astronaut. Sci. 25 (1977), from memory: with x = V/V_c the section at the hub is exp(x²) of that at the tip, the mass of an arm √π x exp(x²) erf(x) of the mass there'
	],
	validity:
		'Straight arms in free space, spinning steadily about their common centre; the stress is σ_d everywhere. Density and section as deployed, under load.',
	leftOut: [
		'the gravity gradient of the body it orbits, and what catching and letting go do to the spin',
		'the hub, and what joins tip and tether',
		'manufacture in steps, joints, coating and spare strands (analyse the arm as built)'
	],
	refuses: ['figures out of their range; what is above 1e300 is told by its logarithm'],
	caution:
		'A spinning tether that parts throws its tips away at tip speed. Allowables and factors of safety follow the governing standard; range safety rules and licensed practice govern.',
	run({ arms, points, ...arm }) {
		const { density, designStress, tipSpeed, length, tipMass } = arm;
		const lnArmMass = lnMassRatio(arm) + Math.log(tipMass);
		const lnHubArea = lnAreaAt(arm, 0);
		const own = characteristicSpeed(density, designStress);
		return {
			outputs: {
				characteristicSpeed: own,
				speedRatio: tipSpeed / own,
				...spinOf(tipSpeed, length),
				areaRatio: toldOf(lnAreaRatio(arm)),
				massRatio: toldOf(lnMassRatio(arm)),
				tipArea: tipArea(arm),
				hubArea: toldOf(lnHubArea),
				hubTension: toldOf(lnHubArea + Math.log(designStress)),
				armMass: toldOf(lnArmMass),
				tetherMass: toldOf(lnArmMass + Math.log(arms)),
				profile: Array.from({ length: points }, (_, i) => {
					const share = i / (points - 1);
					const lnArea = lnAreaAt(arm, share);
					return {
						radius: share * length,
						area: toldOf(lnArea),
						tension: toldOf(lnArea + Math.log(designStress))
					};
				})
			}
		};
	}
});
