import type { Reading } from '../../api/reading';
import {
	missingVariables,
	SLOT_SECONDS,
	slotReading,
	slotWeather,
	type LimitReading
} from '../../engine';
import { readingDetail, readingTitle, type ReadingFacts } from '../../sentences/reading';
import { quantity, roomQuantity, type Quantity, type Units } from '../../units/quantity';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { queuedSteps } from '../db/queue';
import { currentForecast } from '../forecast/current';
import { faceWords, siteOf, stepOf } from './engineInput';
import { unitsOf } from './hours';
import { conditionsFor } from './stepHours';

const words = ({ number, unit }: Quantity): string => (unit === '' ? number : `${number} ${unit}`);

/** The binding limit in the person's units; null where it is in or out. */
function bindingOf(limit: LimitReading | undefined, units: Units): ReadingFacts['binding'] {
	if (limit === undefined || limit.value === null || limit.bound === null || limit.room === null)
		return null;
	const { unit } = limit;
	return {
		value: words(quantity(limit.value, unit, units)),
		bound: words(quantity(limit.bound, unit, units)),
		room: words(roomQuantity(limit.room, unit, units)),
		usualError:
			limit.usualError === null
				? null
				: words(quantity(limit.usualError, unit === 'celsius' ? 'kelvin' : unit, units))
	};
}

/**
 * Every limit of a queued step in the quarter-hour that holds an instant. Null where the member
 * may see no such step, no forecast is stored, or the instant lies outside it.
 */
export async function readingOf(
	db: Database,
	membership: Membership,
	stepId: string,
	at: Date,
	now: Date
): Promise<Reading | null> {
	const { yard, user } = membership;
	const [[queued], current] = await Promise.all([
		queuedSteps(db, visibleBoats(db, membership), stepId),
		currentForecast(db, yard, now)
	]);
	if (queued === undefined || current === null) return null;
	const site = siteOf(yard);
	const weather = slotWeather({
		site,
		forecast: current.forecast,
		looseSand: yard.looseSand,
		stale: current.source.stale
	});
	const slot = Math.floor((at.getTime() / 1000 - weather.grid.start) / SLOT_SECONDS);
	const conditions = conditionsFor(weather, site)(queued);
	if (slot < 0 || slot >= weather.grid.count || conditions.length === 0) return null;
	const reading = slotReading(stepOf(queued, yard), conditions, site, slot);
	// One condition a side: a two-sided part has two for its one face.
	const faceNames = queued.faces.flatMap((row) =>
		row.bothSides ? [faceWords(row), faceWords(row)] : [faceWords(row)]
	);
	const instant = (seconds: number): string => new Date(seconds * 1000).toISOString();
	const start = weather.grid.start + slot * SLOT_SECONDS;
	const binding = reading.limits.find(
		({ limiter, scaledRoom }) => limiter === reading.limiter && scaledRoom !== null
	);
	const facts: ReadingFacts = {
		slotStart: instant(start),
		timeZone: yard.timeZone,
		state: reading.state,
		limiter: reading.limiter,
		binding: bindingOf(binding, unitsOf(user)),
		missing: missingVariables(weather, slot),
		bindsAt: binding !== undefined && binding.at !== start ? instant(binding.at) : null
	};
	return {
		stepId,
		slotStart: facts.slotStart,
		timeZone: yard.timeZone,
		state: reading.state,
		limiter: reading.limiter,
		room: reading.room,
		title: readingTitle(facts),
		detail: readingDetail(facts),
		missing: [...facts.missing],
		limits: reading.limits.map(({ faceIndex, at: binds, ...limit }) => ({
			...limit,
			face: faceNames[faceIndex] ?? '',
			at: instant(binds)
		})),
		forecast: {
			provider: current.source.provider,
			issuedAt: current.source.issuedAt,
			ageMinutes: current.source.ageMinutes,
			stale: current.source.stale
		}
	};
}
