import { defineConfig, type ReporterDescription } from '@playwright/test';

const reporters: ReporterDescription[] = [['list']];
if (process.env.PLAYWRIGHT_JSON_OUTPUT_NAME !== undefined) reporters.push(['json']);

export default defineConfig({
	testDir: '.',
	testMatch: '*.test.ts',
	outputDir: process.env.PLAYWRIGHT_OUTPUT ?? '../../test-results',
	// One yard, one weather: tests that turn the weather's faults on must not meet.
	workers: 1,
	timeout: 60_000,
	reporter: reporters,
	use: {
		baseURL: process.env.BASE_URL,
		launchOptions: {
			executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
			args: [
				'--no-sandbox',
				'--disable-gpu',
				'--disable-quic',
				'--no-first-run',
				'--disable-background-networking',
				'--disable-component-update',
				'--disable-sync'
			]
		}
	}
});
