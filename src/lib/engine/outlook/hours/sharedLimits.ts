import type { FaceConditions } from '../weather/slots';
import type { ErrorSeries } from './errors';
import { limitOn, type Limit } from './limit';
import type { Phase as PhaseName } from './result';
import { filmRoom, type RoomSeries } from './roomSeries';
import type { Step } from './step';

/** Limits that hold while the brush moves and again while the film dries. */

/** Rain in the slot's hour, or its chance. */
export function rainLimit(
	face: FaceConditions,
	faceIndex: number,
	phase: PhaseName,
	{ value, rooms }: RoomSeries
): Limit {
	return limitOn(face, faceIndex, 'rain', {
		limit: 'rain',
		phase,
		side: 'most',
		unit: 'millimetres',
		value,
		rooms
	});
}

/** Water on the face. */
export function filmLimit(face: FaceConditions, faceIndex: number, phase: PhaseName): Limit {
	const { value, rooms } = filmRoom(face.film);
	return limitOn(face, faceIndex, 'wet', {
		limit: 'film',
		phase,
		side: 'most',
		unit: 'millimetres',
		value,
		rooms,
		freezes: face.surfaceShaded,
		modelled: true
	});
}

/** Surface over dew point. */
export function spreadLimit(
	face: FaceConditions,
	faceIndex: number,
	phase: PhaseName,
	bound: number,
	errors: ErrorSeries
): Limit {
	return limitOn(face, faceIndex, 'dew', {
		limit: 'spread',
		phase,
		side: 'least',
		unit: 'kelvin',
		value: face.spread,
		bound,
		error: errors.spread,
		modelled: true
	});
}

/** Whether blowing sand shuts a step on a face: asked for, not kept off, and stated for the yard. */
export function sandCounts({ limits }: Step, face: FaceConditions): boolean {
	return limits.sand === 'none' && face.dustReaches && face.weather.sandStated;
}

/** Sand: the gust at 10 m stays under the one that lifts it. */
export function sandLimit(
	face: FaceConditions,
	faceIndex: number,
	phase: PhaseName,
	errors: ErrorSeries
): Limit {
	return limitOn(face, faceIndex, 'sand', {
		limit: 'sand',
		phase,
		side: 'most',
		unit: 'metresPerSecond',
		value: face.weather.windGust,
		bound: face.weather.sandLiftGust,
		error: errors.gust,
		modelled: true
	});
}
