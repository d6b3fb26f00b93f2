import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { gzipSync } from 'node:zlib';
import { signIn, YARD_PATH } from './accounts';

const SCHEMES = ['light', 'dark'] as const;
const SCREENS = {
	desktop: { viewport: { width: 1440, height: 900 } },
	phone: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true }
};
/** KiB of gzipped script that the first screen may load. */
const MOST_SCRIPT = 90;

const battens = (page: Page) => page.locator('[role=slider]:not([aria-label=Weather])');

/** Violations of WCAG 2.2 A and AA that axe finds, in a line each. */
async function violations(page: Page): Promise<string[]> {
	const { violations: found } = await new AxeBuilder({ page })
		.withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'])
		.analyze();
	return found.map(
		(it) => `${it.id}: ${it.nodes[0]?.target.join(' ')} ${it.nodes[0]?.failureSummary}`
	);
}

for (const [screen, use] of Object.entries(SCREENS)) {
	for (const colorScheme of SCHEMES) {
		test.describe(`axe on a ${screen}, ${colorScheme}`, () => {
			test.use({ ...use, colorScheme });

			test('finds nothing on the Hours page, its reading, its table and its menu', async ({
				page
			}) => {
				// Four times over every node of a page: the slowest of the tests.
				test.setTimeout(180_000);
				await signIn(page, 'owner');
				await expect(battens(page).first()).toBeVisible();
				expect(await violations(page)).toEqual([]);
				await battens(page).first().press('Enter');
				await expect(page.getByRole('dialog').locator('tbody tr').first()).toBeVisible();
				expect(await violations(page)).toEqual([]);
				await page.keyboard.press('Escape');
				await page.getByText('Hours as a table').click();
				await expect(page.getByRole('table').first()).toBeVisible();
				expect(await violations(page)).toEqual([]);
				await page.getByRole('button', { name: /, owner$/ }).click();
				await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();
				expect(await violations(page)).toEqual([]);
			});

			test('finds nothing on the front page and on sign-in with its error', async ({ page }) => {
				await page.goto('/');
				expect(await violations(page)).toEqual([]);
				await page.goto('/sign-in');
				await page.getByLabel('e-mail').fill('nobody@yard.example');
				await page.getByLabel('passphrase').fill('not this one');
				await page.getByRole('button', { name: 'Sign in' }).click();
				await expect(page.getByRole('alert')).not.toBeEmpty();
				expect(await violations(page)).toEqual([]);
			});
		});
	}
}

test.describe('the theme', () => {
	test.use({ viewport: { width: 1440, height: 900 }, colorScheme: 'light' });

	const ground = (page: Page) =>
		page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);

	test('follows the system until it is fixed, and is remembered before anything is drawn', async ({
		page
	}) => {
		await signIn(page, 'owner');
		const light = await ground(page);
		await page.emulateMedia({ colorScheme: 'dark' });
		const dark = await ground(page);
		expect(dark).not.toBe(light);
		await page.getByRole('button', { name: /, owner$/ }).click();
		await page.getByRole('radio', { name: 'Light' }).check({ force: true });
		expect(await ground(page)).toBe(light);
		// The policy of the page lets this script run, and it runs before the body is there.
		await page.addInitScript(() => {
			new MutationObserver(() => {
				if (!document.body || 'themeAtBody' in window) return;
				Object.assign(window, { themeAtBody: document.documentElement.dataset.theme });
			}).observe(document, { childList: true, subtree: true });
		});
		await page.reload();
		expect(await page.evaluate(() => Reflect.get(window, 'themeAtBody'))).toBe('light');
		expect(await ground(page)).toBe(light);
		await page.getByRole('button', { name: /, owner$/ }).click();
		await expect(page.getByRole('radio', { name: 'Light' })).toBeChecked();
	});
});

test.describe('what a phone must load', () => {
	test.use(SCREENS.phone);

	test(`the first screen needs under ${MOST_SCRIPT} kB of script, and no checking library`, async ({
		page
	}) => {
		await signIn(page, 'owner');
		const fresh = await page.context().newPage();
		const scripts: Promise<Buffer>[] = [];
		fresh.on('response', (response) => {
			if (response.request().resourceType() === 'script') scripts.push(response.body());
		});
		await fresh.goto(YARD_PATH);
		await fresh.waitForLoadState('networkidle');
		const bodies = await Promise.all(scripts);
		const bytes = bodies.reduce((sum, it) => sum + gzipSync(it, { level: 9 }).length, 0);
		expect(bytes).toBeGreaterThan(0);
		expect(bytes).toBeLessThan(MOST_SCRIPT * 1000);
		expect(bodies.some((it) => it.includes('ZodError') || it.includes('invalid_type'))).toBe(false);
	});
});

test.describe('the faces', () => {
	const fileOf = (path: string) => path.split('/').at(-1) ?? '';
	/** Files of the faces that the page was in the end set in. */
	const used = async (page: Page) => {
		await page.evaluate(() => document.fonts.ready);
		const names = await page.evaluate(() =>
			performance.getEntriesByType('resource').map(({ name }) => name)
		);
		return names
			.filter((it) => it.endsWith('.woff2'))
			.map(fileOf)
			.sort();
	};
	const loaded = (page: Page) =>
		page.evaluate(() => [...document.fonts].filter((it) => it.status === 'loaded').length);

	test('are asked for with the page, those it is set in and no others', async ({ page }) => {
		for (const path of ['/', '/sign-in', YARD_PATH]) {
			if (path === YARD_PATH) await signIn(page, 'owner');
			const answer = await page.goto(path);
			const links = (await answer?.headerValue('link')) ?? '';
			const asked = [...links.matchAll(/<([^>]+\.woff2)>; rel="preload"/g)].map((it) =>
				fileOf(it[1])
			);
			expect(asked.sort(), path).toEqual(await used(page));
			expect(asked, path).toHaveLength(await loaded(page));
			expect(asked.length, path).toBeGreaterThan(0);
		}
	});

	test('move nothing when they come', async ({ page }) => {
		await page.setViewportSize({ width: 390, height: 844 });
		for (const path of ['/', '/sign-in', YARD_PATH]) {
			if (path === YARD_PATH) await signIn(page, 'owner');
			await page.goto(path, { waitUntil: 'networkidle' });
			const moved = await page.evaluate(
				() =>
					new Promise<number>((resolve) => {
						let sum = 0;
						new PerformanceObserver((list) => {
							for (const entry of list.getEntries()) {
								const value: unknown = Reflect.get(entry, 'value');
								if (typeof value === 'number') sum += value;
							}
							resolve(sum);
						}).observe({ type: 'layout-shift', buffered: true });
						setTimeout(() => resolve(sum), 500);
					})
			);
			expect(moved, path).toBeLessThan(0.02);
		}
	});
});

test.describe('with less motion asked for', () => {
	test.use({ viewport: { width: 1440, height: 900 }, contextOptions: { reducedMotion: 'reduce' } });

	test('nothing is animated', async ({ page }) => {
		await signIn(page, 'owner');
		const running = await page.evaluate(
			() =>
				document.getAnimations().filter((it) => it.effect?.getComputedTiming().duration !== 0)
					.length
		);
		expect(running).toBe(0);
	});
});

for (const [screen, use] of Object.entries(SCREENS)) {
	test.describe(`with the text twice as large on a ${screen}`, () => {
		test.use(use);

		test('neither the Hours page nor a reading is cut off sideways', async ({ page }) => {
			await signIn(page, 'owner');
			await page.evaluate(() => (document.documentElement.style.fontSize = '200%'));
			const width = use.viewport.width;
			const overflowing = (selector: string) =>
				page.locator(selector).evaluate((it) => it.scrollWidth - it.clientWidth);
			expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(width);
			await expect(page.getByRole('heading', { level: 1 })).toBeInViewport();
			await battens(page).first().press('Enter');
			await expect(page.getByRole('dialog').locator('tbody tr').first()).toBeVisible();
			expect(await overflowing('dialog')).toBe(0);
			await expect(page.getByRole('button', { name: 'Close the reading' })).toBeInViewport({
				ratio: 1
			});
		});
	});
}
