import { bullets, calculation, check, given, paragraph, section, text, value } from '../write';
import type { DemoNote } from '.';

const mission: DemoNote = {
	title: 'Mission and requirements',
	department: 'System',
	technicalReference: 'I. Solvang',
	creator: 'solvang',
	approver: 'solvang',
	thinLimit: '0.05',
	items: [
		section('cl1-purpose', 'Purpose'),
		text(
			'cl1-why',
			paragraph(
				'What the Cordillera Line must carry, how often, and what it may weigh when it is launched. Every other note of the programme takes these figures from here.'
			),
			bullets(
				[
					'A climber leaves every ',
					value('cl1-interval'),
					' and lands ',
					value('cl1-year'),
					' of payload a year.'
				],
				['Line and counterweight stay within ', value('cl1-max'), ', the launch allotment.']
			)
		),
		section('cl1-givens', 'Requirements'),
		given('cl1-lift', 'm_lift', 'Climber, laden', '14', 't', '', 'Requirement CL-RQ-007'),
		given('cl1-pay', 'm_pay', 'Payload of a climber', '6.5', 't', '', 'Requirement CL-RQ-008'),
		given(
			'cl1-interval',
			't_i',
			'Interval between climbers',
			'96',
			'h',
			'',
			'Requirement CL-RQ-011'
		),
		given(
			'cl1-max',
			'm_max',
			'Launch allotment, line and counterweight',
			'1700',
			't',
			'',
			'Requirement CL-RQ-014'
		),
		given(
			'cl1-top',
			'h_t',
			'Top of the line above sea level',
			'91000',
			'km',
			'',
			'Trade of top height, CL-RQ-002'
		),
		section('cl1-derived', 'What follows'),
		calculation('cl1-fraction', 'φ', 'Payload fraction of a climber', 'm_pay/m_lift'),
		calculation('cl1-year', 'M_yr', 'Payload in a year', 'm_pay * 365.25 d / t_i', 't'),
		section('cl1-checks', 'Checks'),
		check('cl1-c-year', 'Payload in a year', 'M_yr', 'ge', '500 t'),
		check('cl1-c-fraction', 'Payload fraction', 'φ', 'ge', '0.45')
	],
	frozen: { waivers: [] },
	edits: [{ by: 'solvang', item: 'cl1-top', field: 'value', value: '88000' }],
	additions: [],
	remarks: [
		{
			pinned: 'before the baseline',
			by: 'haddad',
			item: 'cl1-top',
			body: 'Where is the trade of top height written down? I find no note of it.',
			replies: []
		}
	],
	files: []
};

export default mission;
