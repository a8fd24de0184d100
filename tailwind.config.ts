import type { Config } from 'tailwindcss';

/** Every colour is a token of `src/app.css`, where its light and dark values stand. */
const token = (name: string) => `var(--${name})`;

export default {
	content: [],
	theme: {
		colors: {
			transparent: 'transparent',
			current: 'currentColor',
			desk: token('desk'),
			paper: token('paper'),
			raised: token('raised'),
			tint: token('tint'),
			ink: { DEFAULT: token('ink'), 2: token('ink-2'), 3: token('ink-3') },
			rule: { DEFAULT: token('rule'), 2: token('rule-2') },
			line: token('line'),
			holds: token('holds'),
			thin: { DEFAULT: token('thin'), wash: token('thin-wash') },
			fails: { DEFAULT: token('fails'), wash: token('fails-wash') },
			waits: token('waits'),
			live: { DEFAULT: token('live'), wash: token('live-wash') },
			'in-wash': token('in-wash'),
			hatch: token('hatch'),
			fill: token('fill'),
			focus: token('focus')
		},
		fontFamily: {
			sans: ['Inter', 'Helvetica Neue', 'Arial', 'sans-serif'],
			mono: ['JetBrains Mono Variable', 'JetBrains Mono', 'DejaVu Sans Mono', 'monospace']
		},
		fontSize: {
			label: ['10.5px', { lineHeight: '16px', letterSpacing: '0.075em', fontWeight: '600' }],
			small: ['12px', '16px'],
			row: ['13.5px', '20px'],
			prose: ['14.5px', '24px'],
			head: ['15px', { lineHeight: '20px', fontWeight: '600' }],
			figure: ['20px', { lineHeight: '24px', fontWeight: '500' }],
			title: ['26px', { lineHeight: '32px', fontWeight: '600' }]
		},
		fontWeight: { normal: '400', medium: '500', semibold: '600' },
		borderRadius: { none: '0' },
		boxShadow: { none: 'none' },
		borderWidth: { 0: '0', DEFAULT: '1px', mid: '1.5px', 2: '2px' },
		// Where both hold the later one wins: a phone is narrow too.
		screens: { narrow: { max: '1099px' }, phone: { max: '639px' }, sm: '640px', lg: '1100px' }
	}
} satisfies Config;
