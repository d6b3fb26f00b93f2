import { reachedAt } from './clocks';
import { launchReadyAfter } from './launchReady';
import { overcoatTable } from './links';
import { isCoat, type PlanStep } from './planStep';

/** The clock asked backwards and forwards, all in slot positions. */
type Asked = Pick<PlanStep, 'step' | 'faces' | 'duration'>;

/**
 * When the next coat may start after a step done at a place: earliest on the slowest spot, latest
 * on the fastest, on both strokes, for a next step as long as this one. +Infinity: no limit on the
 * sheet, or not within what the forecast tells.
 */
export function nextBounds(
	{ step, faces, duration }: Asked,
	{ start, finish }: { readonly start: number; readonly finish: number }
): { earliest: number; latest: number } {
	const sides = faces.flatMap((face) => face.sides);
	const curingMin = step.limits.curing?.min ?? -Infinity;
	const opens = isCoat(step.kind) ? overcoatTable({ step }) : undefined;
	const closes = isCoat(step.kind) ? step.times.overcoatMax : step.times.coatWithin;
	const after = (
		table: Parameters<typeof reachedAt>[0]['table'] | undefined,
		side: 'earliest' | 'latest',
		position: number
	): number =>
		table === undefined || table === null
			? Infinity
			: reachedAt({ table, sides, side, curingMin }, Float64Array.of(position))[0];
	return {
		earliest: after(opens, 'earliest', finish),
		latest: Math.min(after(closes, 'latest', start), after(closes, 'latest', finish) - duration)
	};
}

/** A ten-thousandth of a slot: a tenth of a second. */
const CLOSE = 1e-4;

/**
 * The latest finish of a step after which the boat may still go in at a launch; null where even a
 * finish at the forecast's first hour is too late for it.
 */
export function latestFinishFor({ step, faces }: Asked, launch: number): number | null {
	const readyAfter = (finish: number): number =>
		launchReadyAfter(step, faces, Float64Array.of(finish), 'shaded')[0];
	const knownTo = faces[0]?.sides[0].weather.knownTo ?? launch;
	let low = 0;
	let high = Math.min(launch, knownTo);
	if (!(readyAfter(low) <= launch)) return null;
	if (readyAfter(high) <= launch) return high;
	// Ready no sooner for a later finish, so the two ends close in on it.
	while (high - low > CLOSE) {
		const middle = (low + high) / 2;
		if (readyAfter(middle) <= launch) low = middle;
		else high = middle;
	}
	return low;
}
