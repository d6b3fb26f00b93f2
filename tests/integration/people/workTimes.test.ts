import { afterAll, beforeAll, expect, test } from 'vitest';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import {
	absencesAhead,
	addAbsence,
	personWithTimes,
	removeAbsence,
	setWorkHours
} from '../../../src/lib/server/people/workTimes';
import { absenceSchema } from '../../../src/lib/api/workTimes';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;
let manager: Membership;
let painter: Membership;
beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	const as = (role: 'manager' | 'painter') =>
		requireMembership(database.db, { user: two.people[role] }, two.own.slug);
	[manager, painter] = await Promise.all([as('manager'), as('painter')]);
});
afterAll(() => database.drop());

test('everybody says their own times, a manager everybody’s of the yard, nobody a stranger’s', async () => {
	const { db } = database;
	expect((await personWithTimes(db, painter, painter.user.id))?.name).toBe(painter.user.name);
	expect(await personWithTimes(db, painter, manager.user.id)).toBeNull();
	expect((await personWithTimes(db, manager, painter.user.id))?.id).toBe(painter.user.id);
	expect(await personWithTimes(db, manager, two.other.manager.id)).toBeNull();
});

test('hours are the yard’s until others are said, and again when they are taken back', async () => {
	const { db } = database;
	const hours = [{ days: [1], from: '09:00', to: '12:00' }];
	const kept = async () => (await personWithTimes(db, painter, painter.user.id))?.workHours;
	expect(await kept()).toBeNull();
	await setWorkHours(db, painter.yard.id, painter.user.id, hours);
	expect(await kept()).toEqual(hours);
	expect((await personWithTimes(db, manager, manager.user.id))?.workHours).toBeNull();
	await setWorkHours(db, painter.yard.id, painter.user.id, null);
	expect(await kept()).toBeNull();
});

test('days away are listed while they are not over, and only their own person’s are removed', async () => {
	const { db } = database;
	const { id } = painter.user;
	const yardId = painter.yard.id;
	await addAbsence(db, yardId, id, { from: '2020-01-01', to: '2020-01-05', note: '' });
	await addAbsence(db, yardId, id, { from: '2099-05-04', to: '2099-05-08', note: 'the sea' });
	const [away, ...others] = await absencesAhead(db, yardId, id);
	expect(others).toEqual([]);
	expect(away).toMatchObject({ from: '2099-05-04', to: '2099-05-08', note: 'the sea' });
	expect(await removeAbsence(db, yardId, manager.user.id, away.id)).toBe(false);
	expect(await removeAbsence(db, yardId, id, away.id)).toBe(true);
	expect(await absencesAhead(db, yardId, id)).toEqual([]);
});

test('days that run backwards, or are none, are told at their field', () => {
	const wrong = (from: string, to: string) =>
		absenceSchema.safeParse({ from, to, note: '' }).error?.issues[0];
	expect(wrong('2026-05-08', '2026-05-04')).toMatchObject({
		path: ['to'],
		message: 'The last day comes before the first.'
	});
	expect(wrong('25.5.2026', '2026-05-26')?.path).toEqual(['from']);
	expect(wrong('2026-02-30', '2026-03-01')?.path).toEqual(['from']);
});
