import { memberConditions, faceConditions } from '../face/conditions';
import { withReadings } from '../face/readings';
import type { ErrorSeries } from '../hours/errors';
import { faceErrors } from '../members/memberErrors';
import type { FaceConditions } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import type { FaceUnder } from './job';

/** What one face meets: in the forecast and in each member, on each of its sides. */
export interface FaceOutlook {
	readonly id: string;
	readonly under: FaceUnder;
	/** UTC epoch seconds at which logged washings of it were done. */
	readonly washedAt: readonly number[];
	readonly sides: readonly FaceConditions[];
	/** Usual errors on each side. */
	readonly errors: readonly ErrorSeries[];
	/** [member][side] */
	readonly members: readonly (readonly FaceConditions[])[];
}

/**
 * Works out what faces meet, each once however many steps work on it.
 *
 * @param washesOf - UTC epoch seconds at which logged washings of a face were done
 */
export function faceOutlooks(
	yard: YardWeather,
	errors: ErrorSeries,
	washesOf: (faceId: string) => readonly number[] = () => []
) {
	const known = new Map<string, FaceOutlook>();
	return (under: FaceUnder): FaceOutlook => {
		const key = JSON.stringify(under);
		const before = known.get(key);
		if (before !== undefined) return before;
		const { face, shelter, readings = [] } = under;
		const measured = (conditions: FaceConditions): FaceConditions =>
			withReadings(conditions, readings);
		const washedAt = washesOf(under.id);
		const members = memberConditions(yard, face, shelter, washedAt).map((sides) =>
			sides.map(measured)
		);
		const sides = faceConditions(yard.weather, yard.site, face, shelter, washedAt).map(measured);
		const outlook: FaceOutlook = {
			id: under.id,
			under,
			washedAt,
			sides,
			errors: sides.map((_, side) =>
				faceErrors(
					errors,
					members.map((ofMember) => ofMember[side])
				)
			),
			members
		};
		known.set(key, outlook);
		return outlook;
	};
}
