import { SLOT_SECONDS, slotWeather, type Site, type SlotWeather } from '../../engine';
import type { Database } from '../db/client';
import type { QueuedStep } from '../db/queue';
import type { Yard } from '../db/schema';
import type { CurrentForecast } from '../forecast/current';
import { axisAt, type Axis } from './axis';
import { siteOf } from './engineInput';
import { hoursOfSteps, type AxisHours } from './stepHours';

/** What steps of a yard are judged in. */
export interface YardWeather {
	readonly site: Site;
	readonly axis: Axis;
	/** Null while no forecast was ever stored. */
	readonly weather: SlotWeather | null;
}

/** A forecast as of `now` on the axis of the Hours page, before any step is judged in it. */
export function weatherOnAxis(yard: Yard, current: CurrentForecast | null, now: Date): YardWeather {
	const site = siteOf(yard);
	const page = axisAt(yard.timeZone, Math.floor(now.getTime() / 1000), yard.daysAhead);
	if (current === null) return { site, axis: { ...page, offset: 0 }, weather: null };
	const weather = slotWeather({
		site,
		forecast: current.forecast,
		looseSand: yard.looseSand,
		stale: current.source.stale,
		from: page.start,
		to: page.start + page.slotCount * SLOT_SECONDS
	});
	const offset = (page.start - weather.grid.start) / SLOT_SECONDS;
	return { site, axis: { ...page, offset }, weather };
}

/** Judges steps of a yard in a forecast as of `now`, over the axis of the Hours page. */
export async function computeOutlook(
	db: Database,
	yard: Yard,
	queue: readonly QueuedStep[],
	current: CurrentForecast | null,
	{ site, axis, weather }: YardWeather
): Promise<Map<string, AxisHours>> {
	if (current === null || weather === null) return new Map();
	return hoursOfSteps(db, queue, yard, site, weather, current.runId, axis);
}
