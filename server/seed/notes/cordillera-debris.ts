import { calculation, check, given, paragraph, section, text } from '../write';
import type { DemoNote } from '.';

const debris: DemoNote = {
	title: 'Debris and meteoroids',
	department: 'Environment',
	technicalReference: 'N. Abara',
	creator: 'abara',
	approver: 'solvang',
	thinLimit: '0.10',
	items: [
		section('cl6-purpose', 'Purpose'),
		text(
			'cl6-why',
			paragraph(
				'How often an object large enough to cut the tape meets it. The flux above the critical size is to come from the programme’s own table; until then the rate waits. Screening only: range safety rules and licensed practice govern.'
			)
		),
		section('cl6-givens', 'Givens'),
		given(
			'cl6-flux',
			'Φ',
			'Flux of objects above 12 mm, lowest 2 000 km',
			'',
			'1/(m^2 yr)',
			'',
			'Flux table, due before PDR'
		),
		given(
			'cl6-width',
			'w',
			'Width that a fragment must meet',
			'0.14',
			'm',
			'0.02',
			'Tape width and half the fragment'
		),
		given('cl6-h', 'Δr', 'Height band', '2000', 'km', '', 'Where nearly all debris is'),
		section('cl6-derived', 'Rate'),
		calculation('cl6-rate', 'Λ', 'Rate of cuts', 'Φ w Δr', '1/yr'),
		calculation('cl6-mean', 't_m', 'Mean time between cuts', '1/Λ', 'yr'),
		section('cl6-checks', 'Checks'),
		check('cl6-c', 'Chance of a cut in ten years', '1 - exp(-Λ 10 yr)', 'le', '0.010')
	],
	frozen: false,
	edits: [],
	additions: [],
	remarks: [],
	files: []
};

export default debris;
