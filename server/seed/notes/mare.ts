import {
	bullets,
	calculation,
	check,
	formula,
	given,
	paragraph,
	section,
	text,
	value
} from '../write';
import type { DemoNote, DemoProgramme } from '.';

const concept: DemoNote = {
	title: 'Concept and requirements',
	department: 'System',
	technicalReference: 'I. Solvang',
	creator: 'solvang',
	approver: 'solvang',
	thinLimit: '0.05',
	items: [
		section('ml1-purpose', 'Purpose'),
		text(
			'ml1-why',
			paragraph(
				'A line from the near side of the Moon through L1, for ',
				value('ml1-lift'),
				' climbers.'
			),
			bullets(
				['Built from a polymer fibre that is made today.'],
				['Launched in ', value('ml1-launches'), ' pieces of at most ', value('ml1-piece'), '.']
			)
		),
		section('ml1-givens', 'Requirements'),
		given('ml1-lift', 'm_lift', 'Climber, laden', '2.0', 't', '', 'Requirement ML-RQ-003'),
		given('ml1-piece', 'm_p', 'Mass of one launch', '18', 't', '', 'Requirement ML-RQ-006'),
		given(
			'ml1-launches',
			'n_l',
			'Launches for the first line',
			'14',
			'',
			'',
			'Requirement ML-RQ-006'
		),
		given('ml1-speed', 'v', 'Climber speed', '120', 'km/h', '', 'Requirement ML-RQ-009'),
		given(
			'ml1-l1',
			's_1',
			'Distance of L1 from the Moon’s centre',
			'58019',
			'km',
			'',
			'Collinear point, mean distance'
		),
		section('ml1-derived', 'What follows'),
		calculation('ml1-time', 't_1', 'Ride from the surface to L1', '(s_1 - moon.radius)/v', 'd'),
		calculation('ml1-mass', 'm_all', 'Mass that can be launched', 'n_l m_p', 't'),
		section('ml1-checks', 'Checks'),
		check('ml1-c-time', 'Ride within three weeks', 't_1', 'le', '21 d')
	],
	frozen: false,
	edits: [],
	additions: [],
	remarks: [],
	files: []
};

const line: DemoNote = {
	title: 'Line to L1, first sizing',
	department: 'Line structures',
	technicalReference: 'M. Quispe',
	creator: 'quispe',
	approver: 'solvang',
	thinLimit: '0.10',
	items: [
		section('ml2-purpose', 'Purpose and method'),
		text(
			'ml2-why',
			paragraph(
				'The taper of a line at constant stress from the surface to L1, from the potential of Moon, Earth and rotation, ',
				formula('U(s) = -GM_2/s - GM_1/(d-s) - \\tfrac12\\omega^2(x_2-s)^2'),
				'. The taper comes to ',
				value('ml2-taper'),
				'.'
			)
		),
		section('ml2-givens', 'Givens'),
		given('ml2-d', 'd', 'Distance of the centres, mean', '384400', 'km', '', 'Common practice'),
		given(
			'ml2-s1',
			's_1',
			'Distance of L1 from the Moon’s centre',
			'58019',
			'km',
			'',
			'ML-DN-001, 2.5'
		),
		given(
			'ml2-al',
			'σ_al',
			'Allowable strength of the fibre tape',
			'3.05',
			'GPa',
			'0.08',
			'Maker’s lots, lowest of five'
		),
		given('ml2-rho', 'ρ', 'Density', '1560', 'kg/m^3', '10', 'Maker’s lots'),
		given('ml2-fs', 'FS', 'Factor of safety', '1.6', '', '', 'Programme standard ML-ST-01'),
		given('ml2-lift', 'm_lift', 'Climber, laden', '2.0', 't', '', 'ML-DN-001, 2.1'),
		section('ml2-sizing', 'Sizing'),
		calculation('ml2-sd', 'σ_d', 'Design stress', 'σ_al/FS', 'GPa'),
		calculation('ml2-w2', 'ω_2', 'Square of the orbital rate', '(earth.GM + moon.GM)/d^3', '1/s^2'),
		calculation(
			'ml2-x2',
			'x_2',
			'Moon’s centre from the centre of mass',
			'd earth.GM/(earth.GM + moon.GM)',
			'km',
			'6'
		),
		calculation(
			'ml2-gl1',
			'g_1',
			'Net acceleration at L1, should vanish',
			'moon.GM/s_1^2 - earth.GM/(d - s_1)^2 + ω_2 * (x_2 - s_1)',
			'mm/s^2'
		),
		calculation(
			'ml2-gm',
			'g_M',
			'Net gravity at the surface',
			'moon.GM/moon.radius^2 - earth.GM/(d - moon.radius)^2 + ω_2 * (x_2 - moon.radius)',
			'm/s^2'
		),
		calculation(
			'ml2-du',
			'ΔU',
			'Potential from the surface to L1',
			'moon.GM * (1/moon.radius - 1/s_1) + earth.GM * (1/(d - moon.radius) - 1/(d - s_1)) + ω_2/2 * ((x_2 - moon.radius)^2 - (x_2 - s_1)^2)',
			'MJ/kg'
		),
		calculation('ml2-taper', 'τ', 'Taper ratio, surface to L1', 'exp(ρ ΔU/σ_d)'),
		calculation('ml2-a0', 'A_0', 'Section at the surface', 'm_lift g_M/σ_d', 'mm^2'),
		calculation('ml2-a1', 'A_1', 'Section at L1', 'τ A_0', 'mm^2'),
		section('ml2-checks', 'Checks'),
		check('ml2-c-l1', 'L1 is where nothing pulls', 'g_1', 'within', '0 mm/s^2', '0.01 mm/s^2'),
		check('ml2-c-taper', 'Taper that the loom follows', 'τ', 'le', '10'),
		check('ml2-c-a1', 'Section at L1 within two tapes', 'A_1', 'le', '18 mm^2')
	],
	frozen: false,
	edits: [],
	additions: [],
	remarks: [
		{
			pinned: 'since',
			by: 'haddad',
			item: 'ml2-al',
			body: 'The lowest of five lots is no basis value. When do the coupons come?',
			replies: []
		}
	],
	files: []
};

/** A line from the Moon through L1, in a polymer fibre, at its SRR. */
export const mare: DemoProgramme = {
	code: 'ML',
	title: 'Mare Line',
	summary: 'Moon to L1, 2\u202ft climbers',
	gates: [
		{ kind: 'SRR', name: 'System requirements review', inDays: 49 },
		{ kind: 'PDR', name: 'Preliminary design review', inDays: 287 },
		{ kind: 'CDR', name: 'Critical design review', inDays: 553 }
	],
	notes: [concept, line]
};
