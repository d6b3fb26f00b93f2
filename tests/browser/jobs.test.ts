import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { signIn, YARD_PATH } from './accounts';

test.describe.configure({ timeout: 120_000 });

/** Boats of these tests, taken away again: other tests count what the demo yard has queued. */
const made: string[] = [];
test.afterEach(async ({ page }) => {
	for (const boat of made.splice(0)) {
		const address = `/api/v1/yards${YARD_PATH}/boats/${boat}`;
		const { revision } = await (await page.request.get(address)).json();
		const answer = await page.request.delete(`${address}?revision=${revision}&settled=true`);
		expect(answer.status()).toBe(204);
	}
});

/** A job of a boat of this test's own, with a usual job queued on it. */
async function ownJob(page: Page): Promise<void> {
	await signIn(page, 'manager');
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByLabel('name', { exact: true }).fill(`Ruff ${Date.now() % 100_000}`);
	await page.getByLabel('heading of the bow').fill('90');
	await page.getByRole('button', { name: 'Add the boat' }).click();
	await expect(page).toHaveURL(/\/boats\/[0-9a-f-]{36}$/);
	made.push(page.url().slice(-36));
	await page
		.getByLabel('job', { exact: true })
		.selectOption({ label: 'Antifouling for the season' });
	await page.getByRole('button', { name: 'Queue it' }).click();
	await page.getByRole('link', { name: 'Antifouling for the season' }).click();
	await expect(page.getByRole('heading', { name: 'Plans to choose from' })).toBeVisible();
}

const names = (page: Page) =>
	page
		.locator('[data-step] .font-label.text-lg')
		.evaluateAll((all) => all.map((it) => it.textContent.trim()));

test('steps are put in another order with the keyboard, and by dragging', async ({ page }) => {
	await ownJob(page);
	expect(await names(page)).toEqual([
		'wash the bottom',
		'wet sand',
		'antifouling 1',
		'antifouling 2'
	]);
	await page.getByRole('button', { name: 'Move wet sand up' }).focus();
	await page.keyboard.press('Enter');
	await expect
		.poll(() => names(page))
		.toEqual(['wet sand', 'wash the bottom', 'antifouling 1', 'antifouling 2']);
	const grips = page.locator('[data-grip]');
	await grips.nth(0).scrollIntoViewIfNeeded();
	await grips.nth(0).hover();
	await page.mouse.down();
	const [from, to] = [await grips.nth(0).boundingBox(), await grips.nth(1).boundingBox()];
	const x = (from?.x ?? 0) + 20;
	for (let part = 1; part <= 10; part++)
		await page.mouse.move(
			x,
			(from?.y ?? 0) + 20 + (((to?.y ?? 0) - (from?.y ?? 0) + 60) * part) / 10
		);
	await page.mouse.up();
	await expect
		.poll(() => names(page))
		.toEqual(['wash the bottom', 'wet sand', 'antifouling 1', 'antifouling 2']);
	await page.reload();
	expect((await names(page))[0]).toBe('wash the bottom');
});

test('a plan is taken, says who took it, and is let go', async ({ page }) => {
	await ownJob(page);
	await page.getByRole('button', { name: 'Take this plan: Soonest' }).click();
	await expect(page.getByRole('heading', { name: 'The plan in force', exact: true })).toBeVisible();
	await expect(page.getByText(/Soonest, taken by Ilse Marrow/)).toBeVisible();
	await page.getByRole('button', { name: 'Let this plan go' }).click();
	await expect(page.getByRole('heading', { name: 'The plan in force', exact: true })).toHaveCount(
		0
	);
});

test('a step’s form says at its field what is wrong and keeps what was typed', async ({ page }) => {
	await ownJob(page);
	await page.getByRole('link', { name: 'Add a step' }).click();
	await page.getByLabel('name', { exact: true }).fill('barrier, thick');
	await page.getByLabel('hours of work').fill('a day');
	await page.getByRole('button', { name: 'Add the step' }).click();
	await expect(page.getByText('Type how many hours the work takes')).toBeVisible();
	await expect(page.getByText('Choose at least one face.')).toBeVisible();
	await expect(page.getByLabel('name', { exact: true })).toHaveValue('barrier, thick');
	await page.getByLabel('hours of work').fill('2,5');
	await page.getByLabel('starboard bottom').check();
	await page.getByRole('button', { name: 'Add the step' }).click();
	await expect(page.getByText('Choose the sheet of what is laid')).toBeVisible();
	await page.getByLabel('sheet of what is laid').selectOption({ index: 3 });
	await page.getByRole('button', { name: 'Add the step' }).click();
	await expect(page.getByText('barrier, thick', { exact: true }).first()).toBeVisible();
	await expect(page.getByText(/^2.5 h/)).toBeVisible();
});

test('what another changed meanwhile is told, and nothing is written over', async ({
	page,
	browser
}) => {
	await ownJob(page);
	const other = await browser.newPage();
	await signIn(other, 'manager');
	await other.goto(page.url());
	await page.getByRole('button', { name: 'Begin: wash the bottom' }).click();
	await expect(page.getByText('under way')).toBeVisible();
	await other.getByRole('button', { name: 'Begin: wash the bottom' }).click();
	await expect(other.getByText(/changed this while you had it open/)).toBeVisible();
	await other.close();
});

for (const scheme of ['light', 'dark'] as const) {
	test(`nothing to find fault with for axe, ${scheme}, at 320 and 1440 px`, async ({ page }) => {
		await page.emulateMedia({ colorScheme: scheme });
		await ownJob(page);
		const job = page.url();
		for (const width of [320, 1440]) {
			await page.setViewportSize({ width, height: 900 });
			for (const path of [job, `${job}/steps/new`, `${YARD_PATH}/settings/times`]) {
				await page.goto(path);
				const { violations } = await new AxeBuilder({ page }).analyze();
				expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0].html}`)).toEqual([]);
				const wide = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
				expect(wide, `${path} at ${width}`).toBeLessThanOrEqual(0);
			}
		}
	});
}
