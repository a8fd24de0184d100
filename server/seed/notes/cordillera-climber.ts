import { calculation, check, given, paragraph, section, text, value } from '../write';
import type { DemoNote } from '.';

const climber: DemoNote = {
	title: 'Climber and power',
	department: 'Climber',
	technicalReference: 'N. Abara',
	creator: 'abara',
	approver: 'solvang',
	thinLimit: '0.10',
	items: [
		section('cl3-purpose', 'Purpose'),
		text(
			'cl3-why',
			paragraph(
				'What a climber needs to leave the anchor: it starts at ',
				value('cl3-v0'),
				', limited by its power, and takes ',
				value('cl3-energy'),
				' to synchronous height. Kinetic energy is left out.'
			)
		),
		section('cl3-givens', 'Givens'),
		given('cl3-m', 'm_lift', 'Climber, laden', '14', 't', '', 'CL-DN-001, 2.1'),
		given(
			'cl3-p',
			'P',
			'Power received at the climber',
			'2.4',
			'MW',
			'0.05',
			'Beam budget CL-TN-012'
		),
		given(
			'cl3-eta',
			'η',
			'From received power to the tape',
			'0.86',
			'',
			'0.02',
			'Drive test, second article'
		),
		given(
			'cl3-vmax',
			'v_max',
			'Greatest speed on the tape',
			'200',
			'km/h',
			'',
			'Wheel contact limit CL-TN-015'
		),
		given(
			'cl3-rs',
			'r_s',
			'Balance radius',
			'42164.17',
			'km',
			'',
			'From body constants, J2 left out'
		),
		section('cl3-derived', 'Start and ascent'),
		calculation(
			'cl3-g',
			'g_A',
			'Net gravity at the anchor',
			'earth.GM/earth.radius^2 - earth.rate^2 earth.radius',
			'm/s^2'
		),
		calculation('cl3-v0', 'v_0', 'Speed at the anchor', 'η P/(m_lift g_A)', 'km/h', '3'),
		calculation(
			'cl3-du',
			'ΔU',
			'Work per mass to the balance radius',
			'earth.GM * (1/earth.radius - 1/r_s) - earth.rate^2 * (r_s^2 - earth.radius^2)/2',
			'MJ/kg'
		),
		calculation(
			'cl3-energy',
			'E_s',
			'Energy received, anchor to synchronous height',
			'm_lift ΔU/η',
			'MWh'
		),
		calculation(
			'cl3-side',
			'F_c',
			'Side force at greatest speed',
			'2 m_lift earth.rate v_max',
			'N'
		),
		section('cl3-checks', 'Checks'),
		check(
			'cl3-c-v0',
			'Leaves the anchor fast enough for the weather window',
			'v_0',
			'ge',
			'50 km/h'
		),
		check('cl3-c-side', 'Side force within the guide rollers', 'F_c', 'le', '180 N')
	],
	frozen: { waivers: [] },
	edits: [],
	additions: [],
	remarks: [],
	files: []
};

export default climber;
