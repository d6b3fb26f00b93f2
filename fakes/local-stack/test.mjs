import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { findChromium } from './debian.mjs';
import { ensureDependencies, ROOT, runToEnd } from './project.mjs';
import { say } from './say.mjs';
import { startStack } from './stack.mjs';

/** `npm test`: checks, unit, published and integration tests, then a browser on the built product. */

const bin = (name) => join(ROOT, 'node_modules', '.bin', name);

/** Runs one check; it counts as a test that passed or failed. */
async function check(words, command, args) {
	try {
		await runToEnd(command, args, { env: { FORCE_COLOR: '0' } });
		say(`ok      ${words}`);
		return { passed: 1, failed: 0 };
	} catch (error) {
		say(`FAILED  ${words}\n${error.message}`);
		return { passed: 0, failed: 1 };
	}
}

async function checks() {
	await runToEnd(bin('svelte-kit'), ['sync']);
	return [
		await check('format (Prettier)', bin('prettier'), ['--check', '.']),
		await check('rules (ESLint)', bin('eslint'), ['--max-warnings', '0', '.']),
		await check('types (svelte-check)', bin('svelte-check'), ['--fail-on-warnings'])
	];
}

/** A runner's exit code is only believed together with the report it wrote. */
async function runner(words, command, args, report, count, env) {
	say(`\n${words}`);
	let failure = null;
	await runToEnd(command, args, { env, show: true }).catch((error) => (failure = error));
	if (!existsSync(report)) {
		say(`FAILED  ${words}: no report was written. ${failure?.message ?? ''}`);
		return { passed: 0, failed: 1 };
	}
	const counted = count(JSON.parse(readFileSync(report, 'utf8')));
	if (failure !== null && counted.failed === 0) return { ...counted, failed: 1 };
	return counted;
}

const countVitest = ({ numPassedTests, numFailedTests, testResults }) => ({
	passed: numPassedTests,
	// A file that could not be loaded fails without a test of its own.
	failed:
		numFailedTests +
		testResults.filter((it) => it.status === 'failed' && it.assertionResults.length === 0).length
});
const countPlaywright = ({ stats }) => ({
	passed: stats.expected + stats.flaky,
	failed: stats.unexpected
});

async function main() {
	await ensureDependencies();
	const dataFolder = mkdtempSync(join(tmpdir(), 'yardglass-test-'));
	// The database's account must be let through.
	chmodSync(dataFolder, 0o755);
	let stack = null;
	const end = async () => {
		await stack?.stop();
		rmSync(dataFolder, { recursive: true, force: true });
	};
	for (const signal of ['SIGINT', 'SIGTERM'])
		process.once(signal, () => void end().then(() => process.exit(130)));
	const counts = [];
	try {
		const chromium = await findChromium(dataFolder);
		counts.push(...(await checks()));
		stack = await startStack({ dataFolder, port: undefined, throwAway: true });
		const vitestReport = join(dataFolder, 'vitest.json');
		counts.push(
			await runner(
				'Unit, published and integration tests',
				bin('vitest'),
				['run', '--reporter=default', '--reporter=json', `--outputFile.json=${vitestReport}`],
				vitestReport,
				countVitest,
				{
					TEST_DATABASE_URL: stack.adminUrl,
					// The role is the whole server's: tests that let it in keep the password of the stack.
					TEST_WEB_PASSWORD: new URL(stack.webUrl).password,
					STACK_DATA_DIR: dataFolder
				}
			)
		);
		const browserReport = join(dataFolder, 'playwright.json');
		counts.push(
			await runner(
				'Browser tests',
				bin('playwright'),
				['test', '--config', join(ROOT, 'tests/browser/playwright.config.ts')],
				browserReport,
				countPlaywright,
				{
					...chromium.environment,
					CHROMIUM_PATH: chromium.program,
					BASE_URL: stack.origin,
					FORECAST_FAKE_URL: stack.fakes.forecast,
					STACK_DATABASE_URL: stack.databaseUrl,
					PLAYWRIGHT_JSON_OUTPUT_NAME: browserReport,
					PLAYWRIGHT_OUTPUT: join(dataFolder, 'browser-output'),
					DEMO_ACCOUNTS: JSON.stringify(stack.accounts),
					MAIL_URL: stack.fakes.mail ?? ''
				}
			)
		);
	} finally {
		await end();
	}
	const passed = counts.reduce((sum, it) => sum + it.passed, 0);
	const failed = counts.reduce((sum, it) => sum + it.failed, 0);
	say(`\n${passed} passed, ${failed} failed`);
	process.exitCode = failed > 0 || passed === 0 ? 1 : 0;
}

main().catch((error) => {
	process.stderr.write(`${error.stack}\n`);
	say('0 passed, 1 failed');
	process.exit(1);
});
