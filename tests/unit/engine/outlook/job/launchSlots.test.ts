import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import type { Job, JobStep } from '../../../../../src/lib/engine/outlook/job/job';
import { jobOutlook } from '../../../../../src/lib/engine/outlook/job/jobOutlook';
import { jobRemedies } from '../../../../../src/lib/engine/outlook/job/jobRemedies';
import { brokenSteps } from '../../../../../src/lib/engine/outlook/plan/broken';
import { startWindow } from '../../../../../src/lib/engine/outlook/plan/window';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { days, ensembleOf } from '../changingWeather';
import { COAT, forecastOf, SITE, START } from '../flatWeather';
import { backwards, chainRoom, everyChain } from './bruteForcePlan';
import { at, coat, hoursOf, on, outlookOf, startsOf } from './jobs';

const LAUNCH: Step = {
	...COAT,
	name: 'launch',
	kind: 'launch',
	method: 'none',
	limits: { gust: { max: 9 } }
};
const launching = (more: Partial<Step> = {}, pin: Partial<JobStep> = {}): JobStep =>
	on({ ...LAUNCH, ...more }, { faces: [], ...pin });
const bottom = on(coat({ touchDry: 2, launchMin: 24, launchMax: 60 }));
const plansOf = (outlook: ReturnType<typeof outlookOf>) => Object.values(outlook.plans);

describe('a launch keeps to its slots', () => {
	test('in every plan, where any workable quarter-hour would do', () => {
		const launchSlots = [at(20), at(45), at(50)];
		const outlook = outlookOf([bottom, launching()], { launchSlots, launchBy: at(80) });
		expect(startsOf(outlook.plans.soonest)).toEqual([8, 45]);
		for (const plan of plansOf(outlook)) expect(launchSlots).toContain(plan?.steps[1].start);
		const free = outlookOf([bottom, launching()], { launchBy: at(80) });
		expect(startsOf(free.plans.soonest)).toEqual([8, 34]);
	});

	test('and not to the slots of other steps, nor against a start fixed by hand', () => {
		const launch = { launchSlots: [at(100)] };
		expect(startsOf(outlookOf([bottom, on(coat({}))], launch).plans.soonest)?.[0]).toBe(8);
		const pinned = outlookOf([bottom, launching({}, { startAt: at(41) })], launch);
		expect(startsOf(pinned.plans.soonest)).toEqual([8, 41]);
	});

	test('that the wind shuts is no slot', () => {
		const gale = forecastOf({ windGust: (h) => (h > 45 && h <= 47 ? 15 : 3) }, 121);
		const outlook = outlookOf(
			[bottom, launching()],
			{ launchSlots: [at(45), at(46), at(50)] },
			{ forecast: gale }
		);
		expect(startsOf(outlook.plans.soonest)?.[1]).toBe(50);
	});

	test('at the minute they begin, with every quarter-hour the work touches workable', () => {
		const slot = at(45) + 7 * 60;
		const job = [bottom, launching()];
		const outlook = outlookOf(job, { launchSlots: [slot] });
		expect(outlook.plans.soonest?.steps[1]).toMatchObject({ start: slot, finish: slot + 3600 });
		expect(outlook.plans.soonest?.slip.launch).toBe(slot);
		// From 45:07 to 46:07 the quarter-hour from 46:00 is worked too.
		const gusts = (from: number) =>
			outlookOf(
				job,
				{ launchSlots: [slot] },
				{ forecast: forecastOf({ windGust: (h) => (h > from ? 15 : 3) }, 121) }
			).plans.soonest;
		expect(gusts(46)).toBeNull();
		expect(gusts(47)).not.toBeNull();
	});

	test('a wait that ends between two quarter-hours holds for a slot there', () => {
		const quick = on(coat({}, { durationMinutes: 60 }));
		const steps = [
			{ ...quick, step: { ...quick.step, times: { launchMin: 28 } } },
			on({ ...COAT, kind: 'wash', durationMinutes: 20 })
		];
		const slots = [at(9) + 24 * 60, at(9) + 30 * 60];
		const outlook = outlookOf([...steps, launching()], { launchSlots: slots });
		// 28 minutes after 09:00 of the first day, whatever whole quarter-hours the wash takes.
		expect(outlook.plans.soonest?.steps[2].start).toBe(slots[1]);
	});

	test('the slip counts to the slot of its start, not to the first the coat would allow', () => {
		const gale = forecastOf({ windGust: (h) => (h > 45 && h <= 47 ? 15 : 3) }, 121);
		const { plans } = outlookOf(
			[bottom, launching()],
			{ launchSlots: [at(30), at(45), at(60)], launchBy: at(30), dayRate: 40 },
			{ forecast: gale }
		);
		expect(plans.soonest?.slip).toEqual({ launch: at(60), days: 1, cost: 40 });
	});

	test('chances count members in which the whole of it is workable', () => {
		const forecast = forecastOf({}, 121);
		const members = [3, 45, 3, 3].map((gust) => ({
			...forecast.hourly,
			windGust: forecast.hourly.time.map((_, h) => (h === 47 ? gust : 3))
		}));
		// Room to spare at either slot: only the members tell them apart.
		const job: Job = {
			steps: [launching({ limits: { gust: { max: 40 } } })],
			launch: { launchSlots: [at(45) + 420, at(50)] }
		};
		const yard = yardWeather({ site: SITE, forecast: { ...forecast, members }, looseSand: null });
		const { steps, plans } = jobOutlook(yard, job, { from: START });
		const [first, second] = steps[0].planStep.candidates.score;
		expect(first).toBeLessThan(second);
		expect(hoursOf(plans.surest?.steps[0].start)).toBe(50);
		expect(plans.soonest?.holdChance).toBe(0.75);
	});
});

describe('what is told of it', () => {
	test('no slot workable: a warning counts those ahead in the forecast', () => {
		const gale = forecastOf({ windGust: 15 }, 121);
		const launch = { launchSlots: [at(10), at(60), at(80), at(500)] };
		const outlook = outlookOf([bottom, launching()], launch, { forecast: gale, from: at(12) });
		expect(outlook.warnings).toContainEqual({ code: 'launchSlotsShut', step: 1, slots: 2 });
		expect(outlook.warnings).toContainEqual({ code: 'nothingFits', step: 1, hasStarts: false });
		expect(outlookOf([bottom, launching()], launch).warnings).toEqual([]);
	});

	test('its window runs from the first to the last slot in it', () => {
		const logged = { ...bottom, startAt: at(8), finishedAt: at(10) };
		const windowOf = (launchSlots: number[]) =>
			startWindow(
				outlookOf([logged, launching()], { launchSlots }).steps.map((it) => it.planStep),
				1
			);
		expect(windowOf([at(20), at(40), at(50), at(90)])).toMatchObject({ opens: 160, closes: 200 });
		// None inside: the window of the coat alone, in which nothing starts.
		expect(windowOf([at(20), at(90)])).toMatchObject({
			opens: expect.closeTo(136, 6) as number,
			closes: 272
		});
		const none = outlookOf([logged, launching()], { launchSlots: [at(20), at(90)] });
		expect(none.warnings[0]).toMatchObject({ code: 'noStretchInWindow', step: 1, after: 0 });
	});

	test('few hours left are those of the slots', () => {
		const logged = { ...bottom, startAt: at(8), finishedAt: at(10) };
		const { warnings } = outlookOf([logged, launching()], { launchSlots: [at(40), at(50)] });
		expect(warnings).toContainEqual({
			code: 'fewHoursLeft',
			step: 1,
			after: 0,
			hours: 2,
			closes: at(50)
		});
	});

	test('remedies speak of shut slots alone, and gain is a slot gained', () => {
		const forecast = forecastOf({ windGust: (h) => (h > 30 && h <= 50 ? 12 : 3) }, 121);
		const remediesOf = (launchSlots: number[]) => {
			const yard = yardWeather({ site: SITE, forecast, looseSand: null });
			const job = { steps: [launching()], launch: { launchSlots } };
			const outlook = jobOutlook(yard, job, { from: START });
			return jobRemedies(yard, outlook, { shelters: ['lee'], from: START });
		};
		expect(remediesOf([at(10), at(60)])).toEqual([]);
		const [wait, lee] = remediesOf([at(40), at(60)]);
		expect(wait).toMatchObject({ code: 'wait', opensFrom: at(60), opensTo: at(61) });
		expect(wait.gainMinutes).toBe(60);
		expect(lee).toMatchObject({ code: 'shelter', opensFrom: at(40), opensTo: at(41) });
		expect(lee.gainMinutes).toBe(60);
		expect(remediesOf([at(40)])[0]).toMatchObject({ code: 'wait', gainMinutes: 0 });
	});

	test('a plan taken for a slot that is no longer stated does not hold', () => {
		const places = [
			{ start: 32, finish: 40 },
			{ start: 180, finish: 184 }
		];
		const broken = (launchSlots: number[]) =>
			brokenSteps(outlookOf([bottom, launching()], { launchSlots }).steps, places);
		expect(broken([at(45)])).toEqual([]);
		expect(broken([at(46)])).toEqual([{ step: 1, why: 'hours' }]);
	});
});

describe('with slots, the plans are the best of every chain tried', () => {
	const table = (cold: number, warm: number): [number, number][] => [
		[5, cold],
		[25, warm]
	];
	const changing: Step = {
		...COAT,
		durationMinutes: 90,
		workHours: [{ days: [1, 2, 3, 4, 5, 6, 7], from: '10:00', to: '12:30' }],
		limits: { surfaceTemperature: { min: 4 } },
		times: {
			touchDry: table(500, 120),
			overcoatMin: table(2000, 500),
			launchMin: table(3000, 900),
			launchMax: table(9000, 4000)
		}
	};
	const slots = fc.uniqueArray(fc.integer({ min: 0, max: 479 }), { minLength: 1, maxLength: 12 });

	test.each([
		['one coat', [on(changing), launching({ limits: { gust: { max: 7 } } })]],
		['two coats', [on(changing), on(changing), launching({ limits: { gust: { max: 7 } } })]]
	])('%s and a launch', (_, job) => {
		fc.assert(
			fc.property(days, slots, fc.integer({ min: 100, max: 479 }), (it, launches, by) => {
				const launchSlots = launches.map((slot) => START + slot * 900);
				const launch = { launchSlots, launchBy: START + by * 900 };
				const { steps, plans } = outlookOf(job, launch, { forecast: ensembleOf(it, []) });
				const readyOf = (starts: readonly number[]): number =>
					Math.max(
						...steps.map(
							({ planStep: { candidates } }, i) =>
								candidates.ready[candidates.start.indexOf(starts[i])]
						)
					);
				const all = everyChain(steps, launches);
				const soonest = (a: number[], b: number[]): number =>
					readyOf(a) - readyOf(b) || backwards(a, b);
				const surest = (a: number[], b: number[]): number =>
					chainRoom(steps, b) - chainRoom(steps, a) || soonest(a, b);
				const chosen = Math.max(...launches.filter((slot) => slot <= by));
				const byDate = all.filter(
					(starts) => readyOf(starts) <= chosen && starts[starts.length - 1] <= chosen
				);
				const slotsOf = (plan: (typeof plans)['soonest']): number[] | undefined =>
					plan?.steps.map(({ start }) => (start - START) / 900);
				expect(slotsOf(plans.soonest)).toEqual(all.sort(soonest)[0]);
				expect(slotsOf(plans.surest)).toEqual(all.sort(surest)[0]);
				expect(slotsOf(plans.byDate)).toEqual(byDate.sort(surest)[0]);
			}),
			{ numRuns: 60 }
		);
	});
});
