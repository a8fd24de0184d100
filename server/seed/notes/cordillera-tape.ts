import {
	calculation,
	check,
	evidence,
	formula,
	given,
	paragraph,
	section,
	text,
	value
} from '../write';
import type { DemoNote } from '.';

const tape: DemoNote = {
	title: 'Tape material and allowables',
	department: 'Materials',
	technicalReference: 'S. Lindqvist',
	creator: 'lindqvist',
	approver: 'solvang',
	thinLimit: '0.05',
	items: [
		section('cl2-purpose', 'Purpose'),
		text(
			'cl2-why',
			paragraph(
				'The B-basis strength of the woven tape from coupons of three batches, ',
				formula('\\bar x - k_\\mathrm{B}\\,s'),
				': nine tapes in ten are stronger than ',
				value('cl2-b'),
				', said with 95 % confidence. The factor is for a normal distribution; the coupons do not speak against one.'
			)
		),
		section('cl2-coupons', 'Coupons'),
		given(
			'cl2-n',
			'n',
			'Coupons broken, plain tape',
			'30',
			'',
			'',
			'Coupon record, batches 5 to 7'
		),
		given(
			'cl2-mean',
			'x_m',
			'Mean strength',
			'120.9',
			'GPa',
			'1.1',
			'Coupon record, batches 5 to 7'
		),
		given(
			'cl2-s',
			's',
			'Standard deviation of the sample',
			'6.1',
			'GPa',
			'',
			'Coupon record, batches 5 to 7'
		),
		given(
			'cl2-k',
			'k_B',
			'Tolerance factor, 0.90 with 0.95, n = 30',
			'1.777',
			'',
			'',
			'NBS Handbook 91, table A-7'
		),
		given(
			'cl2-rho',
			'ρ',
			'Density, as deployed under load',
			'1520',
			'kg/m^3',
			'9',
			'Weighed lengths, batches 5 to 7'
		),
		given(
			'cl2-e',
			'E',
			'Modulus along the tape',
			'940',
			'GPa',
			'18',
			'Coupon record, batches 5 to 7'
		),
		section('cl2-derived', 'Allowable'),
		calculation('cl2-b', 'σ_B', 'Strength, B-basis', 'x_m - k_B s', 'GPa'),
		calculation('cl2-cv', 'c_v', 'Coefficient of variation', 's/x_m', '%', '3'),
		calculation('cl2-spec', 'σ_spec', 'Specific strength', 'σ_B/ρ', 'N/tex'),
		calculation('cl2-strain', 'ε_B', 'Strain at the allowable', 'σ_B/E', '%', '3'),
		section('cl2-checks', 'Checks'),
		check('cl2-c-b', 'B-basis as the programme assumes', 'σ_B', 'ge', '108 GPa'),
		check('cl2-c-cv', 'Scatter within what pooling allows', 'c_v', 'le', '8 %'),
		section('cl2-evidence', 'Evidence'),
		evidence('cl2-record', 'Coupon record, batches 5 to 7')
	],
	frozen: { waivers: [] },
	edits: [],
	additions: [],
	remarks: [
		{
			pinned: 'before the baseline',
			by: 'haddad',
			item: 'cl2-n',
			body: 'Thirty coupons from three batches: was it tested that the batches may be pooled?',
			replies: [
				{
					by: 'lindqvist',
					body: 'Yes, by the k-sample Anderson–Darling test at 2.5 %. I shall add the figure.'
				}
			]
		}
	],
	files: [{ item: 'cl2-record', name: 'tape-coupons.csv', by: 'lindqvist' }]
};

export default tape;
