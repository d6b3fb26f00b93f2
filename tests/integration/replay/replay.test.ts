import { formatInTimeZone, fromZonedTime } from 'date-fns-tz';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { hoursSchema, type Hours } from '../../../src/lib/api/hours';
import type { Limits } from '../../../src/lib/engine';
import type { Membership } from '../../../src/lib/server/access/roles';
import {
	boats,
	faces,
	jobs,
	stepFaces,
	steps,
	users,
	yards
} from '../../../src/lib/server/db/schema';
import { forecastConfigSchema, type ForecastConfig } from '../../../src/lib/server/forecast/config';
import { refreshForecast } from '../../../src/lib/server/forecast/refresh';
import { hoursOfYard } from '../../../src/lib/server/outlook/hours';
import { createTestDatabase } from '../../setup/database';
import { AIRPORT, MEASURED_FILE, measuredRows, sunIsUp } from './measured';

const HOUR = 3600;
const SLOT = 900;
/** A plain coat; the judge below holds the measured values against the same numbers. */
const LIMITS = {
	airTemperature: { min: 8, max: 32 },
	relativeHumidity: { max: 85 },
	spread: { min: 3 },
	wind: { max: 8 },
	gust: { max: 12 },
	rainFree: true,
	daylight: true
} satisfies Limits;
const FROM_HOUR = 8;
const TO_HOUR = 18;
/** ln(2/0.03)/ln(10/0.03): wind at work height over a yard's roughness. */
const WORK_HEIGHT = 0.723;

let fake: ForecastFake;
let config: ForecastConfig;
let database: Awaited<ReturnType<typeof createTestDatabase>>;
const rows = measuredRows();

beforeAll(async () => {
	fake = await startForecastFake({ scenario: { kind: 'replay', file: MEASURED_FILE, members: 2 } });
	config = forecastConfigSchema.parse({
		OPEN_METEO_URL: fake.url,
		OPEN_METEO_ENSEMBLE_URL: fake.url,
		MET_NORWAY_URL: fake.url,
		FORECAST_CONTACT: 'harbour@yard.example'
	});
	database = await createTestDatabase();
});
afterAll(async () => {
	await database.drop();
	await fake.close();
});

const first = <T>(list: T[]): T => {
	const [one] = list;
	if (one === undefined) throw new Error('nothing was inserted');
	return one;
};

/** A yard at the airport with one boat, one face and one queued coat. */
async function yardWithCoat(name: string): Promise<Membership> {
	const { db } = database;
	const yard = first(
		await db
			.insert(yards)
			.values({
				slug: name,
				name,
				...AIRPORT,
				workHours: [{ days: [1, 2, 3, 4, 5, 6, 7], from: '08:00', to: '18:00' }]
			})
			.returning()
	);
	const user = first(
		await db
			.insert(users)
			.values({ email: `${name}@yard.example`, name, passwordHash: '-' })
			.returning()
	);
	const boat = first(
		await db.insert(boats).values({ yardId: yard.id, name: 'Teal', heading: 0 }).returning()
	);
	const face = first(
		await db
			.insert(faces)
			.values({
				boatId: boat.id,
				name: 'topsides',
				side: 'starboard',
				tilt: 95,
				bearing: 90,
				material: 'grp',
				finish: 'gloss',
				solarAbsorptance: 0.3,
				emissivity: 0.9
			})
			.returning()
	);
	const job = first(
		await db.insert(jobs).values({ boatId: boat.id, name: 'Topsides', position: 0 }).returning()
	);
	const step = first(
		await db
			.insert(steps)
			.values({
				jobId: job.id,
				position: 0,
				name: 'coat',
				kind: 'coat',
				method: 'roller',
				durationMinutes: 60,
				limits: LIMITS,
				times: { touchDry: 60 }
			})
			.returning()
	);
	await db.insert(stepFaces).values({ stepId: step.id, faceId: face.id });
	return { yard, user, role: 'manager' };
}

/** Provider, adapter, database, engine and view, as of a local time. */
async function hoursAt(membership: Membership, local: string): Promise<Hours> {
	const now = fromZonedTime(local, AIRPORT.timeZone);
	fake.setNow(now.getTime() / 1000);
	const deps = { db: database.db, config, http: { clock: () => now.getTime() } };
	const result = await refreshForecast(deps, membership.yard, now);
	expect(result.outcome).toBe('stored');
	return hoursSchema.parse(await hoursOfYard(database.db, membership, now));
}

function runAt(hours: Hours, local: string) {
	const at = fromZonedTime(local, AIRPORT.timeZone).getTime();
	const slot = Math.floor((at - Date.parse(hours.start)) / (SLOT * 1000));
	return hours.boats[0]?.steps[0]?.runs.find((run) => slot >= run.from && slot < run.to);
}

describe('measured hours from provider to page', () => {
	// Why, from the measured values of 09:00 to 16:00 local.
	const DAYS: [string, string, string, RegExp, RegExp][] = [
		[
			'2013-09-09',
			'dry and mild: 19 to 22 °C, 40 to 55 %, wind to 4 m/s, no rain',
			'12:00',
			/open|tight/,
			/./
		],
		[
			'2013-05-02',
			'dry and mild: 16 to 20 °C, 36 to 51 %, wind to 4 m/s, no rain',
			'13:00',
			/open|tight/,
			/./
		],
		['2013-05-08', 'rain all day, 29 mm, and 78 to 97 %', '12:00', /shut/, /rain|damp|wet|dew/],
		[
			'2013-11-10',
			'a gale: 13 m/s mean at the mast from 12:00 to 13:00, 9.7 at work height against 8',
			'12:30',
			/shut/,
			/wind/
		],
		['2013-01-22', 'hard frost: −7 to −5 °C against a least of 8', '12:00', /shut/, /cold/],
		['2013-10-06', 'soaked air: 88 to 100 % against 85', '11:00', /shut/, /damp|dew/],
		['2013-07-18', 'great heat: 33 to 38 °C against 32', '14:00', /shut/, /hot/]
	];
	test.each(DAYS)('%s, %s: at %s it is so', async (date, _, time, state, limiter) => {
		const membership = await yardWithCoat(`day-${date}`);
		const run = runAt(await hoursAt(membership, `${date}T05:00:00`), `${date}T${time}:00`);
		expect(run?.state).toMatch(state);
		expect(run?.limiter).toMatch(limiter);
	});
});

/** What the measured values of an hour allow, read permissively: no drying, no dew, no history. */
function allows(epochSeconds: number): boolean {
	const row = rows.get(epochSeconds);
	if (row === undefined) return false;
	const { temperature, dewPoint, humidity, wind, gust, rain } = row;
	if (temperature === null || dewPoint === null || humidity === null || wind === null) return false;
	const { airTemperature, relativeHumidity, spread } = LIMITS;
	// The rain of an hour is that of the stamp at its end.
	const next = rows.get(epochSeconds + HOUR);
	return (
		temperature >= airTemperature.min &&
		temperature <= airTemperature.max &&
		humidity <= relativeHumidity.max &&
		temperature - dewPoint >= spread.min &&
		wind * WORK_HEIGHT <= LIMITS.wind.max &&
		(gust === null || wind * WORK_HEIGHT + gust - wind <= LIMITS.gust.max) &&
		(rain ?? 0) < 0.1 &&
		(next?.rain ?? 0) < 0.1 &&
		sunIsUp(epochSeconds) &&
		sunIsUp(epochSeconds + HOUR)
	);
}

describe('an engine that shuts everything fails', () => {
	const WEEKS = [
		'2013-03-25',
		'2013-04-22',
		'2013-05-13',
		'2013-06-17',
		'2013-07-08',
		'2013-08-19',
		'2013-09-16',
		'2013-10-21'
	];

	test('over eight weeks the workable slots are at least 60 % of what the measured values allow', async () => {
		let allowed = 0;
		let workable = 0;
		const printed: string[] = [];
		for (const monday of WEEKS) {
			const membership = await yardWithCoat(`week-${monday}`);
			let [weekAllowed, weekWorkable] = [0, 0];
			// The page holds four local days: two looks make a week.
			for (const [offset, days] of [
				[0, 4],
				[4, 3]
			] as const) {
				const start = Date.parse(`${monday}T00:00:00Z`) + offset * 24 * HOUR * 1000;
				const date = new Date(start).toISOString().slice(0, 10);
				const hours = await hoursAt(membership, `${date}T00:30:00`);
				const runs = hours.boats[0]?.steps[0]?.runs ?? [];
				for (const day of hours.days.slice(0, days)) {
					for (let slot = day.startSlot; slot < day.startSlot + day.slots; slot++) {
						const at = Date.parse(hours.start) / 1000 + slot * SLOT;
						const hour = Number(formatInTimeZone(at * 1000, AIRPORT.timeZone, 'H'));
						if (hour < FROM_HOUR || hour >= TO_HOUR) continue;
						if (!allows(Math.floor(at / HOUR) * HOUR)) continue;
						weekAllowed++;
						const run = runs.find(({ from, to }) => slot >= from && slot < to);
						if (run !== undefined && run.state !== 'shut') weekWorkable++;
					}
				}
			}
			allowed += weekAllowed;
			workable += weekWorkable;
			printed.push(`${monday} ${weekWorkable}/${weekAllowed}`);
		}
		process.stdout.write(
			`workable of allowed slots by week: ${printed.join(', ')}; together ${((100 * workable) / allowed).toFixed(0)} %\n`
		);
		expect(allowed).toBeGreaterThan(1_000);
		expect(workable / allowed).toBeGreaterThanOrEqual(0.6);
	});
});
