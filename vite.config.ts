import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';

const outsideChecks = ['tests/setup/network.ts'];

export default defineConfig({
	plugins: [tailwindcss(), sveltekit()],
	build: {
		// Fonts must stay files: the page's policy allows fonts from its own origin only.
		assetsInlineLimit: (file) => (/\.(woff2?|ttf)$/.test(file) ? false : undefined)
	},
	test: {
		projects: [
			{
				extends: true,
				test: { name: 'unit', include: ['tests/unit/**/*.test.ts'], setupFiles: outsideChecks }
			},
			{
				extends: true,
				test: {
					name: 'published',
					include: ['tests/published/**/*.test.ts'],
					setupFiles: outsideChecks
				}
			},
			{
				extends: true,
				test: {
					name: 'integration',
					include: ['tests/integration/**/*.test.ts'],
					setupFiles: outsideChecks,
					testTimeout: 60_000,
					hookTimeout: 60_000
				}
			}
		]
	}
});
