import { expect, test, type Page } from '@playwright/test';
import { signIn, YARD_PATH } from './accounts';

test.describe.configure({ timeout: 120_000 });

/** Drops a step of a job, which asks once. */
async function drop(page: Page, step: string): Promise<void> {
	await page.getByRole('button', { name: `Drop ${step}`, exact: true }).click();
	await expect(page.getByText('It stays written as dropped')).toBeVisible();
	await page
		.getByRole('form', { name: `Drop ${step}?` })
		.getByRole('button')
		.click();
	await expect(page.getByRole('button', { name: `Drop ${step}`, exact: true })).toHaveCount(0);
}

test('a manager adds a boat and queues a usual job, and the Hours page shows its steps', async ({
	page,
	browser
}) => {
	const boat = `Greenshank ${Date.now() % 100_000}`;
	await signIn(page, 'manager');
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByLabel('name', { exact: true }).fill(boat);
	await page.getByLabel('stand', { exact: true }).fill('44');
	await page.getByLabel('heading of the bow').fill('sideways');
	await page.getByRole('button', { name: 'Add the boat' }).click();
	await expect(page.getByText('Type where the bow points')).toBeVisible();
	await expect(page.getByLabel('name', { exact: true })).toHaveValue(boat);
	await page.getByLabel('heading of the bow').fill('275');
	await page.getByRole('button', { name: 'Add the boat' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText(boat);
	await page
		.getByLabel('job', { exact: true })
		.selectOption({ label: 'Antifouling for the season' });
	await page.getByRole('button', { name: 'Queue it' }).click();
	await expect(page.getByText('antifouling 2')).toBeVisible();
	await page.getByRole('link', { name: 'Antifouling for the season' }).click();
	await drop(page, 'wet sand');
	await expect(page.getByText('dropped', { exact: true })).toBeVisible();
	await page.goto(YARD_PATH);
	await expect(page.getByText(boat).first()).toBeVisible();

	const owner = await browser.newPage();
	await signIn(owner, 'owner');
	await expect(owner.getByText(boat)).toHaveCount(0);
	await owner.goto(`${YARD_PATH}/boats`);
	await expect(owner.getByText(boat)).toHaveCount(0);
	await owner.close();

	// Leave the demo yard's queue as it was.
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByRole('link', { name: boat }).click();
	await page.getByRole('link', { name: 'Antifouling for the season' }).click();
	for (const step of ['wash the bottom', 'antifouling 1', 'antifouling 2']) await drop(page, step);
	await expect(page.getByText('queued', { exact: true })).toHaveCount(0);
});
