import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';

export default defineConfig({
	plugins: [tailwindcss(), sveltekit()],
	test: {
		projects: [
			{
				extends: true,
				test: {
					name: 'pure',
					include: [
						'src/lib/**/*.test.ts',
						'tests/*.test.ts',
						'tests/bench/**/*.test.ts',
						'src/run/**/*.test.js'
					],
					exclude: ['src/lib/server/**'],
					environment: 'node'
				}
			},
			{
				extends: true,
				test: {
					name: 'server',
					include: [
						'src/lib/server/**/*.test.ts',
						'fixtures/**/*.test.ts',
						'tests/trust/**/*.test.ts'
					],
					environment: 'node',
					maxWorkers: 2,
					retry: 1,
					testTimeout: 20_000,
					hookTimeout: 60_000
				}
			}
		]
	}
});
