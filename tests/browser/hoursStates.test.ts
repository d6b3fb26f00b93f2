import { expect, test, type Page } from '@playwright/test';
import type { Hours } from '../../src/lib/api/hours';
import { hoursFixture } from '../fixtures/hours';
import { signIn } from './accounts';

/** The page asks for newer hours every five minutes. */
const LATER = '05:05';

/** The next hours that come, in place of the yard's own. */
async function nextHours(page: Page, hours: Hours): Promise<void> {
	await page.route('**/api/v1/yards/*/hours', (route) => route.fulfill({ json: hours }));
	await page.clock.fastForward(LATER);
}

const battens = (page: Page) => page.locator('[role=slider]:not([aria-label=Weather])');

test.beforeEach(async ({ page }) => {
	await page.clock.install();
	await signIn(page, 'manager');
	await expect(battens(page).first()).toBeVisible();
});

test.describe('on a desktop', () => {
	test.use({ viewport: { width: 1440, height: 900 } });

	test('newer hours take the place of the old ones while the page is open', async ({ page }) => {
		const hours = hoursFixture();
		await nextHours(page, hours);
		await expect(page.getByRole('heading', { level: 1 })).toContainText('Marigold');
		await expect(battens(page)).toHaveCount(5);
		await expect(page.getByText('09:45', { exact: true }).first()).toBeVisible();
	});

	test('by day four days and their labels fit between the margins; at night no hour is left out', async ({
		page
	}) => {
		const wider = () => page.locator('.board').evaluate((it) => it.scrollWidth - it.clientWidth);
		await nextHours(page, hoursFixture());
		await expect(page.getByRole('heading', { level: 1 })).toContainText('Marigold');
		expect(await wider()).toBe(0);
		await page.unrouteAll();
		await nextHours(page, hoursFixture({ now: '2026-05-11T23:20:00.000Z' }));
		await expect(page.locator('svg text', { hasText: /^00:20$/ })).toBeVisible();
		expect(await wider()).toBe(24);
	});

	test('a stale forecast is drawn as ever, its age said in words and beside every step', async ({
		page
	}) => {
		const hours = hoursFixture();
		const forecast = hours.forecast && {
			...hours.forecast,
			stale: true,
			ageMinutes: 9 * 60 + 10,
			origin: 'lastGood' as const,
			trouble: 'Neither source has answered since 08:00.'
		};
		await nextHours(page, { ...hours, forecast });
		await expect(page.getByText('forecast 9 h old', { exact: true })).toHaveCount(5);
		await expect(page.getByText(/the last one that came, 9 h old/)).toBeVisible();
		await expect(page.getByText('Neither source has answered since 08:00.')).toBeVisible();
		await expect(page.getByRole('button', { name: 'Ask now' })).toBeVisible();
	});

	test('asking now posts once and says what came of it', async ({ page }) => {
		const hours = hoursFixture({ forecast: null });
		let asked = 0;
		await page.route('**/api/v1/yards/*/forecast', (route) => {
			asked++;
			return route.fulfill({ json: { troubles: ['Both sources are silent.'] } });
		});
		await nextHours(page, hours);
		await expect(page.getByText('No forecast has come yet. Nothing is guessed.')).toBeVisible();
		await page.getByRole('button', { name: 'Ask now' }).click();
		await expect(page.getByText('Both sources are silent.')).toBeVisible();
		expect(asked).toBe(1);
	});

	test('a missing value is named on the laths it shuts and on its band', async ({ page }) => {
		const hours = hoursFixture();
		const dewPoint = hours.bands.dewPoint.map((it, slot) => (slot < 300 ? it : null));
		await nextHours(page, { ...hours, bands: { ...hours.bands, dewPoint } });
		// One lath of the fixture is shut by it, and the band itself.
		await expect(page.locator('svg text', { hasText: 'no dew point' })).toHaveCount(2);
	});

	test('a yard without jobs says what belongs here and still shows the weather', async ({
		page
	}) => {
		const headline: Hours['headline'] = [{ text: 'No jobs are queued yet.', role: 'plain' }];
		await nextHours(page, hoursFixture({ boats: [], headline }));
		await expect(page.getByRole('heading', { level: 1 })).toHaveText('No jobs are queued yet.');
		await expect(battens(page)).toHaveCount(0);
		await expect(page.getByRole('slider', { name: 'Weather' })).toBeVisible();
		await expect(page.getByText('Until then, here is the weather.')).toBeVisible();
	});

	test('a failure keeps the last hours, gives its number, and the next answer clears it', async ({
		page
	}) => {
		const before = await page.getByRole('heading', { level: 1 }).textContent();
		await page.route('**/api/v1/yards/*/hours', (route) =>
			route.fulfill({
				status: 500,
				contentType: 'application/problem+json',
				body: JSON.stringify({ title: 'Broken', status: 500, requestId: '5f2c11aa' })
			})
		);
		await page.clock.fastForward(LATER);
		// The first failure is tried again by itself.
		await page.clock.fastForward('00:05');
		const trouble = page.getByRole('alert');
		await expect(trouble).toContainText('These hours could not be found again.');
		await expect(trouble).toContainText('number 5f2c11aa');
		await expect(trouble).toContainText(/Below are the hours found at \d\d:\d\d/);
		await expect(page.getByRole('heading', { level: 1 })).toHaveText(before ?? '');
		await expect(battens(page).first()).toBeVisible();
		await page.unroute('**/api/v1/yards/*/hours');
		await page.getByRole('button', { name: 'Find them again' }).click();
		await expect(trouble).toBeHidden();
	});

	test('a session that has ended is said to have, with the way back', async ({ page }) => {
		await page.route('**/api/v1/yards/*/hours', (route) =>
			route.fulfill({ status: 401, json: {} })
		);
		await page.clock.fastForward(LATER);
		await page.clock.fastForward('00:05');
		await expect(page.getByRole('alert')).toContainText('You have been signed out');
		await expect(page.getByRole('link', { name: 'Sign in again' })).toBeVisible();
	});

	test('a reading that fails says so inside its dialog and can be read again', async ({ page }) => {
		await page.route('**/reading?*', (route) =>
			route.fulfill({ status: 503, json: { detail: 'Not now.', requestId: 'ab12cd34' } })
		);
		await battens(page).first().press('Enter');
		const dialog = page.getByRole('dialog');
		await expect(dialog).toBeVisible();
		await page.clock.fastForward('00:05');
		await expect(dialog.getByRole('alert')).toContainText('Not now.');
		await expect(dialog.getByRole('alert')).toContainText('ab12cd34');
		await page.unroute('**/reading?*');
		await dialog.getByRole('button', { name: 'Read it again' }).click();
		await expect(dialog.locator('tbody tr').first()).toBeVisible();
	});

	test('the plumb line moves with the minutes', async ({ page }) => {
		await nextHours(page, hoursFixture());
		await expect(page.locator('svg text', { hasText: /^17:40$/ })).toBeVisible();
		// Three minutes, and the twenty seconds between two looks at the clock.
		await page.clock.runFor('03:20');
		await expect(page.locator('svg text', { hasText: /^17:43$/ })).toBeVisible();
	});
});

test.describe('on a phone', () => {
	test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

	test('the step the sentence names is drawn first and large, its start over it', async ({
		page
	}) => {
		await nextHours(page, hoursFixture({ spokenStep: 'step-1' }));
		const first = battens(page).first();
		await expect(first).toHaveAccessibleName('Marigold, coat 2, starboard topsides');
		await expect(first.locator('svg')).toHaveAttribute('height', '64');
		await expect(first.getByText('10:15', { exact: true })).toBeVisible();
		await expect(battens(page)).toHaveCount(6);
	});

	test('a step with no start on the day looked at tells its next one', async ({ page }) => {
		await nextHours(page, hoursFixture());
		await expect(page.getByText('Thu 17:15', { exact: true })).toBeVisible();
	});
});

test.describe('of a reader in another zone', () => {
	test.use({ viewport: { width: 1440, height: 900 }, timezoneId: 'America/Los_Angeles' });

	test('times stay the yard’s, and its zone is named', async ({ page }) => {
		await nextHours(page, hoursFixture());
		await expect(page.getByText('Times are the yard’s, Europe/Lisbon.')).toBeVisible();
		await expect(page.locator('svg text', { hasText: /^17:40$/ })).toBeVisible();
	});
});
