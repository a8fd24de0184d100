/** Natural periods of a built line, and how far they keep from what excites it. */
import { lineInputs, lineOf, topOf } from '../line/line';
import { siteWarnings } from '../line/site-warnings';
import { hang } from '../line/tension';
import { forcingsOf, separations, type Named } from '../motion/forcing';
import { requireTaut } from '../motion/taut';
import { coupledModes, uncoupledModes, type Mode } from '../motion/periods';
import { PRESSURE, PURE, TIME, dimension } from '../quantities/dimension';
import { defineMethod } from './method';
import { flag, group, integer, list, quantity, text } from './parameter';

const period = (label: string) => quantity({ label, symbol: 'P', dimension: TIME, unit: 'h' });

const mode = group({
	label: 'mode',
	fields: {
		lambda: quantity({
			label: 'square of the circular frequency',
			symbol: 'λ',
			dimension: dimension(0, 0, -2),
			unit: '1/s^2',
			help: 'Below 0 the motion grows: the line is unstable.'
		}),
		period: { ...period('period'), optional: true, help: 'None where the motion grows.' }
	}
});

const modes = (label: string) => list({ label, fewest: 0, most: 20, of: mode });

export const periods = defineMethod({
	name: 'periods',
	title: 'Natural periods',
	summary:
		'Periods of small motions of a built line in the plane of rotation, out of it and along it, uncoupled and coupled by the Coriolis terms, against the periods of what excites it.',
	subject: 'motion',
	inputs: {
		...lineInputs,
		modulus: quantity({
			label: 'modulus of elasticity',
			symbol: 'E',
			dimension: PRESSURE,
			unit: 'GPa',
			range: { above: 0 },
			optional: true,
			help: 'Without it nothing is told of motions along the line, nor of the coupled ones.'
		}),
		count: integer({
			label: 'modes of each kind',
			range: { least: 1, most: 20 },
			default: 3
		}),
		tides: flag({
			label: 'against the tides and the solar day',
			default: true,
			help: 'M2, S2, N2, K1, O1 and 24 h. They count for an anchor on Earth only.'
		}),
		climberInterval: quantity({
			label: 'interval between climbers',
			dimension: TIME,
			unit: 'h',
			range: { above: 0 },
			optional: true
		}),
		forcings: list({
			label: 'further periods that excite the line',
			fewest: 0,
			most: 50,
			optional: true,
			of: group({
				label: 'forcing',
				fields: {
					name: text({ label: 'name', longest: 80 }),
					period: quantity({
						label: 'period',
						dimension: TIME,
						unit: 'h',
						range: { above: 0 }
					})
				}
			})
		}),
		separationLimit: quantity({
			label: 'separation wanted, |P/P_f − 1|',
			dimension: PURE,
			unit: '',
			range: { least: 0, below: 1 },
			default: 0.2,
			help: '20 % is common practice.'
		})
	},
	outputs: {
		inPlane: modes('in plane, uncoupled'),
		outOfPlane: modes('out of plane, uncoupled; nothing couples with them'),
		along: modes('along the line, uncoupled'),
		coupled: list({
			label: 'in plane and along, coupled by the Coriolis terms',
			fewest: 0,
			most: 40,
			of: group({
				label: 'mode',
				fields: {
					...mode.fields,
					acrossShare: quantity({
						label: 'share of the kinetic energy across the line',
						dimension: PURE,
						unit: ''
					})
				}
			})
		}),
		separations: list({
			label: 'separation of each period from each forcing period',
			fewest: 0,
			most: 10_000,
			of: group({
				label: 'pair',
				fields: {
					mode: text({ label: 'mode', longest: 80 }),
					period: period('its period'),
					forcing: text({ label: 'forcing', longest: 80 }),
					forcingPeriod: period('period of the forcing'),
					separation: quantity({ label: '|P/P_f − 1|', dimension: PURE, unit: '' }),
					clear: flag({ label: 'clear of it by the limit', default: false })
				}
			})
		})
	},
	sources: [
		'small motions about a straight line in the co-rotating frame, by Gauss–Lobatto elements of high order',
		'inertia of L D Lᵀ (Sylvester) to count modes, Rayleigh-quotient iteration to settle them',
		'a line that only Coriolis terms would hold counts as unstable: theorem of Thomson, Tait and Chetaev on gyroscopic stability under damping',
		'tidal constituents: the usual periods, common practice'
	],
	validity:
		'Small motions about a line that is taut everywhere, its anchor fixed, E constant. Where E is given and the line is stable, the coupled periods are what is held against the forcing; the uncoupled stand beside them, named.',
	leftOut: [
		'damping',
		'bending',
		'the air',
		'motion of the climbers on the line',
		'the anchor’s own motion'
	],
	refuses: ['a line that is slack anywhere: its spectrum has no lower bound'],
	caution:
		'A screening of resonances, not a stability case: damping, climber traffic and the anchor’s motion need a simulation and the judgement of licensed practice.',
	run(input) {
		const line = lineOf(input);
		const hanging = hang(line);
		requireTaut(line, hanging);
		const { count, modulus } = input;
		const alone = uncoupledModes(line, hanging, count, modulus);
		const unstable = Object.entries(NAMES).flatMap(([kind, name]) =>
			alone[kind as keyof typeof NAMES].some(({ lambda }) => lambda <= 0) ? [name] : []
		);
		const coupled =
			modulus === undefined || unstable.some((name) => name !== NAMES.outOfPlane)
				? []
				: coupledModes(line, hanging, 2 * count, modulus);
		const named = [
			...(coupled.length > 0
				? numbered('coupled', coupled)
				: [...numbered(NAMES.inPlane, alone.inPlane), ...numbered(NAMES.along, alone.along)]),
			...numbered(NAMES.outOfPlane, alone.outOfPlane)
		];
		const forcings = forcingsOf(line.field.omega, {
			tides: input.tides && input.site.kind === 'body' && input.site.body === 'earth',
			climberInterval: input.climberInterval,
			others: input.forcings ?? []
		});
		const pairs = separations(named, forcings, input.separationLimit);
		return {
			outputs: { ...alone, coupled, separations: pairs },
			warnings: [
				...unstable.map((name) => `Unstable ${name}: ${GROWS[name]}`),
				...pairs
					.filter(({ clear }) => !clear)
					.map(({ mode, forcing }) => `${mode} lies within the separation limit of ${forcing}.`),
				...siteWarnings(input.site, line.field, topOf(line))
			]
		};
	}
});

const NAMES = { inPlane: 'in plane', outOfPlane: 'out of plane', along: 'along' } as const;

/**
 * Coriolis terms may hold a line that is unstable at rest, but only one without any damping: with it such a
 * line is unstable again (Thomson, Tait and Chetaev). So it is told as unstable, and no coupled periods of it.
 */
const ONLY_UNDAMPED =
	'a small displacement grows. Coriolis terms could hold it only without any damping, which no line is.';
const GROWS: Record<(typeof NAMES)[keyof typeof NAMES], string> = {
	'in plane': ONLY_UNDAMPED,
	along: ONLY_UNDAMPED,
	'out of plane': 'a small displacement grows without bound.'
};

const numbered = (name: string, found: readonly Mode[]): Named[] =>
	found.flatMap(({ period }, i) =>
		period === undefined ? [] : [{ name: `${name} ${i + 1}`, period }]
	);
