import { expect, test } from '@playwright/test';
import { photoWithPlace, program } from '../fixtures/files';
import { signIn, YARD_PATH } from './accounts';

test.describe.configure({ timeout: 120_000 });

/** Seen by the demo's owner, and one that is another's. */
const OWN_BOAT = 'Corncrake';
const FOREIGN_BOAT = 'Pipistrelle';

test('an owner adds a photo to a boat and sees it; to another owner it is not there', async ({
	page,
	browser
}) => {
	const caption = `rudder, primed ${Date.now() % 100_000}`;
	const photo = { name: 'rudder.jpg', mimeType: 'image/jpeg', buffer: await photoWithPlace() };
	const renamed = { name: 'keel.jpg', mimeType: 'image/jpeg', buffer: program() };
	await signIn(page, 'owner');
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByRole('link', { name: OWN_BOAT }).click();
	await page.getByLabel('caption', { exact: true }).fill(caption);
	await page.getByLabel('photos and PDFs', { exact: true }).setInputFiles([photo, renamed]);
	await page.getByRole('button', { name: 'Add', exact: true }).click();
	await expect(page.getByText(/keel\.jpg is a program for Windows/).last()).toBeVisible();
	const small = page.getByRole('img', { name: caption });
	await expect(small).toBeVisible();
	await expect
		.poll(() => small.evaluate((it) => it instanceof HTMLImageElement && it.naturalWidth))
		.toBe(240);
	await small.click();
	const large = page.getByRole('dialog', { name: caption });
	await expect(large.getByRole('img', { name: caption })).toBeVisible();
	const address = await large.getByRole('link', { name: /full size/ }).getAttribute('href');
	await large.getByRole('button', { name: 'Close the picture' }).click();
	await expect(large).toBeHidden();
	expect((await page.request.get(address ?? '')).status()).toBe(200);

	// A photo on another's boat, which the manager adds, by its address.
	const manager = await browser.newPage();
	await signIn(manager, 'manager');
	await manager.goto(`${YARD_PATH}/boats`);
	await manager.getByRole('link', { name: FOREIGN_BOAT }).click();
	await manager.getByLabel('caption', { exact: true }).fill(caption);
	await manager.getByLabel('photos and PDFs', { exact: true }).setInputFiles(photo);
	await manager.getByRole('button', { name: 'Add', exact: true }).click();
	const theirs = manager.getByRole('img', { name: caption });
	await expect(theirs).toBeVisible();
	const foreign = (await theirs.getAttribute('src')) ?? '';
	expect((await manager.request.get(foreign)).status()).toBe(200);
	expect((await page.request.get(foreign)).status()).toBe(404);

	for (const [it, picture] of [
		[page, small],
		[manager, theirs]
	] as const) {
		await it.getByText(`Delete ${caption}`).click();
		await it.getByRole('button', { name: `Delete ${caption} for good` }).click();
		await expect(picture).toHaveCount(0);
	}
	expect((await page.request.get(address ?? '')).status()).toBe(404);
	await manager.close();
});

test('without scripts a form adds photos, says what it refused, and keeps the caption', async ({
	browser
}) => {
	const context = await browser.newContext({ javaScriptEnabled: false });
	const page = await context.newPage();
	const caption = `hatch ${Date.now() % 100_000}`;
	await signIn(page, 'owner');
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByRole('link', { name: OWN_BOAT }).click();
	await page.getByLabel('caption', { exact: true }).fill(caption);
	await page.getByLabel('photos and PDFs', { exact: true }).setInputFiles([
		{ name: 'keel.jpg', mimeType: 'image/jpeg', buffer: program() },
		{ name: 'hatch.jpg', mimeType: 'image/jpeg', buffer: await photoWithPlace() }
	]);
	await page.getByRole('button', { name: 'Add', exact: true }).click();
	await expect(page.getByRole('alert')).toContainText('keel.jpg is a program for Windows');
	await expect(page.getByLabel('caption', { exact: true })).toHaveValue(caption);
	await expect(page.getByRole('img', { name: caption })).toBeVisible();
	await page.getByText(`Delete ${caption}`).click();
	await page.getByRole('button', { name: `Delete ${caption} for good` }).click();
	await expect(page.getByRole('heading', { name: 'Photos and PDFs' })).toBeVisible();
	await expect(page.getByRole('img', { name: caption })).toHaveCount(0);
	await context.close();
});

test('a phone of 320 px shows the section without scrolling sideways', async ({ page }, info) => {
	await page.setViewportSize({ width: 320, height: 700 });
	await signIn(page, 'owner');
	await page.goto(`${YARD_PATH}/boats`);
	await page.getByRole('link', { name: OWN_BOAT }).click();
	await page.getByRole('heading', { name: 'Photos and PDFs' }).scrollIntoViewIfNeeded();
	const wide = await page.evaluate(() => document.documentElement.scrollWidth);
	expect(wide).toBeLessThanOrEqual(320);
	await page.screenshot({ path: info.outputPath('phone.png') });
});
