import { and, asc, eq, ne } from 'drizzle-orm';
import type { JobStepView, JobView } from '../../api/jobs';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { stepRows, type QueuedStep } from '../db/queue';
import { boats, jobs, jobWaits, stands } from '../db/schema';
import type { Writer } from '../mail/outbox';
import { cautionOf } from '../outlook/cautions';
import { faceWords } from '../outlook/engineInput';

const isoOrNull = (date: Date | null): string | null => date?.toISOString() ?? null;

/** A step as it is told. */
export function stepView({ step, sheet, faces, painters }: QueuedStep): JobStepView {
	return {
		id: step.id,
		revision: step.revision,
		name: step.name,
		kind: step.kind,
		method: step.method,
		hours: step.durationMinutes / 60,
		state: step.state,
		sheet:
			sheet === null
				? null
				: { id: sheet.id, name: sheet.name, version: sheet.version, sample: sheet.sheet.sample },
		task: step.task,
		shelter: step.shelter,
		faces: faces.map((face) => ({ id: face.id, name: faceWords(face) })),
		painters: painters.map(({ id, name }) => ({ id, name })),
		pinnedAt: isoOrNull(step.pinnedAt),
		startedAt: isoOrNull(step.startedAt),
		finishedAt: isoOrNull(step.finishedAt),
		caution: cautionOf(step.kind, step.method, sheet?.sheet.hazards ?? [])
	};
}

/** A job whose boat a member may see, with its boat; null otherwise. */
export async function visibleJob(db: Database | Writer, membership: Membership, id: string) {
	const [row] = await db
		.select({
			job: jobs,
			boat: { id: boats.id, name: boats.name, stand: stands.name, launchBy: boats.launchBy }
		})
		.from(jobs)
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.leftJoin(stands, eq(stands.id, boats.standId))
		.where(and(eq(jobs.id, id), visibleBoats(db as Database, membership)));
	return row ?? null;
}

/** A job with its steps, in order, what was dropped too; null where it is not theirs to see. */
export async function jobView(
	db: Database,
	membership: Membership,
	id: string
): Promise<JobView | null> {
	const found = await visibleJob(db, membership, id);
	if (found === null) return null;
	const [waitsFor, rows] = await Promise.all([
		db
			.select({ id: jobs.id, name: jobs.name })
			.from(jobWaits)
			.innerJoin(jobs, eq(jobs.id, jobWaits.afterId))
			.where(eq(jobWaits.jobId, id))
			.orderBy(asc(jobs.position)),
		stepRows(db, eq(jobs.id, id))
	]);
	const { job, boat } = found;
	return {
		id: job.id,
		revision: job.revision,
		name: job.name,
		boat,
		waitsFor,
		steps: rows.map(stepView)
	};
}

/** The other jobs of a job's boat, in order: what it may wait for. */
export function jobsBeside(db: Database, boatId: string, jobId: string) {
	return db
		.select({ id: jobs.id, name: jobs.name })
		.from(jobs)
		.where(and(eq(jobs.boatId, boatId), ne(jobs.id, jobId)))
		.orderBy(asc(jobs.position));
}

/** The jobs of a boat by name, in order. */
export function jobNames(db: Database, boatId: string) {
	return db
		.select({ id: jobs.id, name: jobs.name, revision: jobs.revision })
		.from(jobs)
		.where(eq(jobs.boatId, boatId))
		.orderBy(asc(jobs.position));
}
