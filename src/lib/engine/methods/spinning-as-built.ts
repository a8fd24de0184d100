/** Spinning arm as built: tension, stress and margin of an arm whose section and masses are fixed. */
import { analyse, lineMass } from '../line/as-built';
import { linearPiece } from '../line/piece';
import { designStressOf, strengthInputs, strengthWarnings } from '../line/strength';
import { armInputs, spinOf, spinOutputs } from '../release/arm';
import { spinField } from '../release/spin-field';
import { AREA, FORCE, LENGTH, MASS, PRESSURE, PURE } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity } from './parameter';
import { refuseInput } from './refused';

const radius = quantity({ label: 'from the centre', symbol: 'r', dimension: LENGTH, unit: 'km' });
const area = quantity({ label: 'section', symbol: 'A', dimension: AREA, unit: 'mm^2' });
const force = (label: string) => quantity({ label, symbol: 'T', dimension: FORCE, unit: 'kN' });
const stress = (label: string) =>
	quantity({ label, symbol: 'σ', dimension: PRESSURE, unit: 'GPa' });
const margin = (label: string) =>
	quantity({ label, symbol: 'MS', dimension: PURE, unit: '', help: 'σ_al/(FS σ) − 1' });

export const spinningAsBuilt = defineMethod({
	name: 'spinning-as-built',
	title: 'Spinning arm as built',
	summary:
		'Tension, stress and margin of safety along an arm of a spinning tether whose section and tip mass are fixed, such as one made in straight stretches along the ideal taper.',
	subject: 'release',
	inputs: {
		...armInputs,
		rows: list({
			label: 'sections outwards, linear between rows; the last is the tip',
			fewest: 2,
			most: 20_000,
			of: group({
				label: 'row',
				fields: {
					radius: { ...radius, range: { least: 0 } },
					area: { ...area, range: { above: 0 } }
				}
			})
		}),
		...strengthInputs,
		points: integer({
			label: 'radii told, equally spaced, besides the rows',
			range: { least: 2, most: 20_000 },
			default: 51
		})
	},
	outputs: {
		...spinOutputs,
		hubTension: force('tension at the inner end'),
		greatestStress: stress('greatest stress'),
		allowedStress: stress('allowable over factor of safety'),
		leastMargin: margin('least margin of safety'),
		leastMarginRadius: {
			...radius,
			label: 'radius of the least margin',
			help: 'The innermost within 1e-9 of the least.'
		},
		armMass: quantity({ label: 'mass of the arm', dimension: MASS, unit: 't' }),
		profile: list({
			label: 'along the arm, outwards',
			fewest: 2,
			most: 50_000,
			of: group({
				label: 'radius',
				fields: {
					radius,
					area,
					tension: force('tension'),
					stress: stress('stress'),
					margin: margin('margin of safety')
				}
			})
		})
	},
	sources: [
		'dT/dr = −ρ A Ω² r, T = m Ω² L at the tip; statics in the frame that turns with the tether',
		'margin of safety as in NASA-STD-5001 and ECSS-E-ST-32-10: allowable over factor of safety times stress, less one'
	],
	validity:
		'A straight arm in free space, spinning steadily; the rate follows from the tip speed at the last row. Density and section as deployed, under load.',
	leftOut: [
		'the gravity gradient of the body it orbits, and what catching and letting go do to the spin',
		'masses between hub and tip, the hub’s own strength',
		'bending, and local stress at joints'
	],
	refuses: ['rows that do not ascend'],
	caution:
		'A spinning tether that parts throws its tips away at tip speed. Allowables and factors of safety follow the governing standard; range safety rules and licensed practice govern.',
	run(input) {
		const { density, tipSpeed, tipMass, rows, points } = input;
		rows.forEach(({ radius }, i) => {
			if (i > 0 && !(radius > rows[i - 1]!.radius))
				refuseInput(`rows.${i}.radius`, `Row ${i + 1} does not lie outside the one before it.`);
		});
		const spin = spinOf(tipSpeed, rows.at(-1)!.radius);
		const field = spinField(spin.rate);
		const corners = rows.map(({ radius, area }) => [radius, area] as const);
		const arm = {
			field,
			density,
			pieces: corners.slice(1).map((corner, i) => linearPiece(field, corners[i]!, corner)),
			masses: [],
			counterweight: tipMass
		};
		const allowedStress = designStressOf(input);
		const found = analyse(arm, allowedStress, points);
		const { stress, stressRadius, anchorTension } = found.extremes;
		const leastMargin = allowedStress / stress - 1;
		return {
			outputs: {
				...spin,
				hubTension: anchorTension,
				greatestStress: stress,
				allowedStress,
				leastMargin,
				leastMarginRadius: stressRadius,
				armMass: lineMass(arm),
				profile: found.rows.map(({ radius, area, tension, stress }) => ({
					radius,
					area,
					tension,
					stress,
					margin: allowedStress / stress - 1
				}))
			},
			warnings: [
				...(leastMargin < 0
					? ['The stress is above the allowed: see where the margin is least.']
					: []),
				...strengthWarnings(input)
			]
		};
	}
});
