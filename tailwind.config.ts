import type { Config } from 'tailwindcss';
import forms from '@tailwindcss/forms';

const tokens = [
	'paper',
	'blotter',
	'sheet',
	'stub',
	'ink',
	'ink2',
	'rule',
	'edge',
	'cutedge',
	'tar',
	'buoy',
	'buoy-hover',
	'on-buoy',
	'kelp',
	'kelp-wash',
	'rope',
	'rope-wash',
	'rope-band',
	'hull',
	'hull-wash',
	'deep',
	'deep-wash'
];

export default {
	content: [],
	plugins: [forms({ strategy: 'class' })],
	theme: {
		colors: {
			transparent: 'transparent',
			current: 'currentColor',
			...Object.fromEntries(tokens.map((token) => [token, `var(--${token})`]))
		},
		fontFamily: {
			sans: ['Barlow', 'sans-serif'],
			label: ['"Barlow Semi Condensed"', 'sans-serif'],
			mono: ['"Roboto Mono"', 'monospace']
		},
		borderRadius: { none: '0', badge: '2px', control: '3px', full: '9999px' }
	}
} satisfies Config;
