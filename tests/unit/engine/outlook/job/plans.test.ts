import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { jobOutlook } from '../../../../../src/lib/engine/outlook/job/jobOutlook';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { days, ensembleOf } from '../changingWeather';
import { COAT, forecastOf, SITE, START } from '../flatWeather';
import { earliestChain } from './bruteForcePlan';
import { at, coat, FACE, hoursOf, on, OTHER_FACE, outlookOf, startsOf } from './jobs';

/** A coat whose times run with the surface, workable only a few hours a day. */
const changing = (more: Partial<Step>): Step => ({
	...COAT,
	durationMinutes: 90,
	workHours: [{ days: [1, 2, 3, 4, 5, 6, 7], from: '10:00', to: '12:30' }],
	limits: { surfaceTemperature: { min: 4 } },
	...more
});
const TABLES = {
	touchDry: [
		[5, 500],
		[25, 120]
	],
	overcoatMin: [
		[5, 2000],
		[25, 500]
	],
	overcoatMax: [
		[5, 5000],
		[25, 1600]
	],
	dryToSand: [
		[5, 2500],
		[25, 700]
	]
} satisfies Step['times'];

describe('a job’s soonest plan is the earliest of every chain tried', () => {
	const CHAINS: [string, Step[]][] = [
		['two coats', [changing({ times: TABLES }), changing({ times: TABLES })]],
		[
			'a wash between two coats',
			[
				changing({ times: TABLES }),
				changing({ kind: 'wash', durationMinutes: 60, times: {} }),
				changing({ times: TABLES })
			]
		],
		[
			'abrading between, to be coated within hours',
			[
				changing({ times: TABLES }),
				changing({ kind: 'abrade', durationMinutes: 60, times: { coatWithin: 600 } }),
				changing({ times: TABLES })
			]
		],
		[
			'bare metal to prime within hours, a degreasing between',
			[
				changing({ kind: 'blast', durationMinutes: 30, times: { coatWithin: 60 } }),
				changing({ kind: 'degrease', durationMinutes: 15, times: {} }),
				changing({ durationMinutes: 45, times: TABLES })
			]
		]
	];
	test.each(CHAINS)('%s', (_, chain) => {
		fc.assert(
			fc.property(days, (it) => {
				const { steps, plans } = outlookOf(
					chain.map((step) => on(step)),
					{},
					{ forecast: ensembleOf(it, []) }
				);
				const best = earliestChain(steps);
				if (best === null) expect(plans.soonest?.inserted ?? 1).toBeGreaterThan(0);
				else expect(plans.soonest?.steps.map(({ start }) => (start - START) / 900)).toEqual(best);
			}),
			{ numRuns: 40 }
		);
	});

	test('whatever the zone is called', () => {
		fc.assert(
			fc.property(
				days,
				fc.constantFrom('UTC', 'Asia/Tokyo', 'America/St_Johns'),
				(it, timeZone) => {
					const forecast = ensembleOf(it, []);
					const steps = [
						on(changing({ times: TABLES, workHours: undefined })),
						on(changing({ times: TABLES, workHours: undefined }))
					];
					const plan = (site: typeof SITE) =>
						jobOutlook(
							yardWeather({ site, forecast, looseSand: null }),
							{ steps, launch: {} },
							{ from: START }
						).plans.surest?.steps;
					expect(plan({ ...SITE, timeZone })).toEqual(plan(SITE));
				}
			),
			{ numRuns: 15 }
		);
	});
});

describe('the window of the coat before', () => {
	test('the next coat starts once overcoat min after the finish is over, in work hours', () => {
		const { plans } = outlookOf([on(coat({ overcoatMin: 20, overcoatMax: 48 })), on(coat({}))]);
		// 09:00 to 11:00 on the first day, 20 h on is 07:00: the next day's first hour.
		expect(startsOf(plans.soonest)).toEqual([8, 32]);
		expect(hoursOf(plans.soonest?.steps[0].earliestNext)).toBe(30);
	});

	test('the maximum counts start to start and finish to finish', () => {
		const { plans } = outlookOf([on(coat({ overcoatMax: 10 })), on(coat({}))]);
		expect(hoursOf(plans.soonest?.steps[0].latestNext)).toBe(18);
		// A next coat an hour longer must start an hour sooner.
		const longer = outlookOf([
			on(coat({ overcoatMax: 4 })),
			on(coat({}, { durationMinutes: 240 }))
		]);
		expect(startsOf(longer.plans.soonest)).toEqual([8, 10]);
		const tooLong = outlookOf([
			on(coat({ overcoatMax: 3 })),
			on(coat({}, { durationMinutes: 240 }))
		]);
		expect(tooLong.plans.soonest?.inserted).toBe(1);
	});

	test('a coat without overcoat min is followed from touch dry', () => {
		const { plans } = outlookOf([on(coat({ touchDry: 3 })), on(coat({}))]);
		expect(startsOf(plans.soonest)).toEqual([8, 13]);
	});

	test('a tin that sets no minimum asks for no wait', () => {
		const { plans } = outlookOf([on(coat({ touchDry: 3, overcoatMin: null })), on(coat({}))]);
		expect(startsOf(plans.soonest)).toEqual([8, 10]);
	});

	test('coats on faces of their own do not wait for each other', () => {
		const { plans } = outlookOf([
			on(coat({ overcoatMin: 20 })),
			on(coat({ overcoatMin: 20 }), { faces: [OTHER_FACE] }),
			on(coat({}), { faces: [OTHER_FACE, FACE] })
		]);
		expect(startsOf(plans.soonest)).toEqual([8, 10, 32]);
	});

	test('of several faces the worse binds', () => {
		const table: Step['times'] = {
			overcoatMin: [
				[10, 3000],
				[30, 60]
			]
		};
		const warm = {
			...FACE,
			id: 'warm',
			shelter: { wind: 1, sun: 1, sky: 1, rain: false, dust: false, heat: 10, vapour: 0 }
		};
		const step = { ...coat({}), times: table };
		const both = outlookOf([
			on(step, { faces: [warm, FACE] }),
			on(coat({}), { faces: [warm, FACE] })
		]);
		const cold = outlookOf([on(step), on(coat({}))]);
		const alone = outlookOf([on(step, { faces: [warm] }), on(coat({}), { faces: [warm] })]);
		expect(startsOf(both.plans.soonest)).toEqual(startsOf(cold.plans.soonest));
		expect(startsOf(alone.plans.soonest)?.[1]).toBeLessThan(startsOf(cold.plans.soonest)?.[1] ?? 0);
	});

	test('no plan spans a gap in the data', () => {
		const forecast = forecastOf(
			{ temperature: (hour) => (hour > 20 && hour < 24 ? null : 18) },
			121
		);
		const step = {
			...coat({}),
			times: {
				overcoatMin: [
					[10, 900],
					[30, 600]
				]
			} satisfies Step['times']
		};
		const { plans } = outlookOf([on(step), on(coat({}))], {}, { forecast });
		expect(startsOf(plans.soonest)?.[0]).toBe(32);
	});
});

describe('abrading put in', () => {
	const late = [
		on(coat({ touchDry: 2, overcoatMin: 4, overcoatMax: 20 })),
		on(coat({}, { workHours: [{ days: [4], from: '09:00', to: '17:00' }] }))
	];

	test('a missed maximum is no dead end, and the plan says so', () => {
		const { plans, warnings } = outlookOf([late[0], late[1]], {}, { from: at(0) });
		const logged = outlookOf([{ ...late[0], startAt: at(8), finishedAt: at(10) }, late[1]]);
		expect(plans.soonest?.inserted).toBe(0);
		expect(logged.plans.soonest?.inserted).toBe(1);
		expect(logged.plans.soonest?.steps.map(({ kind, step }) => [kind, step])).toEqual([
			['coat', 0],
			['abrade', null],
			['coat', 1]
		]);
		expect(logged.warnings).toContainEqual({ code: 'abradingPutIn', step: 1 });
		expect(warnings.map(({ code }) => code)).not.toContain('abradingPutIn');
	});

	test('it waits for dry to sand and stays out of the wind', () => {
		const hard = { ...late[0].step, times: { ...late[0].step.times, dryToSand: 60 * 60 } };
		const logged = { ...late[0], step: hard, startAt: at(8), finishedAt: at(10) };
		const abrade = outlookOf([logged, late[1]]).plans.soonest?.steps[1];
		expect(hoursOf(abrade?.start)).toBeGreaterThanOrEqual(70);
		const gale = forecastOf({ windSpeed: 7, windGust: 12 }, 121);
		const { plans, warnings } = outlookOf([logged, late[1]], {}, { forecast: gale });
		expect(plans.soonest).toBeNull();
		expect(warnings).toContainEqual({ code: 'nothingFits', step: 1, hasStarts: true });
	});
});

describe('what is fixed', () => {
	test('is kept as it is, exactly, and counts for no room', () => {
		const { plans } = outlookOf([
			on(coat({ overcoatMin: 4 }), { startAt: at(8) + 300, finishedAt: at(9) + 420 }),
			on(coat({}))
		]);
		expect(plans.soonest?.steps[0]).toMatchObject({
			start: at(8) + 300,
			finish: at(9) + 420,
			isFixed: true,
			room: null,
			limiter: null
		});
		// 4 h after 09:07 of the second hour: the next quarter-hour.
		expect(startsOf(plans.soonest)?.[1]).toBe(13.25);
	});

	test('a pin in the future holds the steps before it to its window', () => {
		const { plans } = outlookOf([
			on(coat({ overcoatMin: 4, overcoatMax: 10 })),
			on(coat({}), { startAt: at(63) })
		]);
		// The third day's first hours: done by 10:00, four hours' wait, and not yet ten since.
		expect(startsOf(plans.soonest)).toEqual([56, 63]);
	});

	test('two logged coats are never parted by their windows', () => {
		const { plans } = outlookOf([
			on(coat({ overcoatMin: 24 }), { startAt: at(8), finishedAt: at(10) }),
			on(coat({}), { startAt: at(11), finishedAt: at(12) })
		]);
		expect(startsOf(plans.soonest)).toEqual([8, 11]);
	});

	test('a coat logged before the forecast begins opens its window on the safe side', () => {
		const { plans, steps } = outlookOf([
			on(
				{ ...coat({}), times: { overcoatMin: 30 * 60, overcoatMax: 100 * 60 } },
				{ startAt: at(-26), finishedAt: at(-24) }
			),
			on(coat({}))
		]);
		expect(steps[0].planStep.isFixed).toBe(true);
		// What cured before the forecast is not known: the earliest clock begins with it.
		expect(startsOf(plans.soonest)?.[1]).toBe(32);
	});
});

describe('chances of a plan', () => {
	const rainy = (hour: number) => ({
		precipitation: forecastOf({ precipitation: (h) => (h === hour ? 3 : 0) }, 121).hourly
			.precipitation
	});
	const wet = coat({ touchDry: 1 }, { limits: { rainFree: true } });

	test('the share of members in which every step holds together', () => {
		const forecast = { ...forecastOf({}, 121), members: [{}, {}, rainy(10), rainy(34)] };
		const { plans } = outlookOf([on(wet), on(wet)], {}, { forecast });
		// The soonest puts both on the first day; rain at 10:00 takes it from one member in four.
		expect(startsOf(plans.soonest)).toEqual([8, 11]);
		expect(plans.soonest?.holdChance).toBe(0.75);
		expect(plans.surest?.holdChance).toBe(1);
	});

	test('a gap outside a member’s own window does not hold', () => {
		const table: Step['times'] = {
			overcoatMin: [
				[10, 1800],
				[20, 600],
				[30, 300]
			]
		};
		const forecast = forecastOf({}, 121);
		const cold = { temperature: forecast.hourly.temperature?.map(() => 9) };
		const { plans } = outlookOf(
			[on({ ...coat({}), times: table }), on(coat({}))],
			{},
			{
				forecast: { ...forecast, members: [{}, cold] }
			}
		);
		expect(plans.soonest?.holdChance).toBe(0.5);
	});

	test('without members there is none', () => {
		expect(outlookOf([on(wet)]).plans.soonest?.holdChance).toBeNull();
	});
});

describe('a time of nought', () => {
	test('asks for no wait, in plans, hours and members alike', () => {
		const forecast = forecastOf({}, 121);
		const members = [forecast.hourly, forecast.hourly];
		const yard = yardWeather({ site: SITE, forecast: { ...forecast, members }, looseSand: null });
		const wet = coat({ touchDry: 0, overcoatMin: 0, launchMin: 0 }, { limits: { rainFree: true } });
		const { plans, steps } = jobOutlook(
			yard,
			{ steps: [on(wet), on(wet)], launch: {} },
			{ from: START }
		);
		expect(startsOf(plans.soonest)).toEqual([8, 10]);
		expect(plans.soonest?.holdChance).toBe(1);
		expect(hoursOf(plans.soonest?.steps[0].earliestNext)).toBe(10);
		expect(hoursOf(plans.soonest?.launchReady.latest)).toBe(12);
		expect(steps[0].chances?.slots[40]).toBe(2);
	});

	test('as a maximum leaves no time, and no number that is none', () => {
		const { plans } = outlookOf([on(coat({ overcoatMax: 0 })), on(coat({}))]);
		expect(plans.soonest?.inserted).toBe(1);
		expect(hoursOf(plans.soonest?.steps[0].latestNext)).toBeCloseTo(8, 3);
	});
});

describe('the chance that a plan holds', () => {
	test('knows coats logged before the forecast begins, on the safe side', () => {
		const forecast = forecastOf({}, 121);
		const members = [forecast.hourly, forecast.hourly];
		const yard = yardWeather({ site: SITE, forecast: { ...forecast, members }, looseSand: null });
		const chanceOf = (times: Parameters<typeof coat>[0]) =>
			jobOutlook(
				yard,
				{
					steps: [on(coat(times), { startAt: at(-26), finishedAt: at(-24) }), on(coat({}))],
					launch: {}
				},
				{ from: START }
			).plans.soonest;
		const inside = chanceOf({ overcoatMin: 4, overcoatMax: 90 });
		expect(inside?.holdChance).toBe(1);
		expect(inside?.inserted).toBe(0);
		// Thirty hours before the forecast count to the maximum.
		expect(chanceOf({ overcoatMin: 4, overcoatMax: 30 })?.inserted).toBe(1);
	});
});
