import { describe, expect, test } from 'vitest';
import { outlookRequestSchema } from '../../../../src/lib/api/outlook/request';
import { answerOutlook } from '../../../../src/lib/server/outlook/stateless';
import { START } from '../../engine/outlook/flatWeather';

const HOUR = 3600;
const instant = (hours: number): string => new Date((START + hours * HOUR) * 1000).toISOString();
const requestOf = (hours: readonly number[], more: object = {}) => ({
	site: { latitude: 37, longitude: -8, elevation: 4, timeZone: 'Europe/Lisbon' },
	forecast: {
		issuedAt: instant(0),
		hourly: {
			time: hours.map(instant),
			temperature: hours.map(() => 18),
			dewPoint: hours.map(() => 8),
			windSpeed: hours.map(() => 3),
			windDirection: hours.map(() => 90),
			precipitation: hours.map(() => 0)
		}
	},
	face: { tilt: 90, azimuth: 0, solarAbsorptance: 0.4, emissivity: 0.9, material: 'grp' },
	steps: [
		{ name: 'coat', kind: 'coat', durationMinutes: 60, method: 'roller', limits: {}, times: {} }
	],
	...more
});
const upTo = (count: number): number[] => Array.from({ length: count }, (_, i) => i);
const problemsOf = (request: object): string[] => {
	const parsed = outlookRequestSchema.safeParse(request);
	return parsed.success
		? []
		: parsed.error.issues.map(({ path, message }) => `${path.join('/')}: ${message}`);
};

describe('what a request may cost', () => {
	test('hours far apart are not laid on years of quarter-hours', () => {
		expect(problemsOf(requestOf([0, 1, 432]))).toEqual([]);
		expect(problemsOf(requestOf([0, 1, 9_000]))).toEqual([
			'forecast/hourly/time/2: is 9000 hours after the first: at most 432'
		]);
	});

	test('an answer is asked for near the forecast', () => {
		const hours = upTo(49);
		expect(problemsOf(requestOf(hours, { from: instant(-48), to: instant(96) }))).toEqual([]);
		expect(problemsOf(requestOf(hours, { from: '1990-01-01T00:00:00Z' }))).toEqual([
			'from: is more than 48 hours outside the forecast'
		]);
		expect(problemsOf(requestOf(hours, { to: '2999-01-01T00:00:00Z' }))).toEqual([
			'to: is more than 48 hours outside the forecast'
		]);
	});

	test('lists are no longer than a yard has use for', () => {
		const [step] = requestOf([]).steps;
		const hours = { days: [1], from: '08:00', to: '17:00' };
		const rows = upTo(61).map((i) => [i, 100]);
		const sector = { from: 0, to: 10 };
		for (const more of [
			{ steps: [{ ...step, workHours: upTo(51).map(() => hours) }] },
			{ steps: [{ ...step, workHours: [{ ...hours, days: upTo(8).map(() => 1) }] }] },
			{ steps: [{ ...step, times: { touchDry: rows } }] },
			{ looseSand: { sectors: upTo(37).map(() => sector), grainDiameter: 0.2, clayPercent: 1 } }
		])
			expect(problemsOf(requestOf(upTo(25), more))).not.toEqual([]);
	});

	test('thousands of readings of sixty members are taken in at once', () => {
		const hours = upTo(433);
		const readings = upTo(5_000).map((i) => ({
			time: instant(i / 12),
			surfaceTemperature: 18 + Math.sin(i)
		}));
		const members = upTo(60).map(() => ({ temperature: hours.map(() => 17) }));
		const request = requestOf(hours, { readings });
		const parsed = outlookRequestSchema.parse({
			...request,
			forecast: { ...request.forecast, members }
		});
		const from = performance.now();
		const { slots } = answerOutlook(parsed);
		// A walk over all readings in every slot of every member takes half a minute.
		expect(performance.now() - from).toBeLessThan(8_000);
		expect(slots.flags[10]).toContain('measured');
	});
});
