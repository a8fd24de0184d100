/** Climber envelope: the least margin of a line over a set of positions of its climbers. */
import { climberGrid, envelope, leastOf } from '../line/envelope';
import { lineInputs, lineOf, topOf, type Line, type PointMass } from '../line/line';
import { slackBelow } from '../line/slack';
import { forceOf, givenRadius, marginAt, radiusOf } from '../line/parameters';
import { siteWarnings } from '../line/site-warnings';
import { designStressOf, strengthInputs, strengthWarnings } from '../line/strength';
import { MASS } from '../quantities/dimension';
import { defineMethod } from './method';
import { group, integer, list, quantity, variant, type ValuesOf } from './parameter';
import { refuseInput } from './refused';

const climberMass = quantity({
	label: 'mass of the climber',
	symbol: 'm',
	dimension: MASS,
	unit: 't',
	range: { above: 0 }
});
const momentNumber = (label: string) =>
	integer({ label, help: 'Counted from 1, in the order given or upwards.' });

const inputs = {
	...lineInputs,
	...strengthInputs,
	climbers: variant({
		label: 'climbers, besides the point masses of the line',
		cases: {
			grid: {
				label: 'one climber at equally spaced radii',
				fields: {
					mass: climberMass,
					from: { ...givenRadius('lowest radius; the anchor where left out'), optional: true },
					to: { ...givenRadius('highest radius; the top where left out'), optional: true },
					count: integer({
						label: 'positions',
						range: { least: 2, most: 5000 },
						default: 200
					})
				}
			},
			schedule: {
				label: 'moments of a schedule, each with all its climbers',
				fields: {
					moments: list({
						label: 'moments',
						fewest: 1,
						most: 5000,
						of: group({
							label: 'moment',
							fields: {
								climbers: list({
									label: 'climbers',
									fewest: 0,
									most: 100,
									of: group({
										label: 'climber',
										fields: { radius: givenRadius('radius'), mass: climberMass }
									})
								})
							}
						})
					})
				}
			}
		}
	})
} as const;

export const climberEnvelope = defineMethod({
	name: 'climber-envelope',
	title: 'Climber envelope',
	summary:
		'The least margin of safety and the least anchor tension of a line over a set of climber positions, a grid or a schedule.',
	subject: 'line',
	inputs,
	outputs: {
		leastMargin: marginAt('least margin of safety of all moments'),
		leastMarginMoment: { ...momentNumber('moment of the least margin'), optional: true },
		leastMarginRadius: { ...radiusOf('radius on the line of the least margin'), optional: true },
		leastAnchorTension: forceOf('least tension at the anchor', 'T₀'),
		leastAnchorTensionMoment: momentNumber('moment of the least tension at the anchor'),
		slackMoments: integer({
			label: 'moments in which the line is slack somewhere; a failed check if any'
		}),
		moments: list({
			label: 'moments',
			fewest: 1,
			most: 5000,
			of: group({
				label: 'moment',
				fields: {
					climberRadius: {
						...radiusOf('radius of the climber'),
						optional: true,
						help: 'For a grid.'
					},
					margin: marginAt('least margin of safety'),
					marginRadius: { ...radiusOf('radius of the least margin'), optional: true },
					anchorTension: forceOf('tension at the anchor', 'T₀'),
					leastTension: forceOf('least tension along the line', 'T_min'),
					leastTensionRadius: radiusOf('radius of the least tension')
				}
			})
		})
	},
	sources: [
		'statics of a line in the co-rotating frame; each climber adds m g(r_c) to the tension below it, downwards positive'
	],
	validity:
		'As the as-built analysis; climbers at rest. Between the positions given nothing is looked at.',
	leftOut: ['motion of the climbers and of the line', 'the air', 'local stress at grips'],
	refuses: [
		'radii that do not ascend, masses or climbers off the line',
		'a taper whose section is above 1e300 m² or below 1e-300 m² somewhere'
	],
	caution:
		'A calculation, not a release for use: factors of safety and allowables follow the governing standard, and traffic on a line is for local codes and licensed practice to judge.',
	run(input) {
		const line = lineOf(input);
		const loads = loadsOf(line, input.climbers);
		const moments = envelope(line, designStressOf(input), loads);
		const worst = leastOf(moments, ({ margin }) => margin);
		const loosest = leastOf(moments, ({ anchorTension }) => anchorTension) ?? 0;
		const slackMoments = moments.filter(
			({ leastTension, greatestTension }) => leastTension < slackBelow(greatestTension)
		).length;
		return {
			outputs: {
				leastMargin: worst === null ? undefined : moments[worst]!.margin,
				leastMarginMoment: worst === null ? undefined : worst + 1,
				leastMarginRadius: worst === null ? undefined : moments[worst]!.stressRadius,
				leastAnchorTension: moments[loosest]!.anchorTension,
				leastAnchorTensionMoment: loosest + 1,
				slackMoments,
				moments: moments.map((moment, i) => ({
					climberRadius: input.climbers.kind === 'grid' ? loads[i]![0]!.radius : undefined,
					margin: moment.margin,
					marginRadius: moment.margin === undefined ? undefined : moment.stressRadius,
					anchorTension: moment.anchorTension,
					leastTension: moment.leastTension,
					leastTensionRadius: moment.leastTensionRadius
				}))
			},
			warnings: [
				...(slackMoments > 0
					? [`The line is slack somewhere in ${slackMoments} of ${moments.length} moments.`]
					: []),
				...strengthWarnings(input),
				...siteWarnings(input.site, line.field, topOf(line))
			]
		};
	}
});

/** @throws Refused where a climber would be off the line. */
function loadsOf(line: Line, climbers: ValuesOf<typeof inputs>['climbers']): PointMass[][] {
	const [bottom, top] = [line.pieces[0]!.from, topOf(line)];
	const check = (path: string, radius: number | undefined) => {
		if (radius !== undefined && (radius < bottom || radius > top))
			refuseInput(path, 'The climber does not lie on the line.');
	};
	if (climbers.kind === 'schedule') {
		climbers.moments.forEach((moment, i) =>
			moment.climbers.forEach(({ radius }, j) =>
				check(`climbers.moments.${i}.climbers.${j}.radius`, radius)
			)
		);
		return climbers.moments.map(({ climbers }) => climbers);
	}
	check('climbers.from', climbers.from);
	check('climbers.to', climbers.to);
	return climberGrid(line, climbers.mass, climbers);
}
