import {
	bearingTo,
	circularSpread,
	PLUME_REACH,
	plumeReaches,
	type Place,
	type PlumeActivity
} from '../../met/plume';
import type { YardWeather } from '../weather/yardWeather';

/** Slots [from, to) in which a boat makes dust or spray. */
export interface DustyWork {
	readonly id: string;
	readonly place: Place;
	readonly activity: PlumeActivity;
	readonly from: number;
	readonly to: number;
	/** Metres, where the yard states its own. */
	readonly reach?: number;
}

/** Slots [from, to) in which a boat must not be dusted: its paint is wet, its engine open. */
export interface ExposedWork {
	readonly id: string;
	readonly place: Place;
	readonly from: number;
	readonly to: number;
}

/** Dust or spray of one boat that would land on another. Slots, metres, degrees. */
export interface PlumeConflict {
	readonly source: string;
	readonly target: string;
	readonly activity: PlumeActivity;
	readonly from: number;
	readonly to: number;
	readonly distance: number;
	/** From source to target. */
	readonly bearing: number;
	/** The wind comes from here when it begins; negative where variable. */
	readonly direction: number;
}

/** How far the members' directions spread at a slot; 0 without members. Variable ones count as all round. */
function directionSpread({ members }: YardWeather, slot: number): number {
	const directions = members.map(({ windDirection }) => windDirection[slot]);
	if (directions.some((it) => it < 0)) return 180;
	return circularSpread(directions.filter((it) => !Number.isNaN(it)));
}

/** Where the wind comes from at a slot; any way, where that is not known. */
function directionAt({ weather: { windDirection } }: YardWeather, slot: number): number {
	return Number.isNaN(windDirection[slot]) ? -1 : windDirection[slot];
}

/**
 * Every stretch of time in which one boat's dust or spray would reach another's wet paint or open
 * engine, in the wind of each slot. A direction that is not known may be any.
 */
export function plumeConflicts(
	yard: YardWeather,
	dusty: readonly DustyWork[],
	exposed: readonly ExposedWork[]
): PlumeConflict[] {
	const { count } = yard.weather.grid;
	const conflicts: PlumeConflict[] = [];
	for (const source of dusty) {
		const reach = source.reach ?? PLUME_REACH[source.activity];
		for (const target of exposed) {
			if (target.id === source.id) continue;
			const { bearing, distance } = bearingTo(source.place, target.place);
			if (distance > reach) continue;
			const end = Math.min(source.to, target.to, count);
			let since = -1;
			const close = (to: number): void => {
				if (since < 0) return;
				conflicts.push({
					source: source.id,
					target: target.id,
					activity: source.activity,
					from: since,
					to,
					distance,
					bearing,
					direction: directionAt(yard, since)
				});
				since = -1;
			};
			for (let slot = Math.max(0, source.from, target.from); slot < end; slot++) {
				const wind = { direction: directionAt(yard, slot), spread: directionSpread(yard, slot) };
				if (!plumeReaches(source.place, target.place, wind, reach)) close(slot);
				else if (since < 0) since = slot;
			}
			close(end);
		}
	}
	return conflicts;
}

/**
 * The nearest other start of a dusty work that removes every conflict with some exposed works,
 * among the starts it may take; null where there is none. Of two equally near the earlier.
 *
 * @param starts - slots in which the work can be begun and gone through with
 */
export function quietStart(
	yard: YardWeather,
	work: DustyWork,
	exposed: readonly ExposedWork[],
	starts: readonly number[]
): number | null {
	const length = work.to - work.from;
	const nearest = [...starts].sort(
		(a, b) => Math.abs(a - work.from) - Math.abs(b - work.from) || a - b
	);
	return (
		nearest.find(
			(from) => plumeConflicts(yard, [{ ...work, from, to: from + length }], exposed).length === 0
		) ?? null
	);
}
