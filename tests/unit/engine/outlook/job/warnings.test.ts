import { describe, expect, test } from 'vitest';
import { brokenSteps } from '../../../../../src/lib/engine/outlook/plan/broken';
import { placeInWindow, startWindow } from '../../../../../src/lib/engine/outlook/plan/window';
import { forecastOf } from '../flatWeather';
import { at, coat, FACE, hoursOf, on, outlookOf } from './jobs';

const codes = (outlook: ReturnType<typeof outlookOf>): string[] =>
	outlook.warnings.map(({ code }) => code);
const find = <C extends string>(outlook: ReturnType<typeof outlookOf>, code: C) =>
	outlook.warnings.find((warning) => warning.code === code);

const done = on(coat({ touchDry: 2, overcoatMin: 4, overcoatMax: 30, launchMin: 24 }), {
	startAt: at(8),
	finishedAt: at(10)
});
const whole = { overcoatMin: 4, overcoatMax: 200, launchMin: 24 };

describe('the recoat window of a logged coat', () => {
	test('with room in it says nothing', () => {
		const long = on(coat({ overcoatMin: 4, overcoatMax: 90, launchMin: 24 }), {
			startAt: at(8),
			finishedAt: at(10)
		});
		expect(codes(outlookOf([long, on(coat(whole))]))).toEqual([]);
	});

	test('few workable hours left are counted in work hours, not on the clock', () => {
		const outlook = outlookOf([done, on(coat(whole))], {}, { from: at(12) });
		// 16:00 to 17:00 by UTC of the first day, and the second day's from 08:00 to the close at 38:00
		// with the two hours of the work.
		const warning = find(outlook, 'fewHoursLeft');
		expect(warning).toMatchObject({ step: 1, after: 0, hours: 2 + 8 });
		expect(warning !== undefined && 'closes' in warning ? hoursOf(warning.closes) : null).toBe(38);
	});

	test('without a workable start in it, it says when it opened and closes', () => {
		const storm = forecastOf({ precipitation: (h) => (h > 10 && h < 60 ? 2 : 0) }, 121);
		const rainless = coat({ touchDry: 1, ...whole }, { limits: { rainFree: true } });
		const outlook = outlookOf([done, on(rainless)], {}, { forecast: storm });
		expect(find(outlook, 'noStretchInWindow')).toEqual({
			code: 'noStretchInWindow',
			step: 1,
			after: 0,
			opens: at(14),
			closes: at(38)
		});
		expect(codes(outlook)).toContain('abradingPutIn');
	});

	test('draws the slots outside it as early and late', () => {
		const { steps } = outlookOf([done, on(coat(whole))]);
		const window = startWindow(
			steps.map((it) => it.planStep),
			1
		);
		expect(window).toEqual({ opens: 56, closes: 152, openedBy: 0, closedBy: 0 });
		if (window === null) return;
		expect(placeInWindow(window, 55, 8)).toBe('early');
		expect(placeInWindow(window, 56, 8)).toBe('inside');
		expect(placeInWindow(window, 159, 8)).toBe('inside');
		expect(placeInWindow(window, 160, 8)).toBe('late');
	});

	test('is none while the coat before is not on', () => {
		const { steps } = outlookOf([on(coat(whole)), on(coat(whole))]);
		expect(
			startWindow(
				steps.map((it) => it.planStep),
				1
			)
		).toBeNull();
	});
});

describe('silences of the sheet', () => {
	test('a silent maximum matters where a coat follows', () => {
		const silent = coat({ overcoatMin: 4, launchMin: 24 });
		expect(codes(outlookOf([on(silent), on(coat(whole))]))).toEqual(['silentMaximum']);
		expect(codes(outlookOf([on(coat(whole)), on(silent)]))).toEqual([]);
	});

	test('a tin that says there is no limit is not silent', () => {
		const free = coat({ overcoatMin: 4, overcoatMax: null, launchMin: null });
		expect(codes(outlookOf([on(free), on(free)]))).toEqual([]);
	});

	test('a silent time to launch, and a silent drying time', () => {
		const outlook = outlookOf([on(coat({}, { limits: { rainFree: true } }))]);
		expect(codes(outlook)).toEqual(['silentDrying', 'nothingFits', 'silentLaunch']);
		expect(find(outlook, 'nothingFits')).toMatchObject({ step: 0, hasStarts: false });
	});
});

describe('launches', () => {
	const job = [on(coat({ touchDry: 2, launchMin: 24, launchMax: 60 }))];

	test('ready in time', () => {
		const { plans, warnings } = outlookOf(job, {
			launchBy: at(80),
			launchSlots: [at(30), at(60), at(100)],
			dayRate: 38
		});
		// Finished at 10:00 of day one at the soonest; but for the slot of 60:00 nothing before 34:00 is ready.
		expect(warnings).toEqual([]);
		expect(plans.soonest?.launchReady).toEqual({
			earliest: at(34),
			latest: at(34),
			isAssumed: false,
			closes: at(70)
		});
		expect(plans.soonest?.slip).toEqual({ launch: at(60), days: 0, cost: 0 });
		expect(plans.byDate?.launchReady.latest).toBeLessThanOrEqual(at(60));
	});

	test('too late says when the soonest is ready, and what a slip costs', () => {
		const { plans, warnings } = outlookOf(job, {
			launchBy: at(33),
			launchSlots: [at(20), at(33), at(81)],
			dayRate: 38
		});
		expect(plans.byDate).toBeNull();
		expect(warnings).toContainEqual({
			code: 'nothingBeforeLaunch',
			launch: at(33),
			readyAt: at(34)
		});
		// Tuesday to Thursday by the yard's calendar.
		expect(plans.soonest?.slip).toEqual({ launch: at(81), days: 2, cost: 76 });
		expect(warnings).toContainEqual({ code: 'ashoreTooLong', launch: at(81), closes: at(70) });
	});

	test('slots, but none in time', () => {
		const { plans, warnings } = outlookOf(job, { launchBy: at(40), launchSlots: [at(90)] });
		expect(plans.byDate).toBeNull();
		expect(warnings).toContainEqual({ code: 'noLaunchSlot', launchBy: at(40) });
		// Ready before the date, but there is nothing to go in with until the slot after it.
		expect(plans.soonest?.slip).toMatchObject({ launch: at(90), days: 2 });
	});

	test('not so early that the coat stands ashore too long', () => {
		const { plans } = outlookOf(job, { launchBy: at(110) });
		expect(hoursOf(plans.byDate?.launchReady.closes)).toBeGreaterThanOrEqual(110);
		expect(hoursOf(plans.soonest?.launchReady.closes)).toBe(70);
	});

	test('past the forecast on the mean of its last days, and said to be', () => {
		const slow = {
			...coat({ touchDry: 2 }),
			times: {
				touchDry: 120,
				launchMin: [
					[10, 20_000],
					[20, 10_000],
					[30, 5_000]
				] as [number, number][]
			}
		};
		const { plans } = outlookOf([on(slow)]);
		const ready = plans.soonest?.launchReady;
		expect(ready?.isAssumed).toBe(true);
		expect(ready?.latest).toBeGreaterThan(at(121));
		expect(ready?.earliest).toBeLessThanOrEqual(ready?.latest ?? 0);
		expect(plans.soonest?.slip).toMatchObject({ days: null, cost: null });
	});

	test('never, where the last days are under the least curing temperature', () => {
		const cold = forecastOf({ temperature: (h) => (h < 30 ? 18 : 2), dewPoint: -3 }, 121);
		const slow = {
			...coat({}),
			limits: { curing: { min: 8 } },
			times: {
				touchDry: 60,
				launchMin: [
					[10, 20_000],
					[30, 5_000]
				] as [number, number][]
			}
		};
		const { plans } = outlookOf([on(slow)], { launchBy: at(110), dayRate: 10 }, { forecast: cold });
		expect(plans.soonest?.launchReady.latest).toBeNull();
		expect(plans.soonest?.slip).toEqual({ launch: null, days: null, cost: null });
	});

	test('a lift waits until every coat may go in', () => {
		const lift = { ...coat({}), kind: 'lift' as const, durationMinutes: 60 };
		const { plans } = outlookOf([
			on(coat({ overcoatMin: 2, launchMin: 40 })),
			on(coat({ launchMin: 5 })),
			on(lift, { faces: [] })
		]);
		expect(plans.soonest?.steps.map(({ start }) => hoursOf(start))).toEqual([8, 12, 56]);
	});
});

describe('a plan that was taken', () => {
	const wet = coat(
		{ touchDry: 1, overcoatMin: 4, overcoatMax: 30 },
		{ limits: { rainFree: true } }
	);
	const places = [
		{ start: 32, finish: 40 },
		{ start: 128, finish: 136 }
	];

	test('holds where nothing has changed', () => {
		expect(brokenSteps(outlookOf([on(wet), on(wet)]).steps, places)).toEqual([]);
	});

	test('is broken by the rain that shuts a step, and names it', () => {
		const rain = forecastOf({ precipitation: (h) => (h > 32 && h < 35 ? 2 : 0) }, 121);
		const { steps } = outlookOf([on(wet), on(wet)], {}, { forecast: rain });
		expect(brokenSteps(steps, places)).toEqual([{ step: 1, why: 'rain' }]);
	});

	test('is broken where a step falls before or after its window', () => {
		const { steps } = outlookOf([on(wet), on(wet)]);
		expect(brokenSteps(steps, [places[0], { start: 52, finish: 60 }])).toContainEqual({
			step: 1,
			why: 'early'
		});
		expect(brokenSteps(steps, [places[0], { start: 320, finish: 328 }])).toContainEqual({
			step: 1,
			why: 'late'
		});
	});

	test('is not broken by what is logged', () => {
		const logged = on(wet, { startAt: at(8), finishedAt: at(10) });
		const rain = forecastOf({ precipitation: (h) => (h > 7 && h < 12 ? 2 : 0) }, 121);
		const { steps } = outlookOf([logged, on(wet, { faces: [FACE] })], {}, { forecast: rain });
		expect(brokenSteps(steps, places)).toEqual([]);
	});
});
