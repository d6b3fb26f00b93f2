import { expect, test } from '@playwright/test';
import { accountOf, signIn, YARD_PATH } from './accounts';

test('a wrong passphrase is told in a sentence, and the e-mail stays typed', async ({ page }) => {
	await page.goto('/sign-in');
	const { email } = accountOf('painter');
	await page.getByLabel('e-mail').fill(email);
	await page.getByLabel('passphrase').fill('not this one');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page.getByRole('alert')).toContainText('do not go together');
	await expect(page.getByLabel('e-mail')).toHaveValue(email);
	await expect(page.getByLabel('e-mail')).toHaveAttribute('aria-invalid', 'true');
	await expect(page.getByLabel('passphrase')).toHaveAccessibleDescription(/do not go together/);
});

test('what was typed before the scripts came stays', async ({ page }) => {
	let come = (): void => undefined;
	const scripts = new Promise<void>((resolve) => (come = resolve));
	await page.route('**/*.js', async (route) => {
		await scripts;
		await route.continue();
	});
	await page.goto('/sign-in', { waitUntil: 'commit' });
	await page.getByLabel('e-mail').fill('early@yard.example');
	await page.getByLabel('passphrase').fill('typed at once');
	come();
	await page.waitForLoadState('networkidle');
	await expect(page.getByLabel('e-mail')).toHaveValue('early@yard.example');
	await expect(page.getByLabel('passphrase')).toHaveValue('typed at once');
});

test('the keyboard alone signs in', async ({ page }) => {
	await page.goto('/sign-in');
	const { email, password } = accountOf('owner');
	await page.getByLabel('e-mail').focus();
	await page.keyboard.type(email);
	await page.keyboard.press('Tab');
	await page.keyboard.type(password);
	await page.keyboard.press('Enter');
	await page.waitForURL(`**${YARD_PATH}`);
	await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
});

test('signing out ends the session and leads back to sign-in', async ({ page }) => {
	await signIn(page, 'painter');
	await page.getByRole('button', { name: /, painter$/ }).click();
	await page.getByRole('button', { name: 'Sign out' }).click();
	await page.waitForURL('**/sign-in');
	await page.goto(YARD_PATH);
	await page.waitForURL('**/sign-in');
});

test('the first Tab offers to skip to the content, and does', async ({ page }) => {
	await signIn(page, 'owner');
	await page.reload();
	await page.keyboard.press('Tab');
	const skip = page.getByRole('link', { name: 'Skip to the content' });
	await expect(skip).toBeFocused();
	await page.keyboard.press('Enter');
	await expect(page.locator('#content')).toBeFocused();
});

test('a page that is not there says so and leads back', async ({ page }) => {
	await signIn(page, 'owner');
	const answer = await page.goto('/no-such-yard');
	expect(answer?.status()).toBe(404);
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('There is nothing here.');
	await page.getByRole('link', { name: 'Go to the front page' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('Can I coat tomorrow?');
});

test.describe('without scripts', () => {
	test.use({ javaScriptEnabled: false });

	test('the form signs in all the same', async ({ page }) => {
		await signIn(page, 'owner');
		await expect(page.locator('h1')).not.toBeEmpty();
	});
});
