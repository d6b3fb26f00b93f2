import { WET_FILM } from '../../met/materials';
import { SLOT_SECONDS, type SlotWeather } from '../weather/slots';

/**
 * Scaled rooms per slot of the limits that are not a plain distance to a number. 1 is one usual
 * error, at most {@link MOST_ROOM}; negative is broken, NaN unknown.
 */

/** Rooms over this are all alike. */
export const MOST_ROOM = 3;
/** Room of a limit that is broken and has no distance. */
export const BROKEN = -1;

const HOURS_PER_SLOT = SLOT_SECONDS / 3600;
/** An hour with this much rain is wet, mm; a chance from this on shuts, %. */
export const WET_HOUR = 0.1;
export const SHUT_CHANCE = 50;
const CHANCE_SCALE = 25;
const RAIN_HOURS_SCALE = 3;
/** Direct sun counts from this much beam on the face, W/m². */
export const DIRECT_SUN = 20;
const TREND_SLOTS = 3600 / SLOT_SECONDS;

/** A rule's own values and the scaled rooms made of them. */
export interface RoomSeries {
	readonly value: Float64Array;
	readonly rooms: Float64Array;
}

/**
 * Hours from each slot's start to the nearest wet hour, before or after; +Infinity without one. An
 * hour of missing rain inside the forecast may have been wet.
 */
function hoursToRain({ hourlyPrecipitation, knownFrom, knownTo }: SlotWeather): Float64Array {
	const count = hourlyPrecipitation.length;
	const mayBeWet = (i: number): boolean => {
		const amount = hourlyPrecipitation[i];
		return amount === amount ? amount >= WET_HOUR : i >= knownFrom && i < knownTo;
	};
	const out = new Float64Array(count).fill(Infinity);
	let distance = Infinity;
	for (let i = 0; i < count; i++) {
		distance = mayBeWet(i) ? 0 : distance + HOURS_PER_SLOT;
		out[i] = Math.max(0, distance - HOURS_PER_SLOT);
	}
	distance = Infinity;
	for (let i = count - 1; i >= 0; i--) {
		distance = mayBeWet(i) ? 0 : distance + HOURS_PER_SLOT;
		if (distance < out[i]) out[i] = distance;
	}
	return out;
}

const rainRooms = new WeakMap<SlotWeather, RoomSeries>();

/**
 * Rain: broken at 0.1 mm in an hour or a chance of 50 %; else (50 − P)/25, without a chance the
 * hours to the nearest wet hour over 3. `value` is the chance in %, or mm in the hour without one.
 */
export function rainRoom(weather: SlotWeather): RoomSeries {
	const before = rainRooms.get(weather);
	if (before !== undefined) return before;
	const { hourlyPrecipitation, precipitationProbability } = weather;
	const count = hourlyPrecipitation.length;
	const value = new Float64Array(count);
	const rooms = new Float64Array(count);
	const nearest = hoursToRain(weather);
	for (let i = 0; i < count; i++) {
		const amount = hourlyPrecipitation[i];
		const chance = precipitationProbability[i];
		const chanceKnown = chance === chance;
		value[i] = amount;
		if (amount !== amount) rooms[i] = NaN;
		else if (amount >= WET_HOUR) rooms[i] = BROKEN;
		else if (chanceKnown) {
			// At 50 % the room is nought and shut all the same.
			rooms[i] =
				chance >= SHUT_CHANCE
					? Math.min(-0.01, (SHUT_CHANCE - chance) / CHANCE_SCALE)
					: (SHUT_CHANCE - chance) / CHANCE_SCALE;
		} else rooms[i] = Math.min(MOST_ROOM, nearest[i] / RAIN_HOURS_SCALE);
	}
	const result = { value, rooms };
	rainRooms.set(weather, result);
	return result;
}

const filmRooms = new WeakMap<Float64Array, RoomSeries>();

/** Film: broken while the face is wet, else the hours since it last was; unknown with the film. */
export function filmRoom(film: Float64Array): RoomSeries {
	const before = filmRooms.get(film);
	if (before !== undefined) return before;
	const rooms = new Float64Array(film.length);
	let hours = Infinity;
	for (let i = 0; i < film.length; i++) {
		const depth = film[i];
		if (depth !== depth) {
			rooms[i] = NaN;
			hours = 0;
		} else if (depth >= WET_FILM) {
			rooms[i] = BROKEN;
			hours = 0;
		} else {
			hours += HOURS_PER_SLOT;
			rooms[i] = Math.min(MOST_ROOM, hours);
		}
	}
	const result = { value: film, rooms };
	filmRooms.set(film, result);
	return result;
}

/** Direct sun on the face: in or out. */
export function directSunRoom(beam: Float64Array): RoomSeries {
	const rooms = new Float64Array(beam.length);
	for (let i = 0; i < beam.length; i++) {
		const light = beam[i];
		rooms[i] = light !== light ? NaN : light > DIRECT_SUN ? BROKEN : MOST_ROOM;
	}
	return { value: beam, rooms };
}

/** Trend of the shaded face against an hour before, K/h: in or out. */
export function trendRoom(surface: Float64Array, asked: 'falling' | 'rising'): RoomSeries {
	const value = new Float64Array(surface.length).fill(NaN);
	const rooms = new Float64Array(surface.length).fill(NaN);
	for (let i = TREND_SLOTS; i < surface.length; i++) {
		const change = surface[i] - surface[i - TREND_SLOTS];
		value[i] = change;
		if (change === change)
			rooms[i] = (asked === 'falling' ? change <= 0 : change >= 0) ? MOST_ROOM : BROKEN;
	}
	return { value, rooms };
}
