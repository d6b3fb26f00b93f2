import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { composeWeb, parts } from '../../../src/lib/server/composition';
import { ROUTE_SCOPES } from '../../../src/lib/server/access/scopes';
import { ROLES } from '../../../src/lib/server/db/schema';
import { layFileOfEach } from '../../fixtures/boatFiles';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';
import { ROUTES, STATIC_PAGES, type Row } from './routeTable';
import { everyDoor, knock, staticPages, type Door } from './walk';

const DOORS = await everyDoor();
const NONE: Row = {
	signedOut: 'not found',
	own: { manager: 'not found', painter: 'not found', owner: 'not found' },
	otherYard: null,
	otherBoat: null
};
const rowOf = (door: Door): Row => ROUTES[door.name] ?? NONE;

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let fake: ForecastFake;
let yards: TwoYards;
let folder: string;
/** A file of each boat. */
let fileOf: ReadonlyMap<string, string>;

beforeAll(async () => {
	fake = await startForecastFake({ scenario: { kind: 'story', members: 2 } });
	database = await createTestDatabase();
	folder = await mkdtemp(join(tmpdir(), 'yardglass-files-'));
	const settings = {
		FILES_FOLDER: folder,
		DATABASE_URL: database.webUrl,
		ORIGIN: 'http://127.0.0.1',
		LOG_LEVEL: 'silent',
		OPEN_METEO_URL: fake.url,
		OPEN_METEO_ENSEMBLE_URL: fake.url,
		MET_NORWAY_URL: fake.url,
		FORECAST_CONTACT: 'harbour@yard.example'
	};
	composeWeb(settings, 'required');
	yards = await layTwoYards(database.db);
});
// A door may have deleted it.
beforeEach(async () => {
	fileOf = await layFileOfEach(database.db, parts().storage, yards.boatOf.values());
});
afterAll(async () => {
	await parts().close();
	await rm(folder, { recursive: true });
	await database.drop();
	await fake.close();
});

/** Names both of them in an address: `yard` on a page, `slug` in the API. */
const at = (slug: string, step: string) => ({
	yard: slug,
	slug,
	step,
	boat: yards.boatOf.get(step) ?? '',
	file: fileOf.get(yards.boatOf.get(step) ?? '') ?? '',
	size: 'original',
	job: yards.jobOf.get(step) ?? '',
	token: 'x'.repeat(32)
});

test('every load, action and method is in the table, and the table holds no other', () => {
	expect(DOORS.map(({ name }) => name).sort()).toEqual(Object.keys(ROUTES).sort());
	expect(staticPages().sort()).toEqual([...STATIC_PAGES].sort());
});

test('every method of the API says what a token must hold there', () => {
	const methods = DOORS.map(({ name }) => name).filter((name) => / \/api\//.test(name));
	expect(Object.keys(ROUTE_SCOPES).sort()).toEqual(methods.sort());
});

test('a row says something of another yard where its address names one, and of a boat likewise', () => {
	for (const door of DOORS) {
		const { otherYard, otherBoat } = rowOf(door);
		expect(otherYard !== null, door.name).toBe(/\[(yard|slug)\]/.test(door.route));
		expect(otherBoat !== null, door.name).toBe(/\[(step|boat|file|job)\]/.test(door.route));
	}
});

describe.each(DOORS)('$name', (door) => {
	const row = rowOf(door);

	test('signed out', async () => {
		const { own, other } = yards;
		expect(await knock(door, row, at(own.slug, own.step), null)).toBe(row.signedOut);
		expect(await knock(door, row, at(other.slug, other.step), null)).toBe(row.signedOut);
	});

	test.each(ROLES)('%s', async (role) => {
		const { own, people } = yards;
		expect(await knock(door, row, at(own.slug, own.step), people[role])).toBe(row.own[role]);
	});

	if (row.otherYard !== null)
		test.each(ROLES)('%s, in another yard', async (role) => {
			const { own, other, people } = yards;
			const answer = row.otherYard;
			expect(await knock(door, row, at(other.slug, other.step), people[role])).toBe(answer);
			// What belongs to one's own yard is not reached through another's address, nor the reverse.
			expect(await knock(door, row, at(other.slug, own.step), people[role])).toBe(answer);
			if (row.otherBoat !== null)
				expect(await knock(door, row, at(own.slug, other.step), people[role])).toBe('not found');
		});

	if (row.otherBoat !== null)
		test.each(ROLES)('%s, another owner’s boat', async (role) => {
			const { own, people } = yards;
			const answer = await knock(door, row, at(own.slug, own.stepOfAnother), people[role]);
			expect(answer).toBe(row.otherBoat?.[role]);
		});
});
