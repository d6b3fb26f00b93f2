import { eq, inArray } from 'drizzle-orm';
import { yardWeather, type Job, type YardWeather } from '../../engine';
import { clockInstant } from '../../time/dates';
import type { Database } from '../db/client';
import { stepRows, type QueuedStep } from '../db/queue';
import { boats, jobs, type Yard } from '../db/schema';
import { currentForecast, type CurrentForecast } from '../forecast/current';
import { faceOf, siteOf, stepOf } from '../outlook/engineInput';

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
 * When a launch date means that the boat has to be ready: at the yard's first hour of it, and
 * where the yard is closed that day at the date's first moment.
 */
export function launchInstant({ timeZone, workHours }: Yard, date: string): number {
	const weekday = new Date(`${date}T00:00:00Z`).getUTCDay() || 7;
	const first = workHours
		.filter(({ days }) => days.includes(weekday))
		.map(({ from }) => from)
		.sort()[0];
	return clockInstant(timeZone, date, first ?? '00:00');
}

/** Steps of one boat's job as the engine's job. */
export function engineJob(rows: readonly QueuedStep[], yard: Yard, launchBy: string | null): Job {
	return {
		steps: rows.map((row) => {
			const { startedAt, finishedAt, pinnedAt, shelter } = row.step;
			const begun = startedAt ?? pinnedAt;
			return {
				step: stepOf(row, yard),
				faces: row.faces.map((face) => ({
					id: face.id,
					face: faceOf(face, row.boat.heading),
					shelter
				})),
				...(begun === null ? {} : { startAt: seconds(begun) }),
				...(startedAt === null || finishedAt === null ? {} : { finishedAt: seconds(finishedAt) })
			};
		}),
		launch: {
			...(launchBy === null ? {} : { launchBy: launchInstant(yard, launchBy) }),
			...(yard.dayRate === null ? {} : { dayRate: yard.dayRate })
		}
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
