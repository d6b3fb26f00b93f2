import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { outlookRequestSchema } from '../../../../src/lib/api/outlook/request';
import { outlookResponseSchema } from '../../../../src/lib/api/outlook/response';
import {
	FINISHES,
	instantText,
	MATERIALS,
	METHODS,
	SHELTERS,
	STEP_KINDS,
	TIME_NAMES
} from '../../../../src/lib/engine';
import { answerOutlook } from '../../../../src/lib/server/outlook/stateless';

/** Whatever a program may send that the schema lets through, the engine answers, in numbers. */
const START = Date.UTC(2026, 2, 27) / 1000;
const HOURS = 60;

const maybe = <T>(arbitrary: fc.Arbitrary<T>): fc.Arbitrary<T | undefined> =>
	fc.option(arbitrary, { nil: undefined });
const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Hours of a variable, some of them missing, now and then all. */
const series = (min: number, max: number) =>
	fc
		.tuple(number(min, max), number(min, max), fc.integer({ min: 0, max: 12 }), fc.nat())
		.map(([a, b, gaps, seed]) =>
			Array.from({ length: HOURS }, (_, i) =>
				gaps > 0 && (i * 7 + seed) % (15 - gaps) === 0
					? null
					: a + ((b - a) * (1 + Math.sin(i + seed))) / 2
			)
		);

const variables = {
	dewPoint: maybe(series(-30, 25)),
	pressure: maybe(series(700, 1050)),
	windGust: maybe(series(0, 40)),
	precipitationProbability: maybe(series(0, 100)),
	cloudCover: maybe(series(0, 100)),
	ghi: maybe(series(0, 1000)),
	dni: maybe(series(0, 900)),
	dhi: maybe(series(0, 400))
};
const hourly = fc.record({
	time: fc
		.array(fc.integer({ min: 0, max: 20 }), { minLength: HOURS, maxLength: HOURS })
		.map((jumps) => {
			// Mostly every hour, now and then a gap.
			let hour = 0;
			return jumps.map((jump) => instantText(START + 3600 * (hour += jump === 20 ? 5 : 1)));
		}),
	temperature: series(-30, 45),
	relativeHumidity: series(1, 100),
	windSpeed: series(0, 25),
	windDirection: series(0, 360),
	precipitation: series(0, 6),
	...variables
});
const member = fc.record({ ...variables, temperature: maybe(series(-30, 45)) });

const range = (min: number, max: number) =>
	fc
		.tuple(maybe(number(min, max)), maybe(number(min, max)))
		.map(([a, b]) =>
			a !== undefined && b !== undefined
				? { min: Math.min(a, b), max: Math.max(a, b) }
				: { ...(a === undefined ? {} : { min: a }), ...(b === undefined ? {} : { max: b }) }
		);
const limits = fc.record({
	airTemperature: maybe(range(-20, 50)),
	surfaceTemperature: maybe(range(-20, 60)),
	relativeHumidity: maybe(range(0, 100)),
	spread: maybe(fc.record({ min: number(0, 6), untilDry: maybe(fc.boolean()) })),
	wind: maybe(fc.record({ max: number(0, 30) })),
	gust: maybe(fc.record({ max: number(0, 40) })),
	windHeight: maybe(number(0.5, 40)),
	rainFree: maybe(fc.boolean()),
	drySurface: maybe(fc.boolean()),
	noDirectSun: maybe(fc.boolean()),
	surfaceTrend: maybe(fc.constantFrom('falling' as const, 'rising' as const)),
	daylight: maybe(fc.boolean()),
	sand: maybe(fc.constant('none' as const)),
	curing: maybe(fc.record({ min: number(-10, 30) }))
});
const table = fc.oneof(
	fc.constant(null),
	number(0, 20_000),
	fc
		.uniqueArray(fc.integer({ min: -10, max: 45 }), { minLength: 1, maxLength: 4 })
		.chain((rows) =>
			fc.tuple(
				...rows.sort((a, b) => a - b).map((t) => fc.tuple(fc.constant(t), number(0.01, 30_000)))
			)
		)
);
const step = fc.record({
	name: fc.string({ maxLength: 20 }),
	kind: fc.constantFrom(...STEP_KINDS),
	durationMinutes: number(1, 600),
	method: fc.constantFrom(...METHODS),
	workHours: maybe(
		fc.constantFrom(
			[],
			[{ days: [5, 6, 7], from: '22:00', to: '06:00' }],
			[{ days: [1, 2, 3, 4, 5, 6, 7], from: '07:30', to: '18:30' }]
		)
	),
	limits,
	times: fc.dictionary(fc.constantFrom(...TIME_NAMES), table, { maxKeys: 6 }),
	startAt: maybe(fc.integer({ min: -200, max: 90 }).map((hour) => instantText(START + hour * 1800)))
});
const request = fc.record({
	site: fc.record({
		latitude: number(-70, 70),
		longitude: number(-180, 180),
		elevation: number(0, 2000),
		timeZone: fc.constantFrom('Europe/Lisbon', 'UTC', 'Asia/Kathmandu')
	}),
	forecast: fc.record({
		issuedAt: fc.constantFrom(instantText(START), instantText(START + 30 * 3600)),
		hourly,
		members: maybe(fc.array(member, { maxLength: 6 }))
	}),
	face: fc.record({
		tilt: number(0, 180),
		azimuth: number(0, 360),
		solarAbsorptance: number(0, 1),
		emissivity: number(0, 1),
		material: fc.constantFrom(...MATERIALS),
		finish: maybe(fc.constantFrom(...FINISHES)),
		bothSides: maybe(fc.boolean())
	}),
	shelter: fc.constantFrom(...SHELTERS),
	looseSand: maybe(
		fc.constant({ sectors: [{ from: 300, to: 40 }], grainDiameter: 0.3, clayPercent: 2 })
	),
	readings: maybe(
		fc.array(
			fc.record({
				time: fc.integer({ min: -5, max: 70 }).map((hour) => instantText(START + hour * 3600)),
				surfaceTemperature: number(-20, 70)
			}),
			{ maxLength: 4 }
		)
	),
	steps: fc.array(step, { minLength: 1, maxLength: 4 }),
	launchBy: maybe(fc.constant(instantText(START + 50 * 3600))),
	launchSlots: maybe(fc.constant([instantText(START + 40 * 3600), instantText(START + 90 * 3600)])),
	dayRate: maybe(number(0, 500))
});

describe('any request the schema lets through', () => {
	test('is answered, and no number of the answer is none', () => {
		let answered = 0;
		fc.assert(
			fc.property(request, (sent) => {
				const parsed = outlookRequestSchema.safeParse(JSON.parse(JSON.stringify(sent)));
				fc.pre(parsed.success);
				if (!parsed.success) return;
				answered++;
				const answer = answerOutlook(parsed.data);
				outlookResponseSchema.parse(answer);
				expect(answer.slots.surfaceTemperature).toHaveLength(answer.slots.time.length);
				for (const { state, room } of answer.steps) {
					state.forEach((it, i) => {
						if (it !== 'shut') expect(room[i]).not.toBeNull();
					});
				}
			}),
			{ numRuns: 250 }
		);
		expect(answered).toBeGreaterThan(200);
	}, 120_000);
});
