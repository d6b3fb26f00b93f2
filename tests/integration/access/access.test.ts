import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_PEOPLE } from '../../../drizzle/seed/demo';
import { seedDemo } from '../../../drizzle/seed/seed';
import { createSessions, type Sessions } from '../../../src/lib/server/access/sessions';
import { signIn } from '../../../src/lib/server/access/signIn';
import { boats, sessions as sessionRows, steps, users } from '../../../src/lib/server/db/schema';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let sessions: Sessions;
let ownerId = '';
const NOW = new Date('2026-12-01T06:00:00Z');

beforeAll(async () => {
	database = await createTestDatabase();
	expect(await seedDemo(database.db, NOW)).toBe('laid');
	sessions = createSessions(database.db, { secure: true });
	const [owner] = await database.db
		.select()
		.from(users)
		.where(eq(users.email, DEMO_PEOPLE.owner.email));
	ownerId = owner.id;
});
afterAll(() => database.drop());

const { email, password } = DEMO_PEOPLE.owner;
const attempt = (given: { email: string; password: string }, address = '192.0.2.1') =>
	signIn(database.db, given, address);

describe('signing in', () => {
	test('the right passphrase gives the person', async () => {
		expect(await attempt({ email, password })).toEqual({ outcome: 'signedIn', userId: ownerId });
	});

	test('a wrong passphrase and an unknown e-mail get one answer', async () => {
		const wrong = await attempt({ email, password: 'not it' });
		const unknown = await attempt({ email: 'nobody@samphire.example', password });
		expect(wrong).toEqual({ outcome: 'refused' });
		expect(unknown).toEqual(wrong);
	});

	test('after eight failures of an e-mail even the right passphrase waits, known or not', async () => {
		for (const victim of [DEMO_PEOPLE.painter.email, 'ghost@samphire.example']) {
			for (let i = 0; i < 8; i++)
				await attempt({ email: victim, password: 'no' }, `192.0.2.${i + 10}`);
			const next = await attempt(
				{ email: victim, password: DEMO_PEOPLE.painter.password },
				'192.0.2.99'
			);
			expect(next).toEqual({ outcome: 'paused', minutes: 15 });
		}
	});
});

describe('sessions', () => {
	test('the table holds a hash of what the cookie holds', async () => {
		const cookie = await sessions.create(ownerId);
		const rows = await database.db.select().from(sessionRows);
		expect(rows.some(({ id }) => id === cookie.value)).toBe(false);
		expect(rows.every(({ id }) => /^[0-9a-f]{64}$/.test(id))).toBe(true);
		expect(cookie.attributes).toMatchObject({ httpOnly: true, sameSite: 'lax', secure: true });
	});

	test('a token is its person until it is ended, and a made-up one is nobody', async () => {
		const { value } = await sessions.create(ownerId);
		expect((await sessions.validate(value)).user?.email).toBe(email);
		await sessions.end(value);
		expect((await sessions.validate(value)).user).toBeNull();
		expect((await sessions.validate('made-up')).user).toBeNull();
	});

	test('a session past its end is nobody’s', async () => {
		const { value } = await sessions.create(ownerId);
		await database.db.update(sessionRows).set({ expiresAt: new Date(Date.now() - 1000) });
		expect((await sessions.validate(value)).user).toBeNull();
	});
});

describe('the demo yard', () => {
	test('its dates move with today while nobody has touched it', async () => {
		const launch = async () =>
			(await database.db.select().from(boats).where(eq(boats.name, 'Bellwether')))[0]?.launchBy;
		expect(await launch()).toBe('2026-12-07');
		expect(await seedDemo(database.db, new Date('2026-12-09T06:00:00Z'))).toBe('renewed');
		expect(await launch()).toBe('2026-12-15');
	});

	test('once a step is touched it is left as it is', async () => {
		await database.db.update(steps).set({ state: 'done' }).where(eq(steps.name, 'wet sand'));
		expect(await seedDemo(database.db, new Date('2026-12-20T06:00:00Z'))).toBe('left');
	});
});
