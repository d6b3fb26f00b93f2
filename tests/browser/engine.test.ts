import { expect, test } from '@playwright/test';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { jobOutlook, yardWeather, type Job, type JobOptions } from '../../src/lib/engine';
import { exampleWithMembers } from '../fixtures/exampleOutlook';

/**
 * The engine built for the browser and run there, against the same run in Node: the what-if handle
 * and the offline page must say what the server says.
 */
const MEMBERS = 7;
/** Browsers of other years round the last digit of a logarithm otherwise. */
const ROUNDING = 1e-9;

type Sent = ReturnType<typeof exampleWithMembers>;

/** What both sides run, told in plain numbers. Also runs inside the page: it must stand alone. */
function outlookNumbers(
	engine: { yardWeather: typeof yardWeather; jobOutlook: typeof jobOutlook },
	sent: Sent
) {
	const { site, forecast, looseSand, face, shelter, steps } = sent;
	const yard = engine.yardWeather({ site, forecast, looseSand: looseSand ?? null });
	const job: Job = {
		steps: steps.map((step) => ({ step, faces: [{ id: 'face', face, shelter }] })),
		launch: { launchBy: sent.launchBy, launchSlots: sent.launchSlots, dayRate: sent.dayRate }
	};
	const options: JobOptions = { from: forecast.issuedAt };
	const outlook = engine.jobOutlook(yard, job, options);
	const [side] = outlook.steps[0].faces[0].sides;
	return {
		exact: {
			states: outlook.steps.map(({ hours }) => [...hours.state]),
			limiters: outlook.steps.map(({ hours }) => [...hours.limiter]),
			chances: outlook.steps.map(({ chances }) => [...(chances?.slots ?? [])]),
			starts: Object.values(outlook.plans).map((plan) =>
				plan?.steps.map(({ start }: { start: number }) => start)
			),
			holdChances: Object.values(outlook.plans).map((plan) => plan?.holdChance),
			launchReady: Object.values(outlook.plans).map((plan) => plan?.launchReady),
			warnings: outlook.warnings
		},
		series: {
			surfaceShaded: [...side.surfaceShaded],
			surfaceSunlit: [...side.surfaceSunlit],
			film: [...side.film],
			spread: [...side.spread],
			beam: [...side.beam],
			relativeHumidity: [...side.relativeHumidity],
			sunAltitude: [...yard.weather.sunAltitude]
		}
	};
}

test('the engine says the same in the browser as in Node', async ({ page }) => {
	const built = await build({
		configFile: false,
		logLevel: 'error',
		build: {
			write: false,
			lib: {
				entry: fileURLToPath(new URL('../../src/lib/engine/index.ts', import.meta.url)),
				name: 'yardglassEngine',
				formats: ['iife']
			}
		}
	});
	const [bundle] = [built].flat();
	if (!('output' in bundle)) throw new Error('the build watches instead of ending');
	await page.addScriptTag({ content: bundle.output[0].code });
	const sent = exampleWithMembers(MEMBERS);
	const there = await page.evaluate(
		`(${outlookNumbers.toString()})(yardglassEngine, ${JSON.stringify(sent)})`
	);
	const here = JSON.parse(JSON.stringify(outlookNumbers({ yardWeather, jobOutlook }, sent)));
	expect(there).toHaveProperty('exact', here.exact);
	const { series } = there as ReturnType<typeof outlookNumbers>;
	let furthest = 0;
	for (const [name, values] of Object.entries(series)) {
		const own: (number | null)[] = here.series[name];
		expect(values).toHaveLength(own.length);
		values.forEach((value, i) => {
			furthest = Math.max(furthest, Math.abs((value ?? 0) - (own[i] ?? 0)));
		});
	}
	expect(here.exact.starts[0]).toHaveLength(2);
	expect(furthest).toBeLessThan(ROUNDING);
	test.info().annotations.push({ type: 'furthest apart', description: String(furthest) });
	process.stdout.write(`browser and Node are ${furthest} apart at most\n`);
});
