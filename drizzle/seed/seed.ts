import { eq, sql } from 'drizzle-orm';
import { addDays, FACE_ORIENTATIONS, localDate, type SampleName } from '../../src/lib/engine';
import { hashPassword } from '../../src/lib/server/access/passwords';
import type { Database } from '../../src/lib/server/db/client';
import {
	boatPainters,
	boats,
	faces,
	jobs,
	memberships,
	stands,
	stepFaces,
	steps,
	users,
	yards,
	type Role
} from '../../src/lib/server/db/schema';
import { COLOURS } from '../../src/lib/server/boats/hulls';
import { DEMO_BOATS, DEMO_PEOPLE, DEMO_YARD, type DemoBoat } from './demo';
import { laySamples } from '../../src/lib/server/sheets/samples';

type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];
const ROLE_NAMES = Object.keys(DEMO_PEOPLE) as (keyof typeof DEMO_PEOPLE & Role)[];

const first = <T>(rows: T[]): T => {
	const [row] = rows;
	if (row === undefined) throw new Error('The database returned no row for an insert.');
	return row;
};

async function insertPeople(tx: Transaction): Promise<Map<Role, string>> {
	const ids = new Map<Role, string>();
	for (const role of ROLE_NAMES) {
		const { email, name, password } = DEMO_PEOPLE[role];
		const [known] = await tx.select({ id: users.id }).from(users).where(eq(users.email, email));
		const id =
			known?.id ??
			first(
				await tx
					.insert(users)
					.values({ email, name, passwordHash: await hashPassword(password) })
					.returning({ id: users.id })
			).id;
		ids.set(role, id);
	}
	return ids;
}

async function insertBoat(
	tx: Transaction,
	boat: DemoBoat,
	place: { yardId: string; standId: string; ownerId: string | null; painterId: string | null },
	sheetIds: ReadonlyMap<SampleName, string>,
	now: Date,
	today: string
): Promise<void> {
	const { id: boatId } = first(
		await tx
			.insert(boats)
			.values({
				yardId: place.yardId,
				standId: place.standId,
				ownerId: place.ownerId,
				name: boat.name,
				heading: boat.heading,
				hauledOn: addDays(today, -boat.hauled),
				launchBy: addDays(today, boat.launch)
			})
			.returning({ id: boats.id })
	);
	if (place.painterId !== null)
		await tx.insert(boatPainters).values({ boatId, userId: place.painterId });
	const faceIds = await tx
		.insert(faces)
		.values(
			boat.faces.map((face) => {
				const { tilt, bearing, bothSides } = FACE_ORIENTATIONS[face.name];
				return {
					boatId,
					name: face.name,
					side: face.side,
					tilt,
					bearing: bearing === null ? null : bearing[face.side],
					bothSides,
					material: face.material,
					finish: face.finish,
					area: face.area,
					...COLOURS[face.colour]
				};
			})
		)
		.returning({ id: faces.id });
	for (const [position, job] of boat.jobs.entries()) {
		const { id: jobId } = first(
			await tx.insert(jobs).values({ boatId, name: job.name, position }).returning({ id: jobs.id })
		);
		for (const [order, step] of job.steps.entries()) {
			const { id: stepId } = first(
				await tx
					.insert(steps)
					.values({
						jobId,
						position: order,
						name: step.name,
						kind: step.kind,
						method: step.method,
						durationMinutes: step.hours * 60,
						sheetId: step.sheet === undefined ? null : (sheetIds.get(step.sheet) ?? null),
						task: step.task ?? null,
						limits: step.limits ?? {},
						shelter: step.shelter ?? 'open',
						updatedAt: now
					})
					.returning({ id: steps.id })
			);
			await tx
				.insert(stepFaces)
				.values(step.faces.map((index) => ({ stepId, faceId: faceIds[index].id })));
		}
	}
}

/** Where the demo's stands lie: rows of four. */
const spotOf = (position: number) => ({
	x: 22 + (position % 4) * 26,
	y: 62 - Math.floor(position / 4) * 22
});

async function insertYard(tx: Transaction, now: Date, today: string): Promise<void> {
	const people = await insertPeople(tx);
	const { id: yardId } = first(
		await tx
			.insert(yards)
			.values({ ...DEMO_YARD, demo: true, createdAt: now })
			.returning({ id: yards.id })
	);
	await tx
		.insert(memberships)
		.values([...people].map(([role, userId]) => ({ yardId, userId, role })));
	const sheetIds = await laySamples(tx, yardId);
	for (const [position, boat] of DEMO_BOATS.entries()) {
		const { id: standId } = first(
			await tx
				.insert(stands)
				.values({ yardId, name: boat.stand, position, ...spotOf(position) })
				.returning({ id: stands.id })
		);
		const ownerId = boat.owned ? (people.get('owner') ?? null) : null;
		const painterId = boat.painted ? (people.get('painter') ?? null) : null;
		await insertBoat(tx, boat, { yardId, standId, ownerId, painterId }, sheetIds, now, today);
	}
}

/** Whether anybody has changed a step of the demo yard since it was laid. */
async function isTouched(tx: Transaction, yardId: string, laidAt: Date): Promise<boolean> {
	const rows = await tx
		.select({ updatedAt: steps.updatedAt, state: steps.state })
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.where(eq(boats.yardId, yardId));
	return rows.some(
		({ updatedAt, state }) => state !== 'queued' || updatedAt.getTime() !== laidAt.getTime()
	);
}

/**
 * Lays the demo yard where there is no yard at all, and its dates anew relative to today while
 * nobody has touched it.
 */
export async function seedDemo(db: Database, now: Date): Promise<'laid' | 'renewed' | 'left'> {
	const today = localDate(DEMO_YARD.timeZone, Math.floor(now.getTime() / 1000));
	return db.transaction(async (tx) => {
		// Nobody laid it: the record begins with what people do.
		await tx.execute(sql`select set_config('app.unrecorded', 'yes', true)`);
		const [demo] = await tx.select().from(yards).where(eq(yards.demo, true));
		if (demo === undefined) {
			const [any] = await tx.select({ id: yards.id }).from(yards).limit(1);
			if (any !== undefined) return 'left';
			await insertYard(tx, now, today);
			return 'laid';
		}
		if (await isTouched(tx, demo.id, demo.createdAt)) return 'left';
		const rows = await tx
			.select({ id: boats.id, name: boats.name })
			.from(boats)
			.where(eq(boats.yardId, demo.id));
		for (const { id, name } of rows) {
			const plan = DEMO_BOATS.find((boat) => boat.name === name);
			if (plan === undefined) continue;
			await tx
				.update(boats)
				.set({ hauledOn: addDays(today, -plan.hauled), launchBy: addDays(today, plan.launch) })
				.where(eq(boats.id, id));
		}
		return 'renewed';
	});
}
