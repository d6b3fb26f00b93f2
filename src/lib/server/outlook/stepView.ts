import type { HoursStep, Run } from '../../api/hours';
import { LIMITERS, STATES, stretchesOf, type Limiter, type Stretch } from '../../engine';
import type { QueuedStep } from '../db/queue';
import type { Axis } from './axis';
import { cautionOf } from './cautions';
import { faceWords } from './engineInput';
import type { AxisHours } from './stepHours';

const OPEN = STATES.indexOf('open');
const SHUT = STATES.indexOf('shut');
const NO_DATA = LIMITERS.indexOf('noData');
/** What is missing where the forecast has all of a slot, yet ends before its coat is through. */
const PAST_END = 'hours after the forecast ends';

function missingAt(hours: AxisHours, slot: number): string {
	return hours.missing.find(([from, to]) => slot >= from && slot < to)?.[2] ?? PAST_END;
}

/** The axis as runs of one state, limiter and missing thing. */
export function runsOfAxis(hours: AxisHours): Run[] {
	const runs: Run[] = [];
	for (let i = 0; i < hours.state.length; i++) {
		const state = STATES[hours.state[i]];
		const limiter: Limiter = hours.state[i] === OPEN ? 'none' : LIMITERS[hours.limiter[i]];
		const missing =
			hours.limiter[i] === NO_DATA && hours.state[i] === SHUT ? missingAt(hours, i) : null;
		const last = runs[runs.length - 1];
		if (
			last !== undefined &&
			last.state === state &&
			last.limiter === limiter &&
			last.missing === missing
		)
			last.to = i + 1;
		else runs.push({ from: i, to: i + 1, state, limiter, missing });
	}
	return runs;
}

/** The best stretch of each day: of those that begin in it the one with most room. */
function bestByDay(
	hours: AxisHours,
	stretches: readonly Stretch[],
	axis: Axis
): HoursStep['bestByDay'] {
	let dayStart = 0;
	return axis.days.map((day) => {
		const from = dayStart;
		dayStart += day.slots;
		const [best] = stretches
			.filter((stretch) => stretch.from >= from && stretch.from < from + day.slots)
			.sort((a, b) => b.room - a.room);
		if (best === undefined) return null;
		const start = best.bestStart;
		const worked = hours.room.subarray(start, start + hours.durationSlots);
		const least = worked.indexOf(Math.min(...worked));
		const limiterAt = (slot: number): Limiter =>
			slot < 0 || slot >= hours.state.length || hours.state[slot] !== SHUT
				? 'none'
				: LIMITERS[hours.limiter[slot]];
		return {
			start,
			finish: start + hours.durationSlots,
			from: best.from,
			to: best.to,
			room: best.room,
			limiter: LIMITERS[hours.limiter[start + Math.max(0, least)]],
			before: limiterAt(best.from - 1),
			after: limiterAt(best.to)
		};
	});
}

/** What shuts most of a day's hours, the night and the yard's closed hours aside. */
export function shutBy(hours: AxisHours, from: number, to: number): Limiter {
	const counts = new Map<Limiter, number>();
	let closed = 0;
	for (let i = from; i < to; i++) {
		const limiter = LIMITERS[hours.limiter[i]];
		if (hours.state[i] !== SHUT) continue;
		if (limiter === 'hours' || limiter === 'dark') closed++;
		else counts.set(limiter, (counts.get(limiter) ?? 0) + 1);
	}
	const [most] = [...counts].sort((a, b) => b[1] - a[1]);
	return most?.[0] ?? (closed > 0 ? 'hours' : 'none');
}

/** What a step is, whatever its hours. */
export function stepFacts({ step, job, sheet, faces }: QueuedStep) {
	return {
		id: step.id,
		jobId: job.id,
		job: job.name,
		name: step.name,
		kind: step.kind,
		faces: faces.map(faceWords),
		shelter: step.shelter,
		durationMinutes: step.durationMinutes,
		sampleSheet: sheet?.sheet.sample ?? false,
		sheet: sheet?.name ?? null,
		caution: cautionOf(step.kind, step.method, sheet?.sheet.hazards ?? [])
	} satisfies Partial<HoursStep>;
}

/** A step of the page, its spoken text left to whoever knows the days' names. */
export function stepView(
	queued: QueuedStep,
	hours: AxisHours | null,
	axis: Axis,
	nowSlot: number
): Omit<HoursStep, 'spoken'> {
	const facts = stepFacts(queued);
	if (hours === null) {
		const missing = queued.faces.length === 0 ? 'face on this step' : 'forecast';
		return {
			...facts,
			runs: [{ from: 0, to: axis.slotCount, state: 'shut', limiter: 'noData', missing }],
			best: null,
			bestByDay: axis.days.map(() => null),
			flags: []
		};
	}
	const { stretches, best } = stretchesOf(hours, hours.durationSlots, nowSlot);
	return {
		...facts,
		runs: runsOfAxis(hours),
		best,
		bestByDay: bestByDay(hours, stretches, axis),
		flags: hours.flags
	};
}
