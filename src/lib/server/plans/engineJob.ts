import { eq, inArray } from 'drizzle-orm';
import { yardWeather, type Job, type YardWeather } from '../../engine';
import type { Database } from '../db/client';
import { stepRows, type QueuedStep } from '../db/queue';
import { boats, jobs, type Yard } from '../db/schema';
import { currentForecast, type CurrentForecast } from '../forecast/current';
import { faceOf, siteOf, stepOf } from '../outlook/engineInput';
import { launchWishOf } from '../outlook/launchWish';

/** What a job is planned in. */
export interface PlanGround {
	readonly yard: Yard;
	readonly weather: YardWeather;
	readonly current: CurrentForecast;
}

/** A yard's weather with its members; null without a forecast. */
export async function planGround(db: Database, yard: Yard, now: Date): Promise<PlanGround | null> {
	const current = await currentForecast(db, yard, now, { members: true });
	if (current === null) return null;
	const weather = yardWeather({
		site: siteOf(yard),
		forecast: current.forecast,
		looseSand: yard.looseSand,
		stale: current.source.stale
	});
	return { yard, weather, current };
}

const seconds = (date: Date): number => Math.floor(date.getTime() / 1000);

/** The steps of a job that are still to be counted with, in order; what was dropped is not. */
export async function plannedRows(db: Database, jobId: string): Promise<QueuedStep[]> {
	const rows = await stepRows(db, eq(jobs.id, jobId));
	return rows.filter(({ step }) => step.state !== 'dropped');
}

/**
 * Steps of one boat's job as the engine's job.
 *
 * @param now - the hoists' times before it are gone
 */
export function engineJob(
	rows: readonly QueuedStep[],
	yard: Yard,
	launchBy: string | null,
	now: Date
): Job {
	return {
		steps: rows.map((row) => {
			const { startedAt, finishedAt, pinnedAt, shelter } = row.step;
			const begun = startedAt ?? pinnedAt;
			return {
				step: stepOf(row, yard),
				faces: row.faces.map((face) => ({
					id: face.id,
					face: faceOf(face, row),
					shelter
				})),
				...(begun === null ? {} : { startAt: seconds(begun) }),
				...(startedAt === null || finishedAt === null ? {} : { finishedAt: seconds(finishedAt) })
			};
		}),
		launch: launchWishOf(yard, launchBy, now)
	};
}

/** The launch date of a job's boat. */
export async function launchDateOf(db: Database, jobId: string): Promise<string | null> {
	const [row] = await db
		.select({ launchBy: boats.launchBy })
		.from(boats)
		.where(inArray(boats.id, db.select({ id: jobs.boatId }).from(jobs).where(eq(jobs.id, jobId))));
	return row?.launchBy ?? null;
}
