import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import ts from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

/**
 * The layers, lowest first. A file may import what stands above its own line and nothing below:
 * engine → units, time → api, sentences → components | server → routes.
 */
const layer = (files, message, group, more = {}) => ({
	files,
	rules: {
		'no-restricted-imports': [
			'error',
			{ patterns: [{ group, message, allowTypeImports: false }], ...more }
		]
	}
});

const INSIDE_ENGINE = [
	'**/server/**',
	'**/components/**',
	'**/api/**',
	'**/units/**',
	'**/time/**',
	'**/sentences/**',
	'**/routes/**',
	'$lib/**',
	'$app/**',
	'$env/**',
	'svelte',
	'svelte/**',
	'node:*',
	'drizzle-orm',
	'drizzle-orm/**',
	'undici',
	'pg'
];

export default ts.config(
	{
		ignores: [
			'.svelte-kit/',
			'build/',
			'.local/',
			'node_modules/',
			'drizzle/migrations/',
			'test-results/'
		]
	},
	js.configs.recommended,
	...ts.configs.recommended,
	...svelte.configs.recommended,
	prettier,
	...svelte.configs.prettier,
	{
		languageOptions: { globals: { ...globals.browser, ...globals.node } },
		rules: {
			'no-undef': 'off',
			'@typescript-eslint/no-explicit-any': 'error',
			'@typescript-eslint/no-non-null-assertion': 'error',
			'@typescript-eslint/consistent-type-imports': 'error'
		}
	},
	{
		files: ['**/*.ts', '**/*.svelte', '**/*.svelte.ts'],
		languageOptions: {
			parserOptions: {
				projectService: true,
				extraFileExtensions: ['.svelte']
			}
		},
		rules: {
			'@typescript-eslint/no-floating-promises': 'error',
			'@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: false }],
			'@typescript-eslint/await-thenable': 'error',
			'@typescript-eslint/switch-exhaustiveness-check': 'error'
		}
	},
	{
		files: ['**/*.svelte', '**/*.svelte.ts'],
		languageOptions: { parserOptions: { parser: ts.parser, svelteConfig } }
	},
	layer(
		['src/lib/engine/**'],
		'The engine is pure: it imports only itself, suncalc, date arithmetic and zod.',
		INSIDE_ENGINE
	),
	{
		files: ['src/lib/engine/**'],
		rules: {
			'no-restricted-syntax': [
				'error',
				{
					selector: 'CallExpression[callee.object.name="Date"][callee.property.name="now"]',
					message: 'The engine has no clock: take the time as an argument.'
				},
				{
					selector: 'NewExpression[callee.name="Date"][arguments.length=0]',
					message: 'The engine has no clock: take the time as an argument.'
				}
			]
		}
	},
	layer(
		['src/lib/units/**', 'src/lib/time/**', 'src/lib/api/**', 'src/lib/sentences/**'],
		'Units, times, API schemas and sentences stand below screens and server.',
		[
			'**/server/**',
			'**/components/**',
			'**/routes/**',
			'**/engine/*/**',
			'$lib/server/**',
			'$app/**',
			'$env/**',
			'node:*',
			'drizzle-orm',
			'drizzle-orm/**',
			'pg'
		]
	),
	layer(
		['src/lib/components/**'],
		'Components know no SQL and no server: data comes as props or through $lib/api.',
		[
			'**/server/**',
			'**/routes/**',
			'$lib/server/**',
			'$env/**',
			'**/engine/*/**',
			'drizzle-orm',
			'drizzle-orm/**',
			'pg',
			'node:*'
		]
	),
	layer(
		['src/lib/server/**'],
		'The server knows no screens, and reaches the engine through its public face.',
		['**/components/**', '**/routes/**', '$lib/components/**', 'svelte', '**/engine/*/**']
	),
	layer(['src/routes/**'], 'Routes hold no rules and no SQL: call $lib/server by subject.', [
		'drizzle-orm',
		'drizzle-orm/**',
		'pg',
		'$lib/server/db/schema',
		'$lib/server/db/schema/**',
		'$lib/engine/*/**'
	])
);
