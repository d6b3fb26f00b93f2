import { and, asc, count, eq, inArray } from 'drizzle-orm';
import type { BoatDocument, BoatPatch } from '../../api/boat';
import { mayDo, visibleBoats, type Membership } from '../access/roles';
import { changeRow, type ChangeResult } from '../db/changeRow';
import type { Database } from '../db/client';
import { boatPainters, boats, faces, jobs, memberships, steps, users } from '../db/schema';
import { standTrouble } from '../ground/moveBoat';
import { faceDocument } from './editFace';

/** Changing a boat. The caller has made sure that the member may change boats at all. */

export type BoatResult =
	| ChangeResult
	/** `field` names what is wrong. */
	| { readonly outcome: 'refused'; readonly field: keyof BoatPatch | null; readonly why: string }
	| { readonly outcome: 'asks'; readonly why: string };

const refused = (field: keyof BoatPatch | null, why: string): BoatResult => ({
	outcome: 'refused',
	field,
	why
});

/** A boat a member may see, whole; null otherwise. */
export async function boatDocument(
	db: Database,
	membership: Membership,
	id: string
): Promise<BoatDocument | null> {
	const [boat] = await db
		.select()
		.from(boats)
		.where(and(eq(boats.id, id), visibleBoats(db, membership)));
	if (boat === undefined) return null;
	const painters = await db
		.select({ userId: boatPainters.userId })
		.from(boatPainters)
		.where(eq(boatPainters.boatId, id));
	const ofBoat = await db
		.select()
		.from(faces)
		.where(eq(faces.boatId, id))
		.orderBy(asc(faces.name), asc(faces.side));
	const { name, ownerId, hauledOn, launchBy, standId, heading, revision } = boat;
	return {
		...{ id, name, ownerId, hauledOn, launchBy, standId, heading, revision },
		painterIds: painters.map(({ userId }) => userId),
		faces: ofBoat.map(faceDocument)
	};
}

/** People of a yard with a role, by name. */
export function peopleWithRole(db: Database, { yard }: Membership, role: 'owner' | 'painter') {
	return db
		.select({ id: users.id, name: users.name })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(and(eq(memberships.yardId, yard.id), eq(memberships.role, role)))
		.orderBy(asc(users.name));
}

/** Changes a boat as its reader saw it; all of it or nothing. */
export async function changeBoat(
	db: Database,
	membership: Membership,
	id: string,
	{ revision, painterIds, ...values }: BoatPatch
): Promise<BoatResult> {
	const boat = await boatDocument(db, membership, id);
	if (boat === null) return { outcome: 'gone' };
	const { standId, heading } = values;
	const moves =
		(standId !== undefined && standId !== boat.standId) ||
		(heading !== undefined && heading !== boat.heading);
	const isManager = mayDo(membership.role, 'changeYard');
	if (!isManager && moves)
		return refused('standId', 'The yard’s managers say where a boat stands and how it heads.');
	if (standId && standId !== boat.standId) {
		const why = await standTrouble(db, membership, id, standId);
		if (why !== null) return refused('standId', why);
	}
	if (!isManager && values.ownerId !== undefined && values.ownerId !== boat.ownerId)
		return refused('ownerId', 'The yard’s managers say whose a boat is.');
	if (values.ownerId !== undefined && values.ownerId !== null && values.ownerId !== boat.ownerId) {
		const owners = await peopleWithRole(db, membership, 'owner');
		if (!owners.some((owner) => owner.id === values.ownerId))
			return refused('ownerId', 'That person is no owner of this yard.');
	}
	const [hauled, launch] = [values.hauledOn ?? boat.hauledOn, values.launchBy ?? boat.launchBy];
	if (hauled !== null && launch !== null && values.launchBy !== null && launch < hauled)
		return refused('launchBy', `The launch lies before the day it was hauled, ${hauled}.`);
	if (painterIds !== undefined) {
		const painters = new Set((await peopleWithRole(db, membership, 'painter')).map((it) => it.id));
		const strange = painterIds.some((it) => !painters.has(it) && !boat.painterIds.includes(it));
		if (strange) return refused('painterIds', 'That person is no painter of this yard.');
	}
	return db.transaction(async (tx) => {
		const result = await changeRow(tx, boats, id, revision, {
			name: boat.name,
			...values,
			...(heading === undefined ? {} : { heading: heading % 360 })
		});
		if (result.outcome !== 'changed') return result;
		if (painterIds !== undefined) {
			const gone = boat.painterIds.filter((it) => !painterIds.includes(it));
			const come = painterIds.filter((it) => !boat.painterIds.includes(it));
			if (gone.length > 0)
				await tx
					.delete(boatPainters)
					.where(and(eq(boatPainters.boatId, id), inArray(boatPainters.userId, gone)));
			if (come.length > 0)
				await tx
					.insert(boatPainters)
					.values(come.map((userId) => ({ boatId: id, userId })))
					.onConflictDoNothing();
		}
		return result;
	});
}

/**
 * Takes a boat away with its faces, jobs and stays. Unless that is settled, the question comes back
 * instead, naming what goes.
 */
export async function removeBoat(
	db: Database,
	membership: Membership,
	id: string,
	revision: number,
	settled: boolean
): Promise<BoatResult> {
	const boat = await boatDocument(db, membership, id);
	if (boat === null) return { outcome: 'gone' };
	const [{ steps: laid }] = await db
		.select({ steps: count() })
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.where(eq(jobs.boatId, id));
	if (!settled)
		return {
			outcome: 'asks',
			why: `With ${boat.name} go its faces, where it stood, and ${laid === 0 ? 'no steps' : laid === 1 ? 'one step' : `${laid} steps`} of its jobs with their logs. This cannot be undone.`
		};
	return db.transaction(async (tx) => {
		const seen = await changeRow(tx, boats, id, revision, { name: boat.name });
		if (seen.outcome === 'changed') await tx.delete(boats).where(eq(boats.id, id));
		return seen;
	});
}
