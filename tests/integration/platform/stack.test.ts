import { existsSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { freePort, isFree } from '../../../drizzle/server/ports.mjs';
import { healthSchema } from '../../../src/lib/api/health';
import {
	databaseOf,
	endForSure,
	familyOf,
	isThere,
	startNode,
	until,
	type Started
} from './processes';
import { newDataFolder } from './dataFolder';

const START = ['fakes/local-stack/start.mjs'];
/** Database, demo yard, fakes, web, worker and a first forecast; a build where there is none. */
const READY_MS = 110_000;

let dataFolder: string;
let port: number;
let stack: Started;

const start = (environment: Record<string, string>) => startNode(START, environment);
const lines = () => stack.out().trim().split('\n');
const origin = () => `http://127.0.0.1:${port}`;

beforeAll(async () => {
	dataFolder = newDataFolder();
	port = await freePort();
	stack = start({ PORT: String(port), DATA_DIR: dataFolder });
	await until(
		() => /^READY /m.test(stack.out()) || !stack.lives(),
		READY_MS,
		() => stack.out() + stack.err()
	);
	expect(stack.lives(), stack.err()).toBe(true);
}, READY_MS + 10_000);

afterAll(async () => {
	await endForSure(stack);
	rmSync(dataFolder, { recursive: true, force: true });
});

test('it ends with one account a role and the address on the port asked for', async () => {
	expect(lines().slice(-4)).toEqual([
		expect.stringMatching(/^demo owner \S+@\S+ \S+$/),
		expect.stringMatching(/^demo painter \S+@\S+ \S+$/),
		expect.stringMatching(/^demo manager \S+@\S+ \S+$/),
		`READY ${origin()}`
	]);
	const [, , email, password] = lines().at(-4)?.split(' ') ?? [];
	const answer = await fetch(`${origin()}/sign-in`, {
		method: 'POST',
		redirect: 'manual',
		headers: { origin: origin(), accept: 'text/html' },
		body: new URLSearchParams({ email, password })
	});
	expect(answer.status).toBe(303);
	expect(answer.headers.get('location')).toMatch(/^\/[a-z-]+$/);
});

test('its health is up: database, a provider and the worker', async () => {
	let last: unknown = null;
	await until(
		async () => {
			const answer = await fetch(`${origin()}/api/v1/health`);
			expect(answer.status).toBe(200);
			last = await answer.json();
			return healthSchema.parse(last).status === 'ok';
		},
		20_000,
		() => JSON.stringify(last)
	);
	expect(healthSchema.parse(last)).toMatchObject({ database: 'ok' });
});

test('a second one on the same data folder is refused, and the first runs on', async () => {
	const second = start({ PORT: String(await freePort()), DATA_DIR: dataFolder });
	expect(await second.ended).toBe(1);
	expect(second.err()).toContain(`Another Yardglass runs on ${dataFolder}`);
	expect((await fetch(`${origin()}/api/v1/health`)).status).toBe(200);
});

test('a port in use is refused by its number', async () => {
	const folder = newDataFolder();
	try {
		const second = start({ PORT: String(port), DATA_DIR: folder });
		expect(await second.ended).toBe(1);
		expect(second.err()).toContain(`Port ${port} is in use`);
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
});

// Last: what it needs running is then gone.
test('SIGTERM stops all it started, frees its port and leaves the data', async () => {
	const database = databaseOf(dataFolder);
	if (database === null) throw new Error('the database runs');
	// The database is nobody's child: it was handed over to the machine.
	const started = [...familyOf(stack.pid), ...familyOf(database)];
	expect(started.length).toBeGreaterThan(6);
	stack.signal('SIGTERM');
	expect(await stack.ended).toBe(0);
	expect(started.filter(isThere)).toEqual([]);
	expect(await isFree(port)).toBe(true);
	expect(databaseOf(dataFolder)).toBeNull();
	expect(existsSync(join(dataFolder, 'stack.lock'))).toBe(false);
	expect(existsSync(join(dataFolder, 'postgres'))).toBe(true);
}, 40_000);
