import { readdirSync, readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { seedDemo } from '../../../drizzle/seed/seed';
import { DEMO_PEOPLE, DEMO_YARD } from '../../../drizzle/seed/demo';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { healthSchema } from '../../../src/lib/api/health';
import { hoursSchema, type Hours } from '../../../src/lib/api/hours';
import { outlookResponseSchema } from '../../../src/lib/api/outlook/response';
import { problemSchema } from '../../../src/lib/api/problem';
import { readingSchema } from '../../../src/lib/api/reading';
import { requireMembership } from '../../../src/lib/server/access/roles';
import type { SignedInUser } from '../../../src/lib/server/access/sessions';
import { composeWeb, parts } from '../../../src/lib/server/composition';
import { users } from '../../../src/lib/server/db/schema';
import { allYards } from '../../../src/lib/server/db/yards';
import { refreshForecast } from '../../../src/lib/server/forecast/refresh';
import { hoursInTwo, hoursOfYard } from '../../../src/lib/server/outlook/hours';
import { GET as health } from '../../../src/routes/api/v1/health/+server';
import { GET as openapi } from '../../../src/routes/api/v1/openapi.json/+server';
import { POST as outlook } from '../../../src/routes/api/v1/outlook/+server';
import { GET as hours } from '../../../src/routes/api/v1/yards/[slug]/hours/+server';
import { GET as reading } from '../../../src/routes/api/v1/yards/[slug]/steps/[step]/reading/+server';
import { createTestDatabase } from '../../setup/database';
import { eventOf, told } from './events';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let fake: ForecastFake;
const people = new Map<string, SignedInUser>();
const slug = DEMO_YARD.slug;

beforeAll(async () => {
	fake = await startForecastFake({
		scenario: { kind: 'story', timeZone: DEMO_YARD.timeZone, members: 2 }
	});
	database = await createTestDatabase();
	composeWeb({
		DATABASE_URL: database.url,
		ORIGIN: 'http://127.0.0.1',
		LOG_LEVEL: 'silent',
		OPEN_METEO_URL: fake.url,
		OPEN_METEO_ENSEMBLE_URL: fake.url,
		MET_NORWAY_URL: fake.url,
		FORECAST_CONTACT: 'harbour@yard.example'
	});
	const { db, config } = parts();
	await seedDemo(db, new Date());
	for (const yard of await allYards(db)) await refreshForecast({ db, config }, yard, new Date());
	for (const user of await db.select().from(users)) people.set(user.email, user);
});
afterAll(async () => {
	await parts().close();
	await database.drop();
	await fake.close();
});

const personOf = (role: keyof typeof DEMO_PEOPLE): SignedInUser => {
	const user = people.get(DEMO_PEOPLE[role].email);
	if (user === undefined) throw new Error('the demo has one person a role');
	return user;
};
const hoursOf = async (role: keyof typeof DEMO_PEOPLE) =>
	hoursSchema.parse((await told(hours(eventOf({ params: { slug }, user: personOf(role) })))).body);

describe('hours', () => {
	test('a manager sees every boat, an owner their own, a painter those assigned', async () => {
		const names = async (role: keyof typeof DEMO_PEOPLE) =>
			(await hoursOf(role)).boats.map(({ name }) => name).sort();
		expect(await names('manager')).toHaveLength(5);
		expect(await names('owner')).toEqual(['Corncrake', 'Tansy']);
		expect(await names('painter')).toEqual(['Bellwether', 'Corncrake', 'Merrow']);
	});

	test('the first screen has open, tight and shut hours and a sentence', async () => {
		const page = await hoursOf('manager');
		const states = page.boats.flatMap(({ steps }) =>
			steps.flatMap(({ runs }) => runs.map(({ state }) => state))
		);
		expect(new Set(states)).toEqual(new Set(['open', 'tight', 'shut']));
		expect(page.headline.map(({ text }) => text).join('')).toMatch(/^(Today|Tomorrow)/);
		expect(page.forecast?.stale).toBe(false);
	});

	test('every batten covers the whole axis without a gap', async () => {
		const page = await hoursOf('manager');
		for (const { runs } of page.boats.flatMap(({ steps }) => steps)) {
			expect(runs[0]?.from).toBe(0);
			expect(runs.at(-1)?.to).toBe(page.slotCount);
			runs.slice(1).forEach((run, i) => expect(run.from).toBe(runs[i].to));
		}
	});

	test('what is kept is what is computed', async () => {
		const [once, again] = [await hoursOf('manager'), await hoursOf('manager')];
		expect(again.boats).toEqual(once.boats);
	});

	test('nobody signed in is a 401, a foreign and an unknown yard are one 404', async () => {
		expect((await told(hours(eventOf({ params: { slug } })))).status).toBe(401);
		const unknown = await told(
			hours(eventOf({ params: { slug: 'nowhere' }, user: personOf('owner') }))
		);
		expect(unknown.status).toBe(404);
		expect(unknown.type).toContain('application/problem+json');
		const stranger = { ...personOf('owner'), id: '00000000-0000-4000-8000-000000000000' };
		const foreign = await told(hours(eventOf({ params: { slug }, user: stranger })));
		expect(foreign.body.detail).toBe(unknown.body.detail);
		expect(problemSchema.safeParse(foreign.body).success).toBe(true);
	});
});

describe('hours in two', () => {
	const NOW = new Date();
	const inTwo = async (role: keyof typeof DEMO_PEOPLE) => {
		const { db } = parts();
		const locals = { user: personOf(role) };
		const membership = await requireMembership(db, locals, slug);
		const { bare, hours } = await hoursInTwo(db, membership, NOW);
		return { bare, hours: await hours, whole: await hoursOfYard(db, membership, NOW) };
	};

	test('first every boat and step with its lath bare, then what the whole page says', async () => {
		const { bare, hours, whole } = await inTwo('manager');
		if (bare === null) throw new Error('there are steps to find hours of');
		expect(hours).toEqual(whole);
		expect(hoursSchema.parse(bare)).toEqual(bare);
		const steps = bare.boats.flatMap((boat) => boat.steps);
		expect(bare.headline.map(({ text }) => text).join('')).toContain(`${steps.length} steps`);
		for (const step of steps) {
			expect(step).toMatchObject({ runs: [], best: null, spoken: '' });
			expect(step.bestByDay).toEqual(bare.days.map(() => null));
		}
	});

	test('what is drawn with the bare laths is drawn again where it was', async () => {
		const { bare, hours } = await inTwo('owner');
		const still = (page: Hours | null) =>
			page && {
				days: page.days,
				nights: page.nights,
				forecast: page.forecast,
				air: page.bands.airTemperature,
				flags: page.bands.flags,
				rows: page.boats.map(({ name, stand, steps }) => [
					name,
					stand,
					steps.map((step) => [step.name, step.faces, step.shelter])
				])
			};
		expect(still(bare)).toEqual(still(hours));
	});

	test('a queue without steps comes whole', async () => {
		const { db } = parts();
		const [yard] = await allYards(db);
		const user = { ...personOf('owner'), id: '00000000-0000-4000-8000-000000000000' };
		const answer = await hoursInTwo(db, { yard, user, role: 'owner' }, NOW);
		expect(answer.bare).toBeNull();
		expect(answer.hours).toMatchObject({ boats: [], headline: [{ role: 'plain' }] });
	});
});

describe('readings', () => {
	const ask = (role: keyof typeof DEMO_PEOPLE, step: string, at: string) =>
		told(
			reading(
				eventOf({
					params: { slug, step },
					user: personOf(role),
					url: `http://127.0.0.1/?at=${encodeURIComponent(at)}`
				})
			)
		);

	test('a reading says the state its batten shows, with every limit and where it is from', async () => {
		const page = await hoursOf('manager');
		const step = page.boats[0].steps[0];
		for (const run of step.runs.slice(0, 12)) {
			const at = new Date(Date.parse(page.start) + run.from * 900_000).toISOString();
			const answer = await ask('manager', step.id, at);
			const parsed = readingSchema.parse(answer.body);
			expect(parsed.state).toBe(run.state);
			if (run.state !== 'open') expect(parsed.limiter).toBe(run.limiter);
			expect(parsed.limits.length).toBeGreaterThan(8);
		}
	});

	test('another owner’s step, no step and a malformed id are one 404', async () => {
		const all = await hoursOf('manager');
		const foreign = all.boats.find(({ name }) => name === 'Merrow')?.steps[0]?.id ?? '';
		for (const step of [foreign, '00000000-0000-4000-8000-000000000000', 'nonsense'])
			expect((await ask('owner', step, all.now)).status).toBe(404);
	});

	test('an instant that is none is a 400 that names the field', async () => {
		const step = (await hoursOf('owner')).boats[0].steps[0].id;
		const answer = await ask('owner', step, 'noon');
		expect(answer.status).toBe(400);
		expect(answer.body.errors[0].pointer).toBe('/at');
	});
});

const EXAMPLE = JSON.parse(
	readFileSync(new URL('../../fixtures/outlook-example.json', import.meta.url), 'utf8')
);
let callers = 0;
/** Asks from an address of its own, so that the limit of one test is not another's. */
const judge = (
	body: unknown,
	headers: Record<string, string> = {},
	address = `10.0.0.${++callers}`
) =>
	told(
		outlook(
			eventOf({
				method: 'POST',
				body: typeof body === 'string' ? body : JSON.stringify(body),
				headers: { 'content-type': 'application/json', ...headers },
				address
			})
		)
	);

describe('the outlook of a forecast that is sent', () => {
	test('the example is judged, every array as long as its slots', async () => {
		const { status, body } = await judge(EXAMPLE);
		expect(status).toBe(200);
		const parsed = outlookResponseSchema.parse(body);
		const { time, ...arrays } = parsed.slots;
		expect(time).toHaveLength(476);
		for (const series of Object.values(arrays)) expect(series).toHaveLength(time.length);
		expect(parsed.steps[0].state).toHaveLength(time.length);
		expect(parsed.steps[0].best?.room).toBeGreaterThan(1);
		expect(parsed.steps[0].chance).toBeNull();
	});

	test('the chain is planned three ways, each inside the recoat window of the coat before', async () => {
		const { plans, remedies } = outlookResponseSchema.parse((await judge(EXAMPLE)).body);
		for (const plan of [plans.soonest, plans.surest, plans.byDate]) {
			const [first, second] = plan?.steps ?? [];
			expect(Date.parse(second.start)).toBeGreaterThanOrEqual(Date.parse(first.earliestNext ?? ''));
			expect(Date.parse(second.start)).toBeLessThanOrEqual(Date.parse(first.latestNext ?? ''));
			expect(plan?.holdChance).toBeNull();
		}
		expect(plans.byDate?.launch).toBe('2026-05-16T10:30:00.000Z');
		expect(plans.byDate?.costOfSlip).toBe(0);
		const rain = remedies.filter(({ limiter }) => limiter === 'rain' || limiter === 'wet');
		expect(rain.some(({ shelter, gainMinutes }) => shelter === 'tent' && gainMinutes > 0)).toBe(
			true
		);
	});

	test('a logged coat is kept, and members give chances', async () => {
		const { hourly } = EXAMPLE.forecast;
		const [coat, next] = EXAMPLE.steps;
		const logged = {
			...coat,
			startAt: '2026-05-04T09:05:00Z',
			finishedAt: '2026-05-04T11:20:00+00:00'
		};
		const wetter = hourly.precipitation.map((_: number, i: number) => (i > 24 && i < 72 ? 1 : 0));
		const { steps, plans } = outlookResponseSchema.parse(
			(
				await judge({
					...EXAMPLE,
					steps: [logged, next],
					forecast: { ...EXAMPLE.forecast, members: [{}, { precipitation: wetter }] }
				})
			).body
		);
		expect(plans.soonest?.steps[0]).toMatchObject({
			start: '2026-05-04T09:05:00.000Z',
			finish: '2026-05-04T11:20:00.000Z',
			room: null
		});
		expect(new Set(steps[1].chance)).toEqual(new Set([0, 0.5, 1]));
		expect([0, 0.5, 1]).toContain(plans.surest?.holdChance);
	});

	const hourly = EXAMPLE.forecast.hourly;
	const withHourly = (changes: object): object => ({
		...EXAMPLE,
		forecast: { ...EXAMPLE.forecast, hourly: { ...hourly, ...changes } }
	});
	const BAD: [string, unknown, string][] = [
		[
			'a word for a latitude',
			{ ...EXAMPLE, site: { ...EXAMPLE.site, latitude: 'north' } },
			'/site/latitude'
		],
		['no face', { ...EXAMPLE, face: undefined }, '/face'],
		['a date for an instant', { ...EXAMPLE, launchBy: '2026-05-16' }, '/launchBy'],
		['a field of another request', { ...EXAMPLE, yard: 'samphire-hard' }, '/yard'],
		['no step', { ...EXAMPLE, steps: [] }, '/steps'],
		[
			'a step finished before it began',
			{
				...EXAMPLE,
				steps: [
					{
						...EXAMPLE.steps[0],
						startAt: '2026-05-04T09:00:00Z',
						finishedAt: '2026-05-04T08:00:00Z'
					}
				]
			},
			'/steps/0/finishedAt'
		],
		[
			'a member with an hour too few',
			{
				...EXAMPLE,
				forecast: {
					...EXAMPLE.forecast,
					members: [{ temperature: EXAMPLE.forecast.hourly.temperature.slice(1) }]
				}
			},
			'/forecast/members/0/temperature'
		],
		[
			'a zone that is none',
			{ ...EXAMPLE, site: { ...EXAMPLE.site, timeZone: 'Mars/Base' } },
			'/site/timeZone'
		],
		[
			'hours out of order',
			withHourly({ time: [hourly.time[1], hourly.time[0], ...hourly.time.slice(2)] }),
			'/forecast/hourly/time/1'
		],
		[
			'an array too short',
			withHourly({ temperature: hourly.temperature.slice(1) }),
			'/forecast/hourly/temperature'
		],
		[
			'a gale beyond nature',
			withHourly({ windSpeed: hourly.windSpeed.map(() => 468.7) }),
			'/forecast/hourly/windSpeed/0'
		],
		[
			'neither humidity nor dew point',
			withHourly({ relativeHumidity: undefined }),
			'/forecast/hourly/relativeHumidity'
		],
		[
			'a least above its most',
			{
				...EXAMPLE,
				steps: [{ ...EXAMPLE.steps[0], limits: { airTemperature: { min: 30, max: 10 } } }]
			},
			'/steps/0/limits/airTemperature'
		],
		[
			'a table that falls',
			{
				...EXAMPLE,
				steps: [
					{
						...EXAMPLE.steps[0],
						times: {
							touchDry: [
								[20, 60],
								[10, 90]
							]
						}
					}
				]
			},
			'/steps/0/times/touchDry/1/0'
		]
	];
	test.each(BAD)('%s is a 400 that points at it', async (_, body, pointer) => {
		const answer = await judge(body);
		expect(answer.status).toBe(400);
		expect(answer.type).toContain('application/problem+json');
		expect(answer.body.errors.map((it: { pointer: string }) => it.pointer)).toContain(pointer);
	});

	test('missing values shut hours and are no error', async () => {
		const { status, body } = await judge(
			withHourly({ temperature: hourly.temperature.map(() => null) })
		);
		expect(status).toBe(200);
		expect(new Set(body.steps[0].limiter)).toEqual(new Set(['noData']));
	});

	test('what is no JSON, no JSON type or too large is told as such', async () => {
		expect((await judge('{"site":')).status).toBe(400);
		expect((await judge(EXAMPLE, { 'content-type': 'text/plain' })).status).toBe(415);
		expect((await judge(`"${'x'.repeat(6_100_000)}"`)).status).toBe(413);
	});

	test('the signed-out are told to wait once they ask too often', async () => {
		const statuses: number[] = [];
		for (let i = 0; i < 31; i++) statuses.push((await judge('{}', {}, '10.9.9.9')).status);
		expect(statuses.slice(0, 30)).toEqual(Array.from({ length: 30 }, () => 400));
		expect(statuses[30]).toBe(429);
		expect((await judge('{}', {}, '10.9.9.9')).headers.get('retry-after')).toMatch(/^\d+$/);
	});
});

describe('health and description', () => {
	test('health tells database, providers and queue', async () => {
		const { status, body } = await told(health(eventOf({})));
		expect(status).toBe(200);
		expect(healthSchema.parse(body).providers[0]).toMatchObject({
			provider: 'open-meteo',
			circuitOpen: false
		});
	});

	test('every route and method under /api/v1 is described, and every reference resolves', async () => {
		const { body } = await told(openapi(eventOf({})));
		const root = new URL('../../../src/routes/api/v1/', import.meta.url);
		const files = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((name) =>
			name.endsWith('+server.ts')
		);
		expect(files.length).toBeGreaterThan(5);
		for (const file of files) {
			const path = `/${file.replace('/+server.ts', '').replaceAll(/\[(\w+)\]/g, '{$1}')}`;
			const source = readFileSync(new URL(file, root), 'utf8');
			for (const [, method] of source.matchAll(/export const (GET|POST|PUT|PATCH|DELETE)\b/g))
				expect(body.paths[path]?.[method.toLowerCase()], `${method} ${path}`).toBeDefined();
		}
		for (const [, name] of JSON.stringify(body).matchAll(
			/"\$ref":"#\/components\/schemas\/(\w+)"/g
		))
			expect(body.components.schemas[name], name).toBeDefined();
		expect(body.openapi).toMatch(/^3\.1/);
	});
});
