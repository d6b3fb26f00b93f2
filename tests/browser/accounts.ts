import type { Page } from '@playwright/test';
import { z } from 'zod';
import { DEMO_PEOPLE, DEMO_YARD } from '../../drizzle/seed/demo';

export type DemoRole = keyof typeof DEMO_PEOPLE;

const accountsSchema = z.array(
	z.object({ role: z.string(), email: z.string(), password: z.string() })
);

/** The account of a role as the start command printed it, else as the seed lays it. */
export function accountOf(role: DemoRole): { email: string; password: string } {
	const told = process.env.DEMO_ACCOUNTS;
	const printed = told === undefined ? [] : accountsSchema.parse(JSON.parse(told));
	return printed.find((it) => it.role === role) ?? DEMO_PEOPLE[role];
}

export const YARD_PATH = `/${DEMO_YARD.slug}`;

/** Signs in as a role through the page, as a person would, and waits for the yard. */
export async function signIn(page: Page, role: DemoRole): Promise<void> {
	const { email, password } = accountOf(role);
	await page.goto('/sign-in');
	await page.getByLabel(/e-mail/i).fill(email);
	await page.getByLabel(/passphrase/i).fill(password);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL(`**${YARD_PATH}`);
}
