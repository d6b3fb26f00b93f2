import { expect, test, type Locator, type Page } from '@playwright/test';
import { hoursSchema, type Hours } from '../../src/lib/api/hours';
import { readingSchema } from '../../src/lib/api/reading';
import { dayAndClock } from '../../src/lib/time/zone';
import { signIn, YARD_PATH } from './accounts';

const API = `/api/v1/yards${YARD_PATH}`;
const SLOT_MS = 900_000;

async function hoursOf(page: Page): Promise<Hours> {
	const answer = await page.request.get(`${API}/hours`);
	return hoursSchema.parse(await answer.json());
}

const startOf = (hours: Hours, slot: number) => Date.parse(hours.start) + slot * SLOT_MS;
const timeOf = (hours: Hours, slot: number) =>
	dayAndClock(startOf(hours, slot), hours.yard.timeZone);
const battens = (page: Page) => page.locator('[role=slider]:not([aria-label=Weather])');

/** A place in a drawing of the axis, px from the left of the page: the middle of a slot. */
async function placeOf(drawing: Locator, slot: number): Promise<{ x: number; y: number }> {
	const box = await drawing.boundingBox();
	if (!box) throw new Error('it is nowhere');
	const from = Number(await drawing.getAttribute('aria-valuemin'));
	const slots = Number(await drawing.getAttribute('aria-valuemax')) + 1 - from;
	return { x: box.x + (box.width * (slot + 0.5 - from)) / slots, y: box.y + box.height / 2 };
}

/** Every fault the browser itself reports: a script's, a resource's, the content policy's. */
function faultsOf(page: Page): string[] {
	const faults: string[] = [];
	page.on('pageerror', (error) => faults.push(error.message));
	page.on('console', (message) => {
		if (['error', 'warning'].includes(message.type())) faults.push(message.text());
	});
	return faults;
}

test.describe('the Hours page on a desktop', () => {
	test.use({ viewport: { width: 1440, height: 900 } });

	test('opens on its sentence and one batten for every queued step, without a fault', async ({
		page
	}) => {
		const faults = faultsOf(page);
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		await expect(page.locator('h1')).toHaveText(hours.headline.map((it) => it.text).join(''), {
			useInnerText: true
		});
		await expect(battens(page)).toHaveCount(hours.boats.flatMap((it) => it.steps).length);
		for (const boat of hours.boats) {
			await expect(page.getByRole('heading', { name: boat.name, exact: true })).toBeVisible();
		}
		await expect(page.getByRole('link', { name: hours.forecast?.attribution.text })).toBeVisible();
		expect(faults).toEqual([]);
	});

	test('a click on a quarter-hour opens its reading, with every limit the API gives', async ({
		page
	}) => {
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		const [step] = hours.boats[0].steps;
		const slot = hours.days[1].startSlot + 46;
		const { x, y } = await placeOf(battens(page).first(), slot);
		await page.mouse.click(x, y);
		const at = new Date(startOf(hours, slot)).toISOString();
		const answer = await page.request.get(`${API}/steps/${step.id}/reading?at=${at}`);
		const reading = readingSchema.parse(await answer.json());
		const dialog = page.getByRole('dialog', { name: reading.title });
		await expect(dialog).toBeVisible();
		expect(reading.title).toContain(timeOf(hours, slot));
		await expect(dialog.getByText(reading.detail, { exact: true })).toBeVisible();
		await expect(dialog.locator('tbody tr')).toHaveCount(reading.limits.length);
		for (const origin of new Set(reading.limits.map((it) => it.origin))) {
			await expect(dialog.getByText(origin).first()).toBeVisible();
		}
		await dialog.getByRole('button', { name: /Later/ }).click();
		await expect(page.getByRole('dialog')).toContainText(timeOf(hours, slot + 1));
		await page.getByRole('button', { name: 'Close the reading' }).click();
		await expect(page.getByRole('dialog')).toBeHidden();
	});

	test('by keyboard: a batten is one stop, arrows walk, Enter opens, Escape gives the focus back', async ({
		page
	}) => {
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		const [first, second] = hours.boats[0].steps;
		await page.getByRole('slider', { name: 'Weather' }).focus();
		await page.keyboard.press('Tab');
		const batten = battens(page).first();
		await expect(batten).toBeFocused();
		const began = Number(await batten.getAttribute('aria-valuenow'));
		await page.keyboard.press('ArrowRight');
		await page.keyboard.press('Shift+ArrowRight');
		await expect(batten).toHaveAttribute('aria-valuenow', String(began + 5));
		await page.keyboard.press('End');
		const run = first.runs.find((it) => it.from > began + 5);
		if (!run) throw new Error('no later run');
		await expect(batten).toHaveAttribute('aria-valuenow', String(run.from));
		await expect(batten).toHaveAttribute(
			'aria-valuetext',
			new RegExp(`^${timeOf(hours, run.from)}, ${run.state}`)
		);
		await page.keyboard.press('Enter');
		await expect(page.getByRole('dialog')).toContainText(timeOf(hours, run.from));
		await page.keyboard.press('Escape');
		await expect(page.getByRole('dialog')).toBeHidden();
		await expect(batten).toBeFocused();
		await page.keyboard.press('Tab');
		await expect(battens(page).nth(1)).toBeFocused();
		await expect(battens(page).nth(1)).toHaveAccessibleDescription(new RegExp(second.name));
	});

	test('the weather is read along one line, its numbers beside it and in words', async ({
		page
	}) => {
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		const weather = page.getByRole('slider', { name: 'Weather' });
		const slot = 150;
		const { x, y } = await placeOf(weather, slot);
		await page.mouse.move(x, y);
		const air = hours.bands.airTemperature[slot] ?? NaN;
		await expect(page.getByText(`air ${air.toFixed(1)}°`)).toBeVisible();
		await expect(page.getByText(timeOf(hours, slot), { exact: true })).toBeVisible();
		await expect(weather).toHaveAttribute(
			'aria-valuetext',
			new RegExp(`^${timeOf(hours, slot)}: air ${air.toFixed(1)} °C, dew point`)
		);
		await page.mouse.move(2, 2);
		await expect(page.getByText(`air ${air.toFixed(1)}°`)).toHaveCount(0);
	});

	test('the same hours stand in a table, whose times open readings too', async ({ page }) => {
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		const [step] = hours.boats[0].steps;
		await page.getByText('Hours as a table').click();
		const table = page.getByRole('table').first();
		await expect(table.locator('tbody tr')).toHaveCount(step.runs.length);
		const { from, state } = step.runs[1];
		await expect(table.locator('tbody tr').nth(1)).toContainText(state);
		await table.getByRole('button', { name: timeOf(hours, from) }).click();
		await expect(page.getByRole('dialog')).toContainText(timeOf(hours, from));
	});

	test('an owner sees fewer boats than the manager, and no other’s name', async ({
		page,
		browser
	}) => {
		await signIn(page, 'owner');
		const own = await hoursOf(page);
		const other = await browser.newPage();
		await signIn(other, 'manager');
		const all = await hoursOf(other);
		await other.close();
		expect(own.boats.length).toBeLessThan(all.boats.length);
		const foreign = all.boats.filter((boat) => !own.boats.some((it) => it.id === boat.id));
		for (const boat of foreign) await expect(page.getByText(boat.name)).toHaveCount(0);
	});
});

test.describe('the Hours page without scripts', () => {
	test.use({ javaScriptEnabled: false, viewport: { width: 1440, height: 900 } });

	test('comes whole from the server: sentence, battens, forecast', async ({ page }) => {
		await signIn(page, 'owner');
		await expect(page.locator('h1')).not.toBeEmpty();
		await expect(battens(page).locator('visible=true').first()).toBeVisible();
		await expect(page.getByText(/Forecast of/)).toBeVisible();
	});
});

test.describe('the Hours page on a phone', () => {
	test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

	test('shows one day, and the day picker brings another one into view', async ({ page }) => {
		await signIn(page, 'manager');
		const hours = await hoursOf(page);
		const days = page.getByRole('group', { name: 'Day' }).getByRole('radio');
		await expect(days).toHaveCount(hours.days.length);
		await expect(days.nth(hours.spokenDay)).toBeChecked();
		const last = hours.days.length - 1;
		await page.getByRole('group', { name: 'Day' }).locator('label').nth(last).tap();
		await expect(days.nth(last)).toBeChecked();
		await expect
			.poll(async () => {
				const batten = await battens(page).first().boundingBox();
				// 27 px an hour: at half past noon of the last day the middle of the screen is over it.
				return batten && (195 - batten.x) / 27 / 24;
			})
			.toBeGreaterThan(last);
	});

	test('a tap opens the reading over the whole screen', async ({ page }) => {
		await signIn(page, 'manager');
		const batten = battens(page).first();
		// Clear of the places at the foot, which lie over the page.
		await batten.evaluate((it) => it.scrollIntoView({ block: 'center' }));
		const box = await batten.boundingBox();
		if (!box) throw new Error('the batten is nowhere');
		await page.touchscreen.tap(200, box.y + box.height / 2);
		const dialog = page.getByRole('dialog');
		await expect(dialog.locator('tbody tr').first()).toBeVisible();
		expect((await dialog.boundingBox())?.width).toBe(390);
	});

	test('Back closes the reading and stays on the page', async ({ page }) => {
		await signIn(page, 'manager');
		const batten = battens(page).first();
		await batten.press('Enter');
		const dialog = page.getByRole('dialog');
		await expect(dialog).toBeVisible();
		await page.goBack();
		await expect(dialog).toBeHidden();
		await expect(page).toHaveURL(new RegExp(`${YARD_PATH}$`));
		await expect(batten).toBeFocused();
		// Closed by hand, it leaves nothing behind for Back to close.
		await batten.press('Enter');
		await expect(dialog).toBeVisible();
		await page.keyboard.press('Escape');
		await expect(dialog).toBeHidden();
		await expect
			.poll(() => page.evaluate(() => JSON.stringify(history.state).includes('reading')))
			.toBe(false);
	});

	test('nothing pressed with a thumb is lower than 48 px', async ({ page }) => {
		await signIn(page, 'manager');
		await battens(page).first().press('Enter');
		await expect(page.getByRole('dialog').locator('tbody tr').first()).toBeVisible();
		const low = await page
			.locator('button, [role=slider], label:has(input), summary')
			.evaluateAll((all) =>
				all
					.filter((it) => it.checkVisibility() && it.getBoundingClientRect().height < 47.5)
					.map((it) => it.outerHTML.slice(0, 120))
			);
		expect(low).toEqual([]);
	});

	for (const width of [320, 390, 768]) {
		test(`the page itself never scrolls sideways at ${width} px`, async ({ page }) => {
			await page.setViewportSize({ width, height: 844 });
			await signIn(page, 'manager');
			const wide = await page.evaluate(() => document.documentElement.scrollWidth);
			expect(wide).toBe(width);
		});
	}
});
