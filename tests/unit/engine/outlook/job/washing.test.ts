import { describe, expect, test } from 'vitest';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { LIMITERS } from '../../../../../src/lib/engine/vocabulary';
import { COAT, conditionsOf, forecastOf, slotAt, START } from '../flatWeather';
import { at, coat, hoursOf, on, OTHER_FACE, outlookOf, startsOf } from './jobs';

const wash: Step = { ...COAT, kind: 'wash', method: 'none' };
const dry = coat({ touchDry: 2 }, { limits: { drySurface: true }, workHours: undefined });
const filmOf = (outlook: ReturnType<typeof outlookOf>, step = 0) =>
	outlook.steps[step].faces[0].sides[0].film;

describe('a washing that is logged', () => {
	const logged = on(wash, { startAt: at(9), finishedAt: at(10) });

	test('wets the face to run-off, and the next step waits for it to dry', () => {
		const outlook = outlookOf([logged, on(dry)], {}, { from: at(10) });
		expect(filmOf(outlook)[slotAt(10) - 1]).toBe(0);
		expect(filmOf(outlook)[slotAt(10)]).toBe(0.1);
		const { state, limiter } = outlook.steps[1].hours;
		expect(state[slotAt(10)]).toBe(0);
		expect(LIMITERS[limiter[slotAt(10)]]).toBe('wet');
		expect(hoursOf(outlook.plans.soonest?.steps[1].start)).toBeGreaterThan(10);
		expect(hoursOf(outlook.plans.soonest?.steps[1].start)).toBeLessThan(16);
	});

	test('in members too, and not other faces', () => {
		const forecast = { ...forecastOf({}, 121), members: [{ temperature: Array(121).fill(18) }] };
		const outlook = outlookOf(
			[logged, on(dry), on(dry, { faces: [OTHER_FACE] })],
			{},
			{ forecast, from: at(10) }
		);
		expect(outlook.steps[1].chances?.slots[slotAt(10)]).toBe(0);
		expect(outlook.steps[2].chances?.slots[slotAt(10)]).toBe(1);
		expect(filmOf(outlook, 2)[slotAt(10)]).toBe(0);
	});

	test('off the quarter-hour it is wet from the next one on', () => {
		const late = { ...logged, finishedAt: at(10) + 300 };
		expect(filmOf(outlookOf([late]))[slotAt(10)]).toBe(0);
		expect(filmOf(outlookOf([late]))[slotAt(10) + 1]).toBe(0.1);
	});
});

describe('a washing that is planned', () => {
	test('holds back the next step that needs a dry surface until the film is gone', () => {
		const steps = [on(wash), on(dry)];
		const [first, second] = startsOf(outlookOf(steps, {}, { from: at(9) }).plans.soonest) ?? [];
		expect(first).toBe(9);
		const loggedAt = { startAt: at(9), finishedAt: at(10) };
		const logged = outlookOf([on(wash, loggedAt), on(dry)], {}, { from: at(9) });
		// The same film, from the same heat balance.
		expect(second).toBe(startsOf(logged.plans.soonest)?.[1]);
	});

	test('and not a step that does not mind, nor another face, nor what comes after a dry one', () => {
		const damp = coat({}, { workHours: undefined });
		const starts = (...steps: Parameters<typeof outlookOf>[0]) =>
			startsOf(outlookOf(steps, {}, { from: at(9) }).plans.soonest);
		expect(starts(on(wash), on(damp))).toEqual([9, 10]);
		expect(starts(on(wash), on(dry, { faces: [OTHER_FACE] }))).toEqual([9, 10]);
		const [, between] = starts(on(wash), on(dry)) ?? [];
		expect(starts(on(wash), on(damp), on(dry))?.[2]).toBe(Math.max(between ?? 0, 12));
	});

	test('dries sooner in wind and sun than on a still night', () => {
		const [breezy] = conditionsOf({ windSpeed: 6, dewPoint: 2, cloudCover: 0 });
		const [still] = conditionsOf({ windSpeed: 0.5, dewPoint: 14, cloudCover: 0 });
		const hoursFrom = (face: typeof still, hour: number): number =>
			((face.dries?.(slotAt(hour)) ?? NaN) - slotAt(hour)) / 4;
		expect(hoursFrom(breezy, 36)).toBeLessThan(1.5);
		expect(hoursFrom(still, 22)).toBeGreaterThan(4);
		expect(START).toBeLessThan(at(22));
	});

	test('is never dry where the forecast, or the rain in it, ends first', () => {
		const [wet] = conditionsOf({ precipitation: (h) => (h > 40 ? 1 : 0) });
		expect(wet.dries?.(slotAt(50))).toBe(Infinity);
		const [unknown] = conditionsOf({ precipitation: (h) => (h === 31 ? null : 0) });
		expect(unknown.dries?.(slotAt(30))).toBe(Infinity);
		expect(unknown.dries?.(slotAt(33))).toBeLessThan(slotAt(45));
	});
});
