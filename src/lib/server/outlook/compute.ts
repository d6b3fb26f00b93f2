import { SLOT_SECONDS, slotWeather, type Site, type SlotWeather } from '../../engine';
import type { Database } from '../db/client';
import type { QueuedStep } from '../db/queue';
import type { Yard } from '../db/schema';
import type { CurrentForecast } from '../forecast/current';
import { axisAt, type Axis } from './axis';
import { siteOf } from './engineInput';
import { hoursOfSteps, type AxisHours } from './stepHours';

/** The hours of steps on the page's axis, with the weather they were judged in. */
export interface Outlook {
	readonly site: Site;
	readonly axis: Axis;
	/** Null while no forecast was ever stored. */
	readonly weather: SlotWeather | null;
	readonly hours: Map<string, AxisHours>;
}

/** Judges steps of a yard in a forecast as of `now`, over the axis of the Hours page. */
export async function computeOutlook(
	db: Database,
	yard: Yard,
	queue: readonly QueuedStep[],
	current: CurrentForecast | null,
	now: Date
): Promise<Outlook> {
	const site = siteOf(yard);
	const page = axisAt(yard.timeZone, Math.floor(now.getTime() / 1000));
	if (current === null)
		return { site, axis: { ...page, offset: 0 }, weather: null, hours: new Map() };
	const weather = slotWeather({
		site,
		forecast: current.forecast,
		looseSand: yard.looseSand,
		stale: current.source.stale,
		from: page.start,
		to: page.start + page.slotCount * SLOT_SECONDS
	});
	const axis: Axis = { ...page, offset: (page.start - weather.grid.start) / SLOT_SECONDS };
	const hours = await hoursOfSteps(db, queue, yard, site, weather, current.runId, axis);
	return { site, axis, weather, hours };
}
