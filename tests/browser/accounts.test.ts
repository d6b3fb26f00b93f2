import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { signIn, YARD_PATH } from './accounts';

const MAIL = process.env.MAIL_URL ?? '';
const PASSPHRASE = 'copper lantern under the sill';
/** An address of this run's own, so that runs on one yard do not meet. */
const fresh = (who: string): string => `${who}-${Date.now()}@marram.example`;

interface Kept {
	readonly to: readonly string[];
	readonly subject: string;
	readonly text: string;
}

/** The path of the link in the last letter to an address, once it has come. */
async function linkOf(page: Page, address: string): Promise<string> {
	let link = '';
	await expect(async () => {
		const answer = await page.request.get(`${MAIL}/messages.json`);
		const letters: Kept[] = await answer.json();
		const mine = letters.filter(({ to }) => to.includes(address));
		link = /https?:\/\/\S+/.exec(mine.at(-1)?.text ?? '')?.[0] ?? '';
		expect(link).not.toBe('');
	}).toPass({ timeout: 90_000 });
	return new URL(link).pathname;
}

const found = async (page: Page, email: string, yard: string): Promise<void> => {
	await page.goto('/new');
	await page.getByLabel('name of the yard').fill(yard);
	await page.getByLabel('latitude').fill('40,64');
	await page.getByLabel('longitude').fill('-8.74');
	await page.getByLabel('e-mail').fill(email);
	await page.getByRole('button', { name: 'Send me the letter' }).click();
	await expect(page.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
};

test.describe.configure({ timeout: 180_000 });

test('a yard is founded by mail, a painter is asked and joins, and sees the yard', async ({
	page,
	browser
}) => {
	const founder = fresh('juno');
	await found(page, founder, 'Marram Quay');
	await page.goto(await linkOf(page, founder));
	await page.getByLabel('your name').fill('Juno Fell');
	await page.getByLabel('passphrase').fill(PASSPHRASE);
	await page.getByRole('button', { name: 'Open the yard' }).click();
	await expect(page).toHaveURL(/\/marram-quay(-\d+)?$/);

	const painter = fresh('sol');
	await page.goto(`${new URL(page.url()).pathname}/settings/people`);
	await page.getByLabel('e-mail').fill(painter);
	await page.getByLabel('as', { exact: true }).selectOption('painter');
	await page.getByRole('button', { name: 'Send the letter' }).click();
	await expect(page.getByRole('status')).toContainText(painter);
	await expect(page.getByText(`${painter}, as painter`)).toBeVisible();

	const other = await browser.newPage();
	await other.goto(await linkOf(page, painter));
	await other.getByLabel('your name').fill('Sol Reed');
	await other.getByLabel('passphrase').fill('password1');
	await other.getByRole('button', { name: 'Join the yard' }).click();
	await expect(other.getByText('That is easily guessed.')).toBeVisible();
	await expect(other.getByLabel('your name')).toHaveValue('Sol Reed');
	await other.getByLabel('passphrase').fill('nine grey boats asleep');
	await other.getByRole('button', { name: 'Join the yard' }).click();
	await expect(other).toHaveURL(/\/marram-quay(-\d+)?$/);
	await other.goto(`${new URL(other.url()).pathname}/settings/people`);
	await expect(other.getByText('Your role in this yard does not allow that.')).toBeVisible();
	await other.goto(YARD_PATH);
	await expect(other.getByText('There is no such yard')).toBeVisible();
	await other.close();
});

test('wrong places are told at their fields, and nothing typed is lost', async ({ page }) => {
	await page.goto('/new');
	await page.getByLabel('name of the yard').fill('Tern Slip');
	await page.getByLabel('latitude').fill('north');
	await page.getByLabel('longitude').fill('-200');
	await page.getByLabel('e-mail').fill('juno@marram.example');
	await page.getByRole('button', { name: 'Send me the letter' }).click();
	await expect(page.getByText('Type degrees, or degrees and minutes')).toBeVisible();
	await expect(
		page.getByText('A longitude lies between 0 and 180°, and this is 200°.')
	).toBeVisible();
	await expect(page.getByLabel('name of the yard')).toHaveValue('Tern Slip');
	await expect(page.getByLabel('latitude')).toHaveAttribute('aria-invalid', 'true');
});

test('a forgotten passphrase is set anew, and the old one no longer works', async ({ page }) => {
	const email = fresh('ada');
	await found(page, email, 'Ada Hard');
	await page.goto(await linkOf(page, email));
	await page.getByLabel('your name').fill('Juno Fell');
	await page.getByLabel('passphrase').fill(PASSPHRASE);
	await page.getByRole('button', { name: 'Open the yard' }).click();
	await expect(page).toHaveURL(/\/ada-hard(-\d+)?$/);
	await page.context().clearCookies();
	await page.goto('/forgot');
	await page.getByLabel('e-mail').fill(email);
	const before = await linkOf(page, email);
	await page.getByRole('button', { name: 'Send me a link' }).click();
	await expect(page.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
	await expect(async () => expect(await linkOf(page, email)).not.toBe(before)).toPass({
		timeout: 90_000
	});
	await page.goto(await linkOf(page, email));
	await page.getByLabel('new passphrase').fill('seven chocks and a chain');
	await page.getByRole('button', { name: 'Keep it' }).click();
	await expect(page).toHaveURL(/\/ada-hard(-\d+)?$/);
	await page.goto('/you');
	await expect(page.getByText('this device')).toBeVisible();
	await page.context().clearCookies();
	await page.goto('/sign-in');
	await page.getByLabel('e-mail').fill(email);
	await page.getByLabel('passphrase').fill(PASSPHRASE);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page.getByText('do not go together')).toBeVisible();
});

test('a link that is over says so, with the way on', async ({ page }) => {
	for (const path of ['/found', '/reset', '/invitation']) {
		await page.goto(`${path}/${'x'.repeat(32)}`);
		await expect(page.getByRole('heading', { name: /is over/ })).toBeVisible();
	}
});

for (const scheme of ['light', 'dark'] as const)
	test(`nothing to find fault with for axe, ${scheme}, and no page scrolls sideways at 320 px`, async ({
		page
	}) => {
		await page.emulateMedia({ colorScheme: scheme });
		await page.setViewportSize({ width: 320, height: 700 });
		await signIn(page, 'manager');
		for (const path of ['/you', `${YARD_PATH}/settings/people`, '/new', '/forgot']) {
			await page.goto(path);
			const { violations } = await new AxeBuilder({ page }).analyze();
			expect(violations.map(({ id, nodes }) => [path, id, nodes.length])).toEqual([]);
			const width = await page.evaluate(() => document.documentElement.scrollWidth);
			expect(width, path).toBeLessThanOrEqual(320);
		}
	});
