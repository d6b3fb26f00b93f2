import type { Hours } from '../../api/hours';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { queuedSteps, type QueuedStep } from '../db/queue';
import { currentForecast, type CurrentForecast } from '../forecast/current';
import { nightSpans } from './axis';
import { weatherOnAxis, type YardWeather } from './compute';
import { isoAt, pageDays } from './speech';

/** What an Hours page is drawn on: the steps a member may see and the weather, no step judged yet. */
export interface Ground extends YardWeather {
	readonly membership: Membership;
	readonly now: Date;
	readonly queue: readonly QueuedStep[];
	readonly current: CurrentForecast | null;
}

export async function groundOf(db: Database, membership: Membership, now: Date): Promise<Ground> {
	const { yard } = membership;
	const [queue, current] = await Promise.all([
		queuedSteps(db, visibleBoats(db, membership)),
		currentForecast(db, yard, now)
	]);
	return { membership, now, queue, current, ...weatherOnAxis(yard, current, now) };
}

/** The part of the page that stands whatever hours are found. */
export function frameOf({ membership: { yard }, now, current, site, axis, weather }: Ground) {
	return {
		yard: {
			slug: yard.slug,
			name: yard.name,
			timeZone: yard.timeZone,
			liftGust: yard.liftGust,
			highWindGust: yard.highWindGust
		},
		now: now.toISOString(),
		start: isoAt(axis, 0),
		slotCount: axis.slotCount,
		days: pageDays(axis, weather, yard.highWindGust),
		nights: nightSpans(site, axis),
		forecast: current?.source ?? null
	} satisfies Partial<Hours>;
}

/** Steps under their boats, in the order they come. */
export function groupByBoat(
	queue: readonly QueuedStep[],
	viewOf: (queued: QueuedStep) => Hours['boats'][number]['steps'][number]
): Hours['boats'] {
	const boats = new Map<string, Hours['boats'][number]>();
	for (const queued of queue) {
		const { id, name } = queued.boat;
		const boat = boats.get(id) ?? { id, name, stand: queued.stand, steps: [] };
		boats.set(id, boat);
		boat.steps.push(viewOf(queued));
	}
	return [...boats.values()];
}
