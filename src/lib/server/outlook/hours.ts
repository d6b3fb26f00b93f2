import type { Hours } from '../../api/hours';
import { SLOT_SECONDS } from '../../engine';
import { headline, subline, type SpokenDay } from '../../sentences/headline';
import { USUAL_UNITS, type Units } from '../../units/quantity';
import { visibleBoats, type Membership } from '../access/roles';
import type { SignedInUser } from '../access/sessions';
import type { Database } from '../db/client';
import { queuedSteps, type QueuedStep } from '../db/queue';
import { currentForecast } from '../forecast/current';
import { nightSpans } from './axis';
import { bandsOf, emptyBands } from './bands';
import { computeOutlook } from './compute';
import { highWindDayOf, isoAt, pageDays, spokenDayOf, spokenStep, spokenView } from './speech';
import { conditionsFor, type AxisHours } from './stepHours';

export const unitsOf = (user: SignedInUser): Units => ({
	...USUAL_UNITS,
	wind: user.windUnit,
	temperature: user.temperatureUnit
});

/** Steps under their boats, in the order they come. */
function groupByBoat(
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

/** The one step the sentence names; null where it speaks of several or of none. */
function spokenStepOf(queue: readonly QueuedStep[], spoken: SpokenDay): string | null {
	const named = queue.filter((_, i) => spoken.steps[i].hours !== null);
	return named.length === 1 ? named[0].step.id : null;
}

/** The Hours page of a yard for one of its people, as of `now`. */
export async function hoursOfYard(db: Database, membership: Membership, now: Date): Promise<Hours> {
	const { yard, user } = membership;
	const nowSeconds = Math.floor(now.getTime() / 1000);
	const [queue, current] = await Promise.all([
		queuedSteps(db, visibleBoats(db, membership)),
		currentForecast(db, yard, now)
	]);
	const { site, axis, weather, hours } = await computeOutlook(db, yard, queue, current, now);
	const nowSlot = Math.ceil((nowSeconds - axis.start) / SLOT_SECONDS);
	const hoursOf = (queued: QueuedStep): AxisHours | null => hours.get(queued.step.id) ?? null;
	const views = new Map(
		queue.map((queued) => [
			queued.step.id,
			spokenView(queued, hoursOf(queued), axis, nowSlot, yard.timeZone)
		])
	);
	const viewOf = (queued: QueuedStep) => {
		const view = views.get(queued.step.id);
		if (view === undefined) throw new Error('Every queued step has a view.');
		return view;
	};

	const days = pageDays(axis, weather, yard.highWindGust);
	const spokenDay = spokenDayOf([...views.values()], yard.timeZone, now);
	const spoken: SpokenDay = {
		day: spokenDay === 0 ? 'today' : 'tomorrow',
		timeZone: yard.timeZone,
		forecast: weather === null ? 'none' : 'known',
		steps: queue.map((it) => spokenStep(it, viewOf(it), hoursOf(it), axis, spokenDay))
	};
	const firstOpenAir = queue.find(({ step, faces }) => step.shelter === 'open' && faces.length > 0);
	const face =
		weather === null || firstOpenAir === undefined
			? null
			: conditionsFor(weather, site)(firstOpenAir)[0];
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
		days,
		spokenDay,
		spokenStep: spokenStepOf(queue, spoken),
		nights: nightSpans(site, axis),
		forecast: current?.source ?? null,
		headline: headline(spoken),
		subline: subline({
			...spoken,
			highWind: highWindDayOf(days, weather, axis, yard.timeZone, unitsOf(user))
		}),
		bands: weather === null ? emptyBands(axis.slotCount) : bandsOf(weather, axis, face),
		boats: groupByBoat(queue, viewOf)
	};
}
