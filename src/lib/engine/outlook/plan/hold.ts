import { progressAt } from '../../coating/cure';
import { rateAt, rateTable, type RateTable } from '../../coating/rates';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import { linksOf, type Link } from './links';
import type { PlanStep } from './planStep';

/** A step of a plan as the members of the ensemble meet it. */
export interface HeldStep {
	/** Slots in which it can go on, per member. */
	readonly masks: readonly Uint8Array[];
	/** What each face meets, per member: [member][face][side]. */
	readonly faces: readonly (readonly (readonly FaceConditions[])[])[];
}

const SLOT_MINUTES = SLOT_SECONDS / 60;
const ROUNDING = 1e-6;
const DAY = 86_400 / SLOT_SECONDS;

/** The quickest a clock runs in the first day, progress a slot. */
function quickest(rates: RateTable, temperature: Float64Array): number {
	let most = 0;
	for (let i = 0; i < Math.min(DAY, temperature.length); i++)
		if (temperature[i] === temperature[i])
			most = Math.max(most, SLOT_MINUTES * rateAt(rates, temperature[i]));
	return most;
}

/**
 * Progress of a clock between two slot positions; NaN over an unknown temperature or past the grid.
 * Before the grid earliest clocks stand still and latest ones run as quick as on its first day.
 */
function progressBetween(
	rates: RateTable,
	temperature: Float64Array,
	begun: number,
	to: number,
	curingMin: number,
	side: Link['side']
): number {
	if (begun < 0) {
		const on = to > 0 ? progressBetween(rates, temperature, 0, to, curingMin, side) : 0;
		const before = side === 'earliest' ? 0 : quickest(rates, temperature);
		return on + (Math.min(to, 0) - begun) * before;
	}
	const from = begun;
	const first = Math.floor(from);
	const end = Math.ceil(to);
	if (end > temperature.length) return NaN;
	const progress = new Float64Array(end - first + 1);
	for (let i = first; i < end; i++) {
		const value = temperature[i];
		if (value !== value) return NaN;
		const rate = value < curingMin ? 0 : SLOT_MINUTES * rateAt(rates, value);
		progress[i - first + 1] = progress[i - first] + rate;
	}
	return progressAt(progress, to - first) - progressAt(progress, from - first);
}

interface Placed {
	readonly start: number;
	readonly finish: number;
}

/** Whether a link holds for steps at their planned places, on the sides of a face in one member. */
function linkHolds(
	link: Link,
	rates: RateTable,
	sides: readonly FaceConditions[],
	from: Placed,
	to: Placed,
	curingMin: number
): boolean {
	return sides.every(({ surfaceShaded, surfaceSunlit }) => {
		if (link.side === 'earliest')
			return (
				progressBetween(rates, surfaceShaded, from.finish, to.start, curingMin, 'earliest') >=
				1 - ROUNDING
			);
		const most = 1 + ROUNDING;
		return (
			progressBetween(rates, surfaceSunlit, from.start, to.start, -Infinity, 'latest') <= most &&
			progressBetween(rates, surfaceSunlit, from.finish, to.finish, -Infinity, 'latest') <= most
		);
	});
}

/**
 * Share of members in which every step is workable at its planned time and every gap lies in that
 * member's own recoat window; null without members.
 *
 * @param starts - the start taken of each step's candidates
 */
export function holdChance(
	steps: readonly PlanStep[],
	held: readonly HeldStep[],
	starts: Int32Array
): number | null {
	const members = held[0]?.masks.length ?? 0;
	if (members === 0) return null;
	const placed = steps.map(({ candidates }, i) => ({
		start: candidates.start[starts[i]],
		finish: candidates.finish[starts[i]]
	}));
	const links = linksOf(steps).map((link) => ({ link, rates: rateTable(link.table, link.side) }));
	let holds = 0;
	for (let member = 0; member < members; member++) {
		const isWorkable = steps.every(({ isFixed }, i) => {
			if (isFixed) return true;
			const end = Math.ceil(placed[i].finish - ROUNDING);
			for (let slot = Math.floor(placed[i].start + ROUNDING); slot < end; slot++)
				if (held[i].masks[member][slot] !== 1) return false;
			return true;
		});
		if (!isWorkable) continue;
		const inWindows = links.every(({ link, rates }) =>
			linkHolds(
				link,
				rates,
				held[link.from].faces[member][link.face],
				placed[link.from],
				placed[link.to],
				steps[link.from].step.limits.curing?.min ?? -Infinity
			)
		);
		if (inWindows) holds++;
	}
	return holds / members;
}
