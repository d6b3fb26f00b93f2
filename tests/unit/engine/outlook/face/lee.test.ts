import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { faceSchema, type Face } from '../../../../../src/lib/engine/outlook/face/face';
import {
	leeSchema,
	leeShares,
	type LeeSector
} from '../../../../../src/lib/engine/outlook/face/lee';
import { stepHours } from '../../../../../src/lib/engine/outlook/hours/stepHours';
import { workWind } from '../../../../../src/lib/engine/outlook/hours/workWind';
import { jobOutlook } from '../../../../../src/lib/engine/outlook/job/jobOutlook';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { LIMITERS } from '../../../../../src/lib/engine/vocabulary';
import { days, ensembleOf, HOURS } from '../changingWeather';
import { COAT, conditionsOf, forecastOf, SITE, slotAt, START, TOPSIDES } from '../flatWeather';

const HEDGE: LeeSector = { from: 200, to: 280, factor: 0.5 };
const faceIn = (...lee: LeeSector[]): Face => ({ ...TOPSIDES, lee });
const windIn = (lee: LeeSector[], direction: number, height?: number) => {
	const [face] = conditionsOf(
		{ windDirection: direction, windSpeed: 8, windGust: 13 },
		{ face: faceIn(...lee) }
	);
	const { mean, gust } = workWind(face, SITE, height);
	return { mean: mean[0], gust: gust[0] };
};

const sector: fc.Arbitrary<LeeSector> = fc
	.record({
		from: fc.integer({ min: 0, max: 360 }),
		to: fc.integer({ min: 0, max: 360 }),
		factor: fc.double({ min: 0, max: 1, noNaN: true }),
		height: fc.option(fc.double({ min: 0.5, max: 20, noNaN: true }), { nil: undefined })
	})
	.filter(({ from, to }) => from !== to);

describe('the wind behind a hedge', () => {
	const open = windIn([], 240);

	test('is the factor’s share of the mean, the gust’s excess as it was', () => {
		const behind = windIn([HEDGE], 240);
		expect(behind.mean).toBeCloseTo(open.mean / 2, 9);
		expect(behind.gust).toBeCloseTo(open.gust - open.mean / 2, 9);
	});

	test('is unbroken from elsewhere, over its top, and where the direction varies', () => {
		expect(windIn([HEDGE], 90)).toEqual(open);
		expect(windIn([HEDGE], 240, 10)).toEqual(windIn([], 240, 10));
		expect(windIn([{ ...HEDGE, height: 12 }], 240, 10).mean).toBeLessThan(windIn([], 240, 10).mean);
		const light = { windDirection: null, windSpeed: 2, windGust: 3 };
		const meanOf = (...lee: LeeSector[]) =>
			workWind(conditionsOf(light, { face: faceIn(...lee) })[0], SITE).mean[0];
		expect(meanOf({ ...HEDGE, from: 0, to: 360 })).toBe(meanOf());
	});

	test('of two sectors the stronger lee counts', () => {
		const shed = { from: 230, to: 250, factor: 0.2 };
		expect(windIn([HEDGE, shed], 240).mean).toBeCloseTo(open.mean * 0.2, 9);
		expect(windIn([HEDGE, shed], 260).mean).toBeCloseTo(open.mean * 0.5, 9);
	});

	test('goes round by north', () => {
		const north = { from: 350, to: 20, factor: 0.4 };
		expect(windIn([north], 5).mean).toBeCloseTo(open.mean * 0.4, 9);
		expect(windIn([north], 40).mean).toBe(open.mean);
	});

	test('is taken by the shelter on top', () => {
		const [face] = conditionsOf(
			{ windDirection: 240, windSpeed: 8, windGust: 13 },
			{ face: faceIn(HEDGE), shelter: 'lee' }
		);
		expect(workWind(face, SITE).mean[0]).toBeCloseTo(open.mean / 4, 9);
	});

	test('an unknown direction closes what the wind enters, and only with a lee stated', () => {
		const gap = { windDirection: (h: number) => (h === 30 ? null : 240), windSpeed: 8 };
		const step = { ...COAT, limits: { wind: { max: 12 } } };
		const hoursOf = (face: Face) => stepHours(step, conditionsOf(gap, { face }), SITE);
		expect(hoursOf(faceIn()).state[slotAt(30)]).toBeGreaterThan(0);
		const behind = hoursOf(faceIn(HEDGE));
		expect(behind.state[slotAt(30)]).toBe(0);
		expect(LIMITERS[behind.limiter[slotAt(30)]]).toBe('noData');
		const [face] = conditionsOf(gap, { face: faceIn(HEDGE) });
		expect(face.surfaceShaded[slotAt(30)]).toBeNaN();
		expect(face.surfaceShaded[slotAt(32)]).not.toBeNaN();
	});
});

describe('the face behind a hedge', () => {
	const clear = { windDirection: 240, windSpeed: 5, cloudCover: 0 };

	test('is colder by night and warmer in the sun', () => {
		const [open] = conditionsOf(clear);
		const [behind] = conditionsOf(clear, { face: faceIn(HEDGE) });
		expect(behind.surfaceShaded[slotAt(28)]).toBeLessThan(open.surfaceShaded[slotAt(28)] - 0.3);
		expect(behind.surfaceSunlit[slotAt(33)]).toBeGreaterThan(open.surfaceSunlit[slotAt(33)] + 1);
	});

	test('meets a variable wind in the strongest lee', () => {
		const light = { windDirection: null, windSpeed: 2.5, windGust: 4, cloudCover: 0 };
		const shaded = (...lee: LeeSector[]) =>
			conditionsOf(light, { face: faceIn(...lee) })[0].surfaceShaded;
		expect(shaded(HEDGE)).toEqual(shaded({ from: 0, to: 360, factor: 0.5 }));
	});

	test('hours and chances of a job know it, in the forecast and in the members', () => {
		const forecast = forecastOf({ windDirection: 240, windSpeed: 9, windGust: 9 }, HOURS);
		const yard = yardWeather({
			site: SITE,
			forecast: { ...forecast, members: [{ windDirection: forecast.hourly.windDirection }] },
			looseSand: null
		});
		const step = { ...COAT, limits: { wind: { max: 5 } } };
		const outlookIn = (...lee: LeeSector[]) =>
			jobOutlook(
				yard,
				{
					steps: [{ step, faces: [{ id: 'port', face: faceIn(...lee), shelter: 'open' }] }],
					launch: {}
				},
				{ from: START }
			).steps[0];
		expect(outlookIn().hours.best).toBeNull();
		expect(outlookIn().chances?.slots[slotAt(20)]).toBe(0);
		expect(outlookIn(HEDGE).hours.best).not.toBeNull();
		expect(outlookIn(HEDGE).chances?.slots[slotAt(20)]).toBe(1);
	});
});

describe('whatever the lee', () => {
	test('it never raises mean or gust, at any height', () => {
		fc.assert(
			fc.property(
				days,
				fc.array(sector, { maxLength: 4 }),
				fc.integer({ min: -1, max: 360 }),
				fc.double({ min: 0.5, max: 20, noNaN: true }),
				(it, lee, from, height) => {
					const { hourly } = ensembleOf(it, []);
					const changes = {
						windSpeed: (h: number) => hourly.windSpeed?.[h] ?? null,
						windGust: (h: number) => hourly.windGust?.[h] ?? null,
						windDirection: from < 0 ? null : from
					};
					const forecast = forecastOf(changes, HOURS);
					const at = (face: Face) =>
						workWind(conditionsOf({}, { face, forecast })[0], SITE, height);
					const open = at(faceIn());
					const behind = at(faceIn(...lee));
					behind.mean.forEach((mean, i) => {
						if (Number.isNaN(mean)) expect(from).toBe(-1);
						else expect(mean).toBeLessThanOrEqual(open.mean[i]);
						expect(behind.gust[i] > open.gust[i]).toBe(false);
					});
				}
			),
			{ numRuns: 100 }
		);
	});

	test('a sector that the wind never comes from, or that breaks nothing, changes nothing', () => {
		fc.assert(
			fc.property(days, sector, fc.boolean(), (it, silent, breaksNothing) => {
				const lee = breaksNothing ? { ...silent, factor: 1 } : { ...silent, from: 90, to: 180 };
				// From 40° throughout: outside the sector, wherever that is not all round.
				const forecast = ensembleOf(it, []);
				const [open] = conditionsOf({}, { forecast });
				const [behind] = conditionsOf({}, { face: faceIn(lee), forecast });
				expect(behind.surfaceShaded).toEqual(open.surfaceShaded);
				expect(behind.surfaceSunlit).toEqual(open.surfaceSunlit);
				expect(behind.film).toEqual(open.film);
				expect(workWind(behind, SITE)).toEqual(workWind(open, SITE));
			}),
			{ numRuns: 60 }
		);
	});

	test('shares are monotone in the factor', () => {
		fc.assert(
			fc.property(sector, fc.double({ min: 0, max: 1, noNaN: true }), (one, factor) => {
				const windDirection = Float64Array.from({ length: 361 }, (_, i) => i - 1);
				const shares = (it: LeeSector) =>
					leeShares({ windDirection }, [it], 0.5, 'inAll') ?? windDirection.map(() => 1);
				const more = shares({ ...one, factor: Math.max(one.factor, factor) });
				const less = shares({ ...one, factor: Math.min(one.factor, factor) });
				less.forEach((share, i) => expect(share).toBeLessThanOrEqual(more[i]));
			})
		);
	});
});

describe('leeSchema', () => {
	const messagesOf = (input: unknown): string[] => {
		const parsed = leeSchema.safeParse(input);
		return parsed.success
			? []
			: parsed.error.issues.map(({ path, message }) => `${path.join('/')}: ${message}`);
	};

	test('takes sectors with and without a height', () => {
		expect(messagesOf([HEDGE, { ...HEDGE, height: 6 }, { from: 0, to: 360, factor: 0 }])).toEqual(
			[]
		);
	});

	test.each([
		[{ ...HEDGE, factor: 1.4 }, '0/factor: factor 1.4 would raise the wind: at most 1'],
		[{ ...HEDGE, factor: -0.1 }, '0/factor: factor -0.1 is under 0, all of the wind broken'],
		[{ ...HEDGE, factor: undefined }, '0/factor: factor is what is left of the wind, 0 to 1'],
		[{ ...HEDGE, from: -5 }, '0/from: from -5° is under 0°'],
		[{ ...HEDGE, to: 400 }, '0/to: to 400° is over 360°'],
		[{ ...HEDGE, to: 'south' }, '0/to: to is a direction in degrees, 0 to 360'],
		[{ ...HEDGE, to: 200 }, '0/to: a sector from 200° to 200° is none: all round is from 0 to 360'],
		[{ ...HEDGE, height: 0 }, '0/height: height 0 m is under 0.5 m']
	])('says what is wrong with %o', (input, message) => {
		expect(messagesOf([input])).toEqual([message]);
	});

	test('is part of a face', () => {
		expect(faceSchema.safeParse(faceIn(HEDGE)).success).toBe(true);
		expect(faceSchema.safeParse(faceIn({ ...HEDGE, factor: 2 })).success).toBe(false);
	});
});
