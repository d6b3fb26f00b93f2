import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { DEMO_PEOPLE, DEMO_YARD } from '../../../drizzle/seed/demo';
import { seedDemo } from '../../../drizzle/seed/seed';
import {
	askToFound,
	finishFounding,
	foundingOf,
	slugOf,
	type YardPlace
} from '../../../src/lib/server/access/foundYard';
import {
	acceptInvitation,
	invitationOf,
	invite,
	joinWithNewAccount,
	peopleOf,
	takeBackInvitation
} from '../../../src/lib/server/access/invitations';
import { hashPassword } from '../../../src/lib/server/access/passwords';
import {
	askToReset,
	changePassphrase,
	resetPassphrase
} from '../../../src/lib/server/access/resetPassphrase';
import {
	requireMembership,
	visibleBoats,
	type Membership
} from '../../../src/lib/server/access/roles';
import { createSessions, type Sessions } from '../../../src/lib/server/access/sessions';
import { signIn } from '../../../src/lib/server/access/signIn';
import {
	accountLinks,
	boatPainters,
	boats,
	mails,
	memberships,
	sessions as sessionRows,
	users,
	yards
} from '../../../src/lib/server/db/schema';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { createDatabase } from '../../../src/lib/server/db/client';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
/** As the web process asks, held by row-level security; `database.db` looks past it. */
let web: ReturnType<typeof createDatabase>;
let sessions: Sessions;
const ORIGIN = 'https://yardglass.example';
const NOW = new Date('2026-12-01T06:00:00Z');
const PASSPHRASE = 'copper lantern under the sill';
const PLACE: YardPlace = {
	name: 'Marram Quay',
	latitude: 40.64,
	longitude: -8.74,
	elevation: 3,
	timeZone: 'Europe/Lisbon'
};

beforeAll(async () => {
	database = await createTestDatabase();
	await seedDemo(database.db, NOW);
	web = createDatabase(database.webUrl, 'required');
	sessions = createSessions(web.db, { secure: true });
});
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});
beforeEach(() => database.db.delete(mails).then(() => undefined));

/** The one letter posted since the test began, and the token of its link. */
async function letter(): Promise<{ to: string; subject: string; token: string }> {
	const posted = await database.db.select().from(mails);
	expect(posted).toHaveLength(1);
	const [{ recipient, subject, text }] = posted;
	return { to: recipient, subject, token: /\/([\w-]{32})\n/.exec(text)?.[1] ?? '' };
}

const found = (email: string, place = PLACE) =>
	askToFound(web.db, { place, email, origin: ORIGIN });
const open = async (token: string) =>
	finishFounding(web.db, token, {
		name: 'Juno Fell',
		passwordHash: await hashPassword(PASSPHRASE)
	});

async function memberOf(role: keyof typeof DEMO_PEOPLE): Promise<Membership> {
	const [user] = await database.db
		.select()
		.from(users)
		.where(eq(users.email, DEMO_PEOPLE[role].email));
	return onBehalfOf(user.id, () => requireMembership(web.db, { user }, DEMO_YARD.slug));
}

describe('founding a yard', () => {
	test('makes nothing until the mailed link is followed, then all of it once', async () => {
		await found('juno@marram.example');
		const { to, token } = await letter();
		expect(to).toBe('juno@marram.example');
		const before = await database.db.select().from(users).where(eq(users.email, to));
		expect(before).toEqual([]);
		expect(await foundingOf(web.db, token)).toEqual({ yard: 'Marram Quay', email: to });
		const [{ payload }] = await database.db.select().from(accountLinks);
		expect(Object.keys(payload as object).sort()).toEqual(['email', 'place']);
		const done = await open(token);
		expect(done?.slug).toBe('marram-quay');
		expect(await open(token)).toBeNull();
		const [yard] = await database.db.select().from(yards).where(eq(yards.slug, 'marram-quay'));
		expect(yard).toMatchObject({ name: 'Marram Quay', timeZone: 'Europe/Lisbon', demo: false });
		expect(await signIn(web.db, { email: to, password: PASSPHRASE }, '192.0.2.50')).toEqual({
			outcome: 'signedIn',
			userId: done?.userId
		});
	});

	test('an address that has an account gets a letter that says so, and no link to a yard', async () => {
		await found(DEMO_PEOPLE.owner.email);
		const posted = await letter();
		expect(posted.subject).toContain('already');
		expect(posted.token).toBe('');
	});

	test('a second yard of the same name gets an address of its own', async () => {
		await found('ada@marram.example');
		const { token } = await letter();
		expect((await open(token))?.slug).toBe('marram-quay-2');
	});

	test('names become plain parts of addresses, never a page of the product', async () => {
		expect(slugOf('  Éire’s Slip & Co. ')).toBe('eire-s-slip-co');
		expect(slugOf('造船所')).toBe('yard');
		await found('new@marram.example', { ...PLACE, name: 'New' });
		const { token } = await letter();
		expect((await open(token))?.slug).toBe('new-2');
	});
});

describe('a forgotten passphrase', () => {
	test('is set anew by a mailed link, once, and every session ends', async () => {
		const { email } = DEMO_PEOPLE.painter;
		const [{ id }] = await database.db.select().from(users).where(eq(users.email, email));
		await sessions.create(id);
		await askToReset(web.db, email, ORIGIN);
		const { token: earlier } = await letter();
		await database.db.delete(mails);
		await askToReset(web.db, email, ORIGIN);
		const { token } = await letter();
		expect(await resetPassphrase(web.db, sessions, token, PASSPHRASE)).toBe(id);
		expect(await resetPassphrase(web.db, sessions, earlier, 'another')).toBeNull();
		expect(await resetPassphrase(web.db, sessions, token, 'again')).toBeNull();
		const left = await database.db.select().from(sessionRows).where(eq(sessionRows.userId, id));
		expect(left).toEqual([]);
		const result = await signIn(web.db, { email, password: PASSPHRASE }, '192.0.2.51');
		expect(result.outcome).toBe('signedIn');
	});

	test('an address without an account gets no letter', async () => {
		await askToReset(web.db, 'nobody@marram.example', ORIGIN);
		expect(await database.db.select().from(mails)).toEqual([]);
	});

	test('a made-up token opens nothing', async () => {
		expect(await resetPassphrase(web.db, sessions, 'x'.repeat(32), 'y')).toBeNull();
	});

	test('a known one is changed only with the old one', async () => {
		const [{ id }] = await database.db
			.select()
			.from(users)
			.where(eq(users.email, DEMO_PEOPLE.owner.email));
		const change = (current: string) =>
			onBehalfOf(id, () => changePassphrase(web.db, sessions, id, { current, next: PASSPHRASE }));
		expect(await change('wrong')).toBe('wrong');
		expect(await change(DEMO_PEOPLE.owner.password)).toBe('right');
		expect(await change(PASSPHRASE)).toBe('right');
		const guesses = await Promise.all(Array.from({ length: 20 }, () => change('a guess')));
		expect(guesses.filter((it) => it === 'wrong')).toHaveLength(8);
		expect(await change(PASSPHRASE)).toMatchObject({ outcome: 'paused' });
	});
});

describe('invitations', () => {
	const ask = async (
		by: Membership,
		email: string,
		role: 'manager' | 'painter' | 'owner',
		boatId: string | null = null
	) => onBehalfOf(by.user.id, () => invite(web.db, by, { email, role, boatId }, ORIGIN));

	test('a manager asks an owner, who joins with a new account', async () => {
		const manager = await memberOf('manager');
		expect(await ask(manager, 'lark@samphire.example', 'owner')).toEqual({ outcome: 'invited' });
		const { token } = await letter();
		expect(await invitationOf(web.db, token)).toMatchObject({
			email: 'lark@samphire.example',
			role: 'owner',
			hasAccount: false
		});
		const userId = await joinWithNewAccount(web.db, token, {
			name: 'Lark',
			passwordHash: 'x'
		});
		const [member] = await database.db
			.select()
			.from(memberships)
			.where(eq(memberships.userId, userId ?? ''));
		expect(member).toMatchObject({ yardId: manager.yard.id, role: 'owner' });
		expect(await invitationOf(web.db, token)).toBeNull();
		expect(await ask(manager, 'lark@samphire.example', 'painter')).toEqual({ outcome: 'belongs' });
	});

	test('an owner asks a painter for a boat of their own, and nobody else', async () => {
		const owner = await memberOf('owner');
		const all = await database.db.select().from(boats).where(eq(boats.yardId, owner.yard.id));
		const [own] = await database.db.select().from(boats).where(visibleBoats(database.db, owner));
		const foreign = all.find(({ ownerId }) => ownerId !== owner.user.id);
		for (const [role, boat] of [
			['manager', own.id],
			['owner', null],
			['painter', null],
			['painter', foreign?.id ?? '']
		] as const)
			expect((await ask(owner, 'sol@samphire.example', role, boat)).outcome).toBe('notAllowed');
		expect(await database.db.select().from(mails)).toEqual([]);
		expect(await ask(owner, 'sol@samphire.example', 'painter', own.id)).toEqual({
			outcome: 'invited'
		});
		const { token } = await letter();
		const userId = await joinWithNewAccount(web.db, token, { name: 'Sol', passwordHash: 'x' });
		const works = await database.db
			.select()
			.from(boatPainters)
			.where(and(eq(boatPainters.userId, userId ?? ''), eq(boatPainters.boatId, own.id)));
		expect(works).toHaveLength(1);
	});

	test('a painter asks nobody', async () => {
		const painter = await memberOf('painter');
		expect((await ask(painter, 'a@b.example', 'painter')).outcome).toBe('notAllowed');
	});

	test('a link is for the address it was sent to, and stays for it', async () => {
		const manager = await memberOf('manager');
		await ask(manager, 'juno@marram.example', 'painter');
		const { token } = await letter();
		expect((await invitationOf(web.db, token))?.hasAccount).toBe(true);
		const [juno] = await database.db
			.select()
			.from(users)
			.where(eq(users.email, 'juno@marram.example'));
		expect(await acceptInvitation(web.db, token, { id: juno.id, email: 'other@x.example' })).toBe(
			false
		);
		expect(await acceptInvitation(web.db, token, juno)).toBe(true);
		expect(await acceptInvitation(web.db, token, juno)).toBe(false);
	});

	test('asking again takes the earlier link back, and a manager can take back any', async () => {
		const manager = await memberOf('manager');
		await ask(manager, 'mica@samphire.example', 'painter');
		const first = await letter();
		await database.db.delete(mails);
		await ask(manager, 'mica@samphire.example', 'owner');
		const second = await letter();
		expect(await invitationOf(web.db, first.token)).toBeNull();
		const { asked } = await onBehalfOf(manager.user.id, () => peopleOf(web.db, manager));
		const mine = asked.find(({ email }) => email === 'mica@samphire.example');
		await onBehalfOf(manager.user.id, () => takeBackInvitation(web.db, manager, mine?.id ?? ''));
		expect(await invitationOf(web.db, second.token)).toBeNull();
	});
});

describe('devices', () => {
	test('are listed with this one marked, and one can be ended', async () => {
		const [{ id }] = await database.db
			.select()
			.from(users)
			.where(eq(users.email, DEMO_PEOPLE.manager.email));
		const here = await sessions.create(id, 'Mozilla/5.0 (X11; Linux) Chrome/156.0');
		await sessions.create(id, 'Mozilla/5.0 (iPhone) Safari/605');
		const devices = await sessions.devicesOf(id, here.value);
		expect(devices.map(({ isThis }) => isThis).sort()).toEqual([false, true]);
		const other = devices.find(({ isThis }) => !isThis);
		await sessions.endDevice('00000000-0000-4000-8000-000000000000', other?.id ?? '');
		expect(await sessions.devicesOf(id, here.value)).toHaveLength(2);
		await sessions.endDevice(id, other?.id ?? '');
		expect(await sessions.devicesOf(id, here.value)).toHaveLength(1);
	});

	test('all others can be ended at once, and nobody else’s', async () => {
		const idOf = async (role: 'manager' | 'painter') =>
			(await database.db.select().from(users).where(eq(users.email, DEMO_PEOPLE[role].email)))[0]
				.id;
		const [id, neighbour] = [await idOf('manager'), await idOf('painter')];
		const here = await sessions.create(id);
		await sessions.create(id);
		const theirs = await sessions.create(neighbour);
		await sessions.endOthers(id, here.value);
		const left = await sessions.devicesOf(id, here.value);
		expect(left.map(({ isThis }) => isThis)).toEqual([true]);
		expect((await sessions.validate(theirs.value)).user?.id).toBe(neighbour);
	});

	test('sign in again after ninety days, however often they came', async () => {
		const [{ id }] = await database.db
			.select()
			.from(users)
			.where(eq(users.email, DEMO_PEOPLE.manager.email));
		const cookie = await sessions.create(id);
		const old = new Date(Date.now() - 91 * 86_400_000);
		await database.db.update(sessionRows).set({ createdAt: old }).where(eq(sessionRows.userId, id));
		expect((await sessions.validate(cookie.value)).user).toBeNull();
		expect((await sessions.validate(cookie.value)).session).toBeNull();
	});
});
