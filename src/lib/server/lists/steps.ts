import { and, desc, eq, inArray, sql } from 'drizzle-orm';
import { z } from 'zod';
import { stepsQuerySchema, type ListedStep, type StepsQuery } from '../../api/lists/steps';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, jobs, stands, stepPainters, steps, users } from '../db/schema';
import { keyOfCursor, pageOf } from '../http/list';
import { instantOfKey, instantText } from './instantKey';
import type { YardList } from './list';
import { stepsLike, stepsOfPainter } from './search';

const KEY = z.tuple([instantOfKey, z.uuid()]);

/** Jobs of boats a member may see; a manager's are all of the yard, which the yard says already. */
function visibleJobs(db: Database, membership: Membership, boat: string | undefined) {
	if (membership.role === 'manager' && boat === undefined) return undefined;
	return inArray(
		steps.jobId,
		db
			.select({ id: jobs.id })
			.from(jobs)
			.innerJoin(boats, eq(boats.id, jobs.boatId))
			.where(
				and(visibleBoats(db, membership), boat === undefined ? undefined : eq(jobs.boatId, boat))
			)
	);
}

/** A page of the steps a member may see, what changed last first. */
async function page(db: Database, membership: Membership, query: StepsQuery) {
	const key = keyOfCursor(query.cursor, KEY);
	// The page first, by one index; what stands beside its steps is then asked for them alone.
	const chosen = db
		.select({ id: steps.id })
		.from(steps)
		.where(
			and(
				eq(steps.yardId, membership.yard.id),
				visibleJobs(db, membership, query.boat),
				query.state === undefined ? undefined : eq(steps.state, query.state),
				query.kind === undefined ? undefined : eq(steps.kind, query.kind),
				await stepsOfPainter(db, membership.yard.id, query.painter),
				await stepsLike(db, membership.yard.id, query.q),
				key === null
					? undefined
					: sql`(${steps.updatedAt}, ${steps.id}) < (${key[0]}::timestamptz, ${key[1]}::uuid)`
			)
		)
		.orderBy(desc(steps.updatedAt), desc(steps.id))
		.limit(query.limit + 1);
	const ids = (await chosen).map(({ id }) => id);
	const [rows, painters] = await Promise.all([
		db
			.select({
				step: steps,
				at: instantText(steps.updatedAt),
				job: { id: jobs.id, name: jobs.name },
				boat: { id: boats.id, name: boats.name },
				stand: stands.name
			})
			.from(steps)
			.innerJoin(jobs, eq(jobs.id, steps.jobId))
			.innerJoin(boats, eq(boats.id, jobs.boatId))
			.leftJoin(stands, eq(stands.id, boats.standId))
			.where(inArray(steps.id, ids))
			.orderBy(desc(steps.updatedAt), desc(steps.id)),
		db
			.select({ step: stepPainters.stepId, id: users.id, name: users.name })
			.from(stepPainters)
			.innerJoin(users, eq(users.id, stepPainters.userId))
			.where(inArray(stepPainters.stepId, ids))
			.orderBy(users.name)
	]);
	return pageOf(
		rows,
		query,
		({ at, step }) => [at, step.id],
		({ step, job, boat, stand }): ListedStep => ({
			id: step.id,
			name: step.name,
			kind: step.kind,
			method: step.method,
			hours: step.durationMinutes / 60,
			state: step.state,
			job,
			boat,
			stand,
			painters: painters
				.filter((painter) => painter.step === step.id)
				.map(({ id, name }) => ({ id, name })),
			pinnedAt: step.pinnedAt?.toISOString() ?? null,
			startedAt: step.startedAt?.toISOString() ?? null,
			finishedAt: step.finishedAt?.toISOString() ?? null,
			updatedAt: step.updatedAt.toISOString()
		})
	);
}

export const stepList: YardList<typeof stepsQuerySchema, ListedStep> = {
	name: 'steps',
	permission: 'see',
	schema: stepsQuerySchema,
	page,
	columns: {
		boat: ({ boat }) => boat.name,
		stand: ({ stand }) => stand,
		job: ({ job }) => job.name,
		step: ({ name }) => name,
		kind: ({ kind }) => kind,
		method: ({ method }) => method,
		state: ({ state }) => state,
		'hours of work': ({ hours }) => hours,
		painters: ({ painters }) => painters.map(({ name }) => name).join('; '),
		'fixed to': ({ pinnedAt }) => pinnedAt,
		started: ({ startedAt }) => startedAt,
		finished: ({ finishedAt }) => finishedAt,
		'last changed': ({ updatedAt }) => updatedAt,
		id: ({ id }) => id
	}
};
