import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

const outsideChecks = ['tests/setup/network.ts'];

/**
 * Faces that come after the page is drawn wait for the next page: swapped in late they would move
 * what is being read. They are preloaded, so that this is rare.
 */
const steadyFaces: Plugin = {
	name: 'steady-faces',
	generateBundle(_, bundle) {
		for (const file of Object.values(bundle)) {
			if (file.type !== 'asset' || !file.fileName.endsWith('.css')) continue;
			file.source = String(file.source).replaceAll(
				/font-display:\s*swap/g,
				'font-display:optional'
			);
		}
	}
};

export default defineConfig({
	plugins: [tailwindcss(), sveltekit(), steadyFaces],
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
