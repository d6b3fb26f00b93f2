import { z } from 'zod';
import { flagBit } from '../weather/flags';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';

/** A measured surface temperature: UTC epoch seconds, °C. */
export const surfaceReadingSchema = z.strictObject({
	time: z.int(),
	surfaceTemperature: z.number().min(-60).max(110)
});
export type SurfaceReading = z.infer<typeof surfaceReadingSchema>;

/** Between readings no further apart the residual is linear; else it fades from each. Seconds. */
const BRIDGED = 12 * 3600;
const FADING = 6 * 3600;
/** A slot this near to a reading is measured. */
const MEASURED = 30 * 60;

interface Residual {
	readonly time: number;
	readonly value: number;
}

/** A model's value at an instant, linear between slot starts; NaN where unknown. */
function valueAt(values: Float64Array, start: number, time: number): number {
	const position = (time - start) / SLOT_SECONDS;
	const slot = Math.floor(position);
	if (slot < 0 || slot >= values.length) return NaN;
	const next = Math.min(slot + 1, values.length - 1);
	return values[slot] + (position - slot) * (values[next] - values[slot]);
}

/**
 * The residual at an instant between the readings beside it: linear between two up to twelve hours
 * apart, fading with an e-folding of six hours from a lone one, and from the nearer of two that are
 * further apart.
 */
function residualAt(
	before: Residual | undefined,
	next: Residual | undefined,
	time: number
): number {
	if (before !== undefined && next !== undefined && next.time - before.time <= BRIDGED) {
		const share = (time - before.time) / (next.time - before.time);
		return before.value + share * (next.value - before.value);
	}
	const nearer =
		before === undefined || (next !== undefined && next.time - time < time - before.time)
			? next
			: before;
	return nearer === undefined ? 0 : nearer.value * Math.exp(-Math.abs(time - nearer.time) / FADING);
}

/**
 * A face with its measured surface temperatures taken in: what the model's shaded run is off at
 * each reading moves both runs, not the film. Slots within half an hour of a reading are flagged
 * `measured`. Readings outside the grid, or where the model is unknown, change nothing.
 *
 * @param bias - the yard's own correction beyond what readings say, K
 */
export function withReadings(
	face: FaceConditions,
	readings: readonly SurfaceReading[],
	bias = 0
): FaceConditions {
	const { start, count } = face.weather.grid;
	const residuals = readings
		.map(({ time, surfaceTemperature }) => ({
			time,
			value: surfaceTemperature - valueAt(face.surfaceShaded, start, time) - bias
		}))
		.filter(({ value }) => !Number.isNaN(value))
		.sort((a, b) => a.time - b.time)
		// Of two readings at one instant the later given holds.
		.filter((it, i, all) => all[i + 1]?.time !== it.time);
	if (residuals.length === 0 && bias === 0) return face;
	const surfaceShaded = new Float64Array(count);
	const surfaceSunlit = new Float64Array(count);
	const spread = new Float64Array(count);
	const flags = face.flags.slice();
	const measured = flagBit('measured');
	let after = 0;
	for (let i = 0; i < count; i++) {
		const time = start + i * SLOT_SECONDS;
		while (after < residuals.length && residuals[after].time < time) after++;
		const before = after === 0 ? undefined : residuals[after - 1];
		const next = after < residuals.length ? residuals[after] : undefined;
		const off = bias + residualAt(before, next, time);
		surfaceShaded[i] = face.surfaceShaded[i] + off;
		surfaceSunlit[i] = face.surfaceSunlit[i] + off;
		spread[i] = surfaceShaded[i] - face.dewPoint[i];
		const isNear = (it: Residual | undefined): boolean =>
			it !== undefined && Math.abs(it.time - time) <= MEASURED;
		if (isNear(before) || isNear(next)) flags[i] |= measured;
	}
	return { ...face, surfaceShaded, surfaceSunlit, spread, flags };
}
