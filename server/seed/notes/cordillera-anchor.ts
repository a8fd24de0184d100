import { calculation, check, given, paragraph, section, text, value } from '../write';
import type { DemoNote } from '.';

const anchor: DemoNote = {
	title: 'Anchor platform and mooring',
	department: 'Anchor',
	technicalReference: 'M. Quispe',
	creator: 'quispe',
	approver: 'solvang',
	thinLimit: '0.10',
	items: [
		section('cl5-purpose', 'Purpose'),
		text(
			'cl5-why',
			paragraph(
				'What the line pulls on the floating anchor, and whether eight mooring legs hold it there while the line leans by ',
				value('cl5-lean'),
				'.'
			)
		),
		section('cl5-givens', 'Givens'),
		given('cl5-lift', 'm_lift', 'Climber, laden', '14', 't', '', 'CL-DN-001, 2.1'),
		given(
			'cl5-reserve',
			'k_r',
			'Reserve of lift held at the anchor',
			'0.30',
			'',
			'',
			'Programme standard CL-ST-01, 5.4'
		),
		given('cl5-g', 'g_A', 'Net gravity at the anchor', '9.7644', 'm/s^2', '', 'CL-DN-003, 3.1'),
		given(
			'cl5-lean',
			'θ',
			'Greatest lean of the line at the anchor',
			'4.0',
			'deg',
			'0.3',
			'Side loads, first estimate'
		),
		given(
			'cl5-wind',
			'F_w',
			'Wind and current on the platform',
			'212',
			'kN',
			'25',
			'Metocean record, fifty-year sea state'
		),
		given(
			'cl5-leg',
			'F_leg',
			'Strength of a mooring leg, working',
			'260',
			'kN',
			'',
			'Maker’s certificate, leg 1'
		),
		given('cl5-n', 'n_w', 'Legs that pull against one side', '3', '', '', 'Mooring plan CL-TN-030'),
		section('cl5-derived', 'Forces'),
		calculation(
			'cl5-t',
			'T_A',
			'Pull of the line, climber just attached',
			'(1 + k_r) m_lift g_A',
			'kN'
		),
		calculation('cl5-side', 'F_s', 'Side pull of the leaning line', 'T_A tan(θ)', 'kN'),
		calculation('cl5-load', 'F_1', 'On each windward leg', '(F_w + F_s)/n_w', 'kN'),
		section('cl5-checks', 'Checks'),
		check('cl5-c-leg', 'A leg holds in the fifty-year sea', 'F_1', 'le', 'F_leg'),
		check(
			'cl5-c-one',
			'Two legs hold when the third has parted',
			'(F_w + F_s)/(n_w - 1)',
			'le',
			'F_leg'
		)
	],
	frozen: { waivers: [] },
	edits: [{ by: 'quispe', item: 'cl5-wind', field: 'value', value: '468' }],
	additions: [],
	remarks: [],
	files: []
};

export default anchor;
