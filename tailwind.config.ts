import type { Config } from 'tailwindcss';

/** Names for the design tokens of src/app.css, which holds their values for light and dark. */
export default {
	content: [],
	theme: {
		extend: {
			colors: {
				chalk: 'var(--chalk)',
				lath: 'var(--lath)',
				edge: 'var(--edge)',
				rim: 'var(--rim)',
				ink: 'var(--ink)',
				'ink-soft': 'var(--ink-soft)',
				paint: 'var(--paint)',
				'paint-fill': 'var(--paint-fill)',
				'on-paint': 'var(--on-paint)',
				tape: 'var(--tape)',
				'tape-ground': 'var(--tape-ground)',
				oxide: 'var(--oxide)',
				signal: 'var(--signal)'
			},
			fontFamily: {
				label: ['"Barlow Condensed"', 'Arial Narrow', 'sans-serif'],
				read: ['"Atkinson Hyperlegible Next Variable"', 'Verdana', 'sans-serif']
			},
			screens: { sm: '640px', lg: '1024px', xl: '1440px' }
		}
	}
} satisfies Config;
