import { minutesAt } from '../../../../../src/lib/engine/coating/curve';
import type { TimeTable } from '../../../../../src/lib/engine/coating/times';
import type { StepOutlook } from '../../../../../src/lib/engine/outlook/job/stepOutlook';

/**
 * Plans of a short chain on one face by trying every start, with clocks summed slot by slot between
 * the two starts: another route than the planner's. Durations are whole slots, and so are launch
 * slots.
 */
const sums = new WeakMap<Float64Array, Map<unknown, Float64Array>>();

function sumsOf(
	table: Exclude<TimeTable, null>,
	temperature: Float64Array,
	side: 'earliest' | 'latest'
): Float64Array {
	const known = sums.get(temperature) ?? new Map<unknown, Float64Array>();
	sums.set(temperature, known);
	const made = known.get(table) ?? new Float64Array(temperature.length + 1);
	if (!known.has(table))
		temperature.forEach((value, i) => (made[i + 1] = made[i] + 15 / minutesAt(table, value, side)));
	known.set(table, made);
	return made;
}

function progress(
	table: Exclude<TimeTable, null>,
	temperature: Float64Array,
	side: 'earliest' | 'latest',
	from: number,
	to: number
): number {
	const made = sumsOf(table, temperature, side);
	return made[Math.min(to, temperature.length)] - made[from];
}

const CLEARS = ['abrade', 'blast', 'strip'];

/** Whether a step may start at a slot after those before it, by the rules of the recoat window. */
function follows(steps: readonly StepOutlook[], starts: readonly number[], start: number): boolean {
	const here = steps[starts.length];
	const lengthOf = (step: StepOutlook): number => step.step.durationMinutes / 15;
	const finishOf = (i: number): number => starts[i] + lengthOf(steps[i]);
	if (starts.length > 0 && start < finishOf(starts.length - 1)) return false;
	const before = steps.slice(0, starts.length);
	const coat = before.findLastIndex(({ step }) => step.kind === 'coat');
	const notPast = (i: number, table: TimeTable | undefined): boolean => {
		if (table == null) return true;
		const { surfaceSunlit } = steps[i].faces[0].sides[0];
		return (
			progress(table, surfaceSunlit, 'latest', starts[i], start) <= 1 + 1e-9 &&
			progress(table, surfaceSunlit, 'latest', finishOf(i), start + lengthOf(here)) <= 1 + 1e-9
		);
	};
	const done = (table: TimeTable | undefined): boolean =>
		table == null ||
		progress(
			table,
			steps[coat].faces[0].sides[0].surfaceShaded,
			'earliest',
			finishOf(coat),
			start
		) >=
			1 - 1e-9;
	if (here.step.kind === 'launch')
		return before.every(({ step, faces }, i) => {
			if (step.kind !== 'coat') return true;
			const table = step.times.launchMin ?? step.times.touchDry;
			const { surfaceShaded } = faces[0].sides[0];
			const isReady =
				table == null || progress(table, surfaceShaded, 'earliest', finishOf(i), start) >= 1 - 1e-9;
			return isReady && notPast(i, step.times.launchMax);
		});
	const times = coat < 0 ? {} : steps[coat].step.times;
	if (CLEARS.includes(here.step.kind)) return coat < 0 || done(times.dryToSand ?? times.touchDry);
	if (here.step.kind !== 'coat') return true;
	const cleared = before.findLastIndex(({ step }) => CLEARS.includes(step.kind));
	const inTime = before.every(
		({ step }, i) => i < Math.max(cleared, coat + 1) || notPast(i, step.times.coatWithin)
	);
	if (coat < 0) return inTime;
	return (
		inTime &&
		done(times.overcoatMin ?? times.touchDry) &&
		(cleared > coat || notPast(coat, times.overcoatMax))
	);
}

/** Slots from which a step can be gone through with; of a launch those stated alone. */
function workableStarts(
	{ hours, step }: StepOutlook,
	launches: readonly number[] | null
): number[] {
	const length = step.durationMinutes / 15;
	const starts: number[] = [];
	for (let start = 0; start + length <= hours.state.length; start++) {
		if (step.kind === 'launch' && launches !== null && !launches.includes(start)) continue;
		if (hours.state.subarray(start, start + length).every((state) => state > 0)) starts.push(start);
	}
	return starts;
}

/**
 * Starts (slots) of every chain.
 *
 * @param launches - slots at which a launch may start; null: any
 */
export function everyChain(
	steps: readonly StepOutlook[],
	launches: readonly number[] | null = null
): number[][] {
	const found: number[][] = [];
	const choices = steps.map((step) => workableStarts(step, launches));
	const go = (starts: number[]): void => {
		if (starts.length === steps.length) {
			found.push(starts);
			return;
		}
		for (const start of choices[starts.length])
			if (follows(steps, starts, start)) go([...starts, start]);
	};
	go([]);
	return found;
}

/** Earlier starts from the last step backwards. */
export function backwards(a: readonly number[], b: readonly number[]): number {
	for (let i = a.length - 1; i >= 0; i--) if (a[i] !== b[i]) return a[i] - b[i];
	return 0;
}

/** Least room over the slots a chain works, as judged slot by slot. */
export function chainRoom(steps: readonly StepOutlook[], starts: readonly number[]): number {
	return Math.min(
		...steps.map(({ hours, step }, i) =>
			Math.min(...hours.room.subarray(starts[i], starts[i] + step.durationMinutes / 15))
		)
	);
}

/** Starts (slots) of the earliest chain, from the last step backwards; null where there is none. */
export function earliestChain(
	steps: readonly StepOutlook[],
	launches: readonly number[] | null = null
): number[] | null {
	return everyChain(steps, launches).sort(backwards)[0] ?? null;
}
