import type { Config } from 'tailwindcss';

const token = (name: string) => `var(--${name})`;

export default {
	content: ['./src/**/*.{html,svelte,ts}'],
	theme: {
		extend: {
			colors: Object.fromEntries(
				[
					'ink',
					'paper',
					'tag',
					'tag-deep',
					'kraft',
					'kraft-deep',
					'verdigris',
					'brass',
					'oxide',
					'slate',
					'rule',
					'white'
				].map((name) => [name, token(name)])
			),
			fontFamily: {
				sans: ['Archivo Variable', 'system-ui', 'sans-serif'],
				mono: ['Spline Sans Mono', 'ui-monospace', 'monospace']
			}
		}
	}
} satisfies Config;
