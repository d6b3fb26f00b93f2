import { expect, test, type Locator, type Page } from '@playwright/test';
import pg from 'pg';
import { accountOf, YARD_PATH } from './accounts';

/** Holds what the hours are found with, as slow work would: the page's laths stay bare meanwhile. */
class HeldHours {
	readonly #client: pg.Client;

	private constructor(client: pg.Client) {
		this.#client = client;
	}

	static async hold(): Promise<HeldHours> {
		const url = process.env.STACK_DATABASE_URL;
		if (url === undefined)
			throw new Error('STACK_DATABASE_URL must be the database of the stack under BASE_URL.');
		const client = new pg.Client({ connectionString: url });
		await client.connect();
		await client.query('begin');
		await client.query('lock table outlooks in access exclusive mode');
		return new HeldHours(client);
	}

	/** Breaks off whatever waits for them, once something does. */
	async breakOff(): Promise<void> {
		await expect
			.poll(async () => {
				const { rowCount } = await this.#client.query(
					`select pg_cancel_backend(pid) from pg_stat_activity
					where datname = current_database() and wait_event_type = 'Lock' and query ~ 'outlooks'`
				);
				return rowCount;
			})
			.toBeGreaterThan(0);
	}

	async letGo(): Promise<void> {
		await this.#client.end();
	}
}

/** Presses the button and comes to the yard as somebody does who is already here: without a new document. */
async function arrive(page: Page): Promise<void> {
	const { email, password } = accountOf('manager');
	await page.goto('/sign-in');
	await page.getByLabel(/e-mail/i).fill(email);
	await page.getByLabel(/passphrase/i).fill(password);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL(`**${YARD_PATH}`);
}

const battens = (page: Page) => page.locator('[role=slider]:not([aria-label=Weather])');
const rows = (page: Page) => page.locator('.boat-group .row');
const placesOf = (of: Locator) =>
	of.evaluateAll((all) =>
		all.map((it) => {
			const { x, y, width, height } = it.getBoundingClientRect();
			return { x, y: y + scrollY, width, height };
		})
	);

const SCREENS = {
	desktop: { viewport: { width: 1440, height: 900 } },
	phone: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
	'small phone': { viewport: { width: 320, height: 640 }, hasTouch: true, isMobile: true }
};

for (const [screen, use] of Object.entries(SCREENS)) {
	test.describe(`while the hours are being found, on a ${screen}`, () => {
		test.use(use);

		test('every row has its bare lath and its name, the steps are counted, and nothing moves when the hours come', async ({
			page
		}) => {
			const held = await HeldHours.hold();
			try {
				await arrive(page);
				await expect(page.getByRole('status')).toContainText(/Finding the hours of \d+\ssteps\./);
				const told = await page.locator('h1').textContent();
				const steps = Number(told?.match(/\d+/)?.[0]);
				await expect(rows(page)).toHaveCount(steps);
				// A lath has its ground; nothing is painted or taped on it, and no hour can be read.
				await expect(rows(page).locator('svg .fill-lath')).toHaveCount(steps);
				await expect(rows(page).locator('svg .fill-paint-fill, svg .stroke-tape')).toHaveCount(0);
				await expect(battens(page)).toHaveCount(0);
				await expect(page.locator('.board')).toHaveAttribute('aria-busy', 'true');
				await expect(page.getByRole('slider', { name: 'Weather' })).toBeVisible();
				await expect(page.getByText(/Forecast of/)).toBeVisible();
				await page.evaluate(() => document.fonts.ready);
				const before = await placesOf(rows(page));
				await held.letGo();
				await expect(battens(page)).toHaveCount(steps);
				await expect(page.getByRole('status')).toContainText(/oday|omorrow/);
				const after = await placesOf(rows(page));
				expect(after).toHaveLength(before.length);
				// The italic of a boat's name raises its line by a fifth of a pixel: less than half is no move.
				after.forEach((place, i) => {
					for (const side of ['x', 'y', 'width', 'height'] as const)
						expect(Math.abs(place[side] - before[i][side]), `${side} of ${i}`).toBeLessThan(0.5);
				});
				await expect(page.locator('.board')).toHaveAttribute('aria-busy', 'false');
			} finally {
				await held.letGo().catch(() => undefined);
			}
		});
	});
}

test('hours that could not be found are said to be, with their number, and can be asked for again', async ({
	page
}) => {
	await page.setViewportSize({ width: 1440, height: 900 });
	const held = await HeldHours.hold();
	try {
		await page.route('**/api/v1/yards/*/hours', (route) =>
			route.fulfill({ status: 500, json: { title: 'Broken', requestId: '5f2c11aa' } })
		);
		await arrive(page);
		await expect(page.getByRole('status')).toContainText('Finding the hours');
		await held.breakOff();
		const trouble = page.getByRole('alert');
		await expect(trouble).toContainText('These hours could not be found.');
		await expect(trouble).toContainText('5f2c11aa');
		await expect(page.locator('h1')).not.toContainText('Finding');
		await expect(battens(page)).toHaveCount(0);
		await held.letGo();
		await page.unroute('**/api/v1/yards/*/hours');
		await trouble.getByRole('button', { name: 'Find them again' }).click();
		await expect(battens(page).first()).toBeVisible();
		await expect(trouble).toBeHidden();
	} finally {
		await held.letGo().catch(() => undefined);
	}
});
