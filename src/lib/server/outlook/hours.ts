import type { Hours } from '../../api/hours';
import { SLOT_SECONDS } from '../../engine';
import { headline, subline, type SpokenDay } from '../../sentences/headline';
import { USUAL_UNITS, type Units } from '../../units/quantity';
import type { Membership } from '../access/roles';
import type { SignedInUser } from '../access/sessions';
import type { Database } from '../db/client';
import type { QueuedStep } from '../db/queue';
import { bandsOf, emptyBands } from './bands';
import { bareHours } from './bareHours';
import { computeOutlook } from './compute';
import { frameOf, groundOf, groupByBoat, type Ground } from './ground';
import { highWindDayOf, spokenDayOf, spokenStep, spokenView } from './speech';
import { conditionsFor, type AxisHours } from './stepHours';

export const unitsOf = (user: SignedInUser): Units => ({
	...USUAL_UNITS,
	wind: user.windUnit,
	temperature: user.temperatureUnit
});

/** The one step the sentence is about; null where it speaks of several or of none of several. */
function spokenStepOf(queue: readonly QueuedStep[], spoken: SpokenDay): string | null {
	const named = queue.length === 1 ? queue : queue.filter((_, i) => spoken.steps[i].hours !== null);
	return named.length === 1 ? named[0].step.id : null;
}

/** The Hours page of a yard for one of its people, as of `now`. */
export async function hoursOfYard(db: Database, membership: Membership, now: Date): Promise<Hours> {
	return foundHours(db, await groundOf(db, membership, now));
}

/**
 * The Hours page in two: with its laths bare, at once, and with the hours, when they are found.
 * A queue without steps has nothing to find and comes whole.
 */
export async function hoursInTwo(
	db: Database,
	membership: Membership,
	now: Date
): Promise<{ bare: Hours | null; hours: Hours | Promise<Hours> }> {
	const ground = await groundOf(db, membership, now);
	const hours = foundHours(db, ground);
	if (ground.queue.length === 0) return { bare: null, hours: await hours };
	// Another part of the answer may fail before anybody waits for these.
	hours.catch(() => undefined);
	return { bare: bareHours(ground), hours };
}

async function foundHours(db: Database, ground: Ground): Promise<Hours> {
	const { membership, now, queue, current, site, axis, weather } = ground;
	const { yard, user } = membership;
	const hours = await computeOutlook(db, yard, queue, current, ground);
	const nowSlot = Math.ceil((Math.floor(now.getTime() / 1000) - axis.start) / SLOT_SECONDS);
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

	const frame = frameOf(ground);
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
		...frame,
		spokenDay,
		spokenStep: spokenStepOf(queue, spoken),
		headline: headline(spoken),
		subline: subline({
			...spoken,
			highWind: highWindDayOf(frame.days, weather, axis, yard.timeZone, unitsOf(user))
		}),
		bands: weather === null ? emptyBands(axis.slotCount) : bandsOf(weather, axis, face),
		boats: groupByBoat(queue, viewOf)
	};
}
