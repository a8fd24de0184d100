import {
	calculation,
	check,
	evidence,
	formula,
	given,
	lineModel,
	paragraph,
	section,
	text,
	value
} from '../write';
import type { DemoNote } from '.';

const sizing: DemoNote = {
	title: 'Primary line sizing',
	department: 'Line structures',
	technicalReference: 'A. Nwosu',
	creator: 'quispe',
	approver: 'solvang',
	thinLimit: '0.10',
	items: [
		section('cl4-purpose', 'Purpose and method'),
		text(
			'cl4-why',
			paragraph(
				'This note sizes the primary line for ',
				value('cl4-lift'),
				' climbers: constant working stress from the anchor to the counterweight. At ',
				formula('\\sigma_\\mathrm{j}'),
				' = ',
				value('cl4-sj'),
				' the section grows by ',
				value('cl4-line', 'taper'),
				' from sea level to synchronous height. The climbers are worked in CL-DN-003, the anchor in CL-DN-005.'
			)
		),
		section('cl4-givens', 'Givens'),
		given(
			'cl4-al',
			'σ_al',
			'Allowable strength of the plain tape',
			'110',
			'GPa',
			'1.9',
			'CL-DN-002, 3.1, B-basis, n = 30'
		),
		given(
			'cl4-rho',
			'ρ',
			'Density, as deployed under load',
			'1520',
			'kg/m^3',
			'9',
			'CL-DN-002, 2.5'
		),
		given(
			'cl4-fs',
			'FS',
			'Factor of safety',
			'1.75',
			'',
			'',
			'Programme standard CL-ST-01, table 2'
		),
		given(
			'cl4-eta',
			'η_j',
			'Joint efficiency, bonded lap joints',
			'1.000',
			'',
			'',
			'Assumed until the lap joints are tested'
		),
		given('cl4-lift', 'm_lift', 'Climber, laden', '14', 't', '', 'CL-DN-001, 2.1'),
		given('cl4-top', 'h_t', 'Top of the line above sea level', '91000', 'km', '', 'CL-DN-001, 2.5'),
		given(
			'cl4-loom',
			'A_max',
			'Widest section the loom weaves',
			'9.6',
			'mm^2',
			'',
			'Loom acceptance CL-TN-021'
		),
		given(
			'cl4-max',
			'm_max',
			'Launch allotment, line and counterweight',
			'1700',
			't',
			'',
			'CL-DN-001, 2.4'
		),
		section('cl4-sizing', 'Sizing'),
		calculation('cl4-sd', 'σ_d', 'Design stress of the plain tape', 'σ_al/FS', 'GPa'),
		calculation('cl4-sj', 'σ_j', 'Design stress at a joint', 'η_j σ_al/FS', 'GPa'),
		lineModel('cl4-line', 'line', 'Primary line', {
			body: 'earth',
			density: 'ρ',
			allowable: 'η_j σ_al',
			factorOfSafety: 'FS',
			baseMode: 'lift',
			lift: 'm_lift',
			reserve: '0',
			top: 'h_t'
		}),
		calculation(
			'cl4-tot',
			'm_tot',
			'Line and counterweight',
			'line.mass + line.counterweight',
			't'
		),
		calculation('cl4-break', 'L_b', 'Breaking length at the design stress', 'σ_d/(ρ g_0)', 'km'),
		section('cl4-checks', 'Checks'),
		check(
			'cl4-c-mass',
			'Line and counterweight within the launch allotment',
			'm_tot',
			'le',
			'm_max'
		),
		check('cl4-c-loom', 'Widest section within the loom’s reach', 'line.As', 'le', 'A_max'),
		check('cl4-c-joint', 'Joints carry the design stress of the tape', 'σ_d', 'le', 'σ_j'),
		check('cl4-c-lift', 'Total mass per lift', 'm_tot/m_lift', 'le', '150')
	],
	frozen: { waivers: [] },
	edits: [
		{ by: 'nwosu', item: 'cl4-top', field: 'value', value: '88000' },
		{ by: 'nwosu', item: 'cl4-eta', field: 'value', value: '0.962' },
		{ by: 'nwosu', item: 'cl4-eta', field: 'uncertainty', value: '0.008' },
		{ by: 'nwosu', item: 'cl4-eta', field: 'source', value: 'Evidence 5.1, n = 30' }
	],
	sentences: [
		{
			by: 'nwosu',
			item: 'cl4-why',
			words: ' Joints count as a reduced allowable of their own since batch 7 was tested.'
		}
	],
	additions: [
		{
			by: 'nwosu',
			after: 'cl4-tot',
			item: calculation('cl4-kj', 'k_j', 'Thickening at a joint', 'σ_d/σ_j', '', '4')
		},
		{
			by: 'abara',
			after: 'cl4-max',
			item: given(
				'cl4-flux',
				'Φ',
				'Flux of debris that cuts the tape',
				'',
				'1/(m^2 yr)',
				'',
				'CL-DN-006, 2.1, not given yet'
			)
		},
		{
			by: 'abara',
			after: 'cl4-max',
			item: given(
				'cl4-width',
				'w',
				'Width that a fragment must meet',
				'0.14',
				'm',
				'0.02',
				'CL-DN-006, 2.2'
			)
		},
		{
			by: 'abara',
			after: 'cl4-break',
			item: calculation('cl4-cut', 'Λ', 'Rate of cuts, lowest 2 000 km', 'Φ w 2000 km', '1/yr')
		},
		{
			by: 'abara',
			after: 'cl4-c-lift',
			item: check('cl4-c-cut', 'Chance of a cut in ten years', '1 - exp(-Λ 10 yr)', 'le', '0.010')
		},
		{ by: 'nwosu', after: 'cl4-c-cut', item: section('cl4-evidence', 'Evidence') },
		{
			by: 'nwosu',
			after: 'cl4-evidence',
			item: evidence('cl4-joints', 'Lap joints of batch 7, thirty pulled to failure')
		}
	],
	remarks: [
		{
			pinned: 'before the baseline',
			by: 'cordeiro',
			item: 'cl4-tot',
			body: 'A lower top saves time in deployment. What does it cost in counterweight?',
			replies: [{ by: 'quispe', body: 'We shall try 88 000 km after the SRR.' }]
		},
		{
			pinned: 'before the baseline',
			by: 'haddad',
			item: 'cl4-rho',
			body: 'Is this with the binder, and at what humidity was it weighed?',
			replies: [
				{
					by: 'nwosu',
					body: 'With the binder, dried to constant mass. S. Lindqvist will state the humidity in CL-DN-002.'
				}
			]
		},
		{
			pinned: 'since',
			by: 'cordeiro',
			item: 'cl4-c-joint',
			body: 'The joints do not carry what the tape does. Thicken them, or size the whole line for the joint?',
			replies: []
		},
		{
			pinned: 'before the baseline',
			by: 'haddad',
			item: 'cl4-fs',
			body: 'Which table of the standard?',
			replies: [
				{
					by: 'quispe',
					body: 'Table 2, for tape with inspection of every length. Added to the source.'
				}
			],
			settledBy: 'haddad'
		}
	],
	files: [
		{ item: 'cl4-joints', name: 'lap-joints-batch-7.csv', by: 'nwosu' },
		{ item: 'cl4-joints', name: 'lap-joints-batch-7.png', by: 'nwosu' }
	]
};

export default sizing;
