import {
	clearSkyGlobal,
	cloudTransmission,
	splitGlobal,
	type LightSeries
} from '../../met/irradiance';
import type { Hourly } from './forecast';
import { valuesOf, type Periods } from './hours';
import type { SlotGrid } from './slots';

const DAY_SECONDS = 86_400;
const RADIANS = Math.PI / 180;

/** Light over the slots, and 1 in `derived` where it is worked out from cloud. */
export interface SlotLight extends LightSeries {
	readonly derived: Uint8Array;
}

/** Spreads a period's mean over its slots in the shape of `weight`, the mean preserved. */
function shape(
	values: Float64Array,
	periods: Periods,
	weight: Float64Array,
	out: Float64Array
): void {
	for (let k = 0; k < periods.first.length; k++) {
		const first = periods.first[k];
		const end = periods.end[k];
		const mean = values[k + 1];
		let total = 0;
		for (let i = first; i < end; i++) total += weight[i];
		for (let i = first; i < end; i++) {
			// Sun down all the period: nothing, whatever rounding the provider left.
			out[i] = periods.gap[k] ? NaN : total > 0 ? (mean * weight[i] * (end - first)) / total : 0;
		}
	}
}

const dayOfYear = (epochSeconds: number): number => {
	const date = new Date(epochSeconds * 1000);
	return (date.getTime() - Date.UTC(date.getUTCFullYear(), 0, 0)) / (DAY_SECONDS * 1000);
};

/**
 * Global, direct and diffuse irradiance per slot. Hourly means of the provider are shaped by the
 * clear-sky curve inside their hour; what it lacks is worked out: the split by Erbs, the whole by
 * a clear sky under the cloud. A missing hour falls back to the cloud too, and is marked derived.
 */
export function slotLight(
	hourly: Hourly,
	periods: Periods,
	grid: SlotGrid,
	sun: { altitude: Float64Array; azimuth: Float64Array },
	cloudCover: Float64Array
): SlotLight {
	const { count } = grid;
	const clear = new Float64Array(count);
	const clearBeam = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		const altitude = sun.altitude[i];
		if (!(altitude > 0)) continue;
		clear[i] = clearSkyGlobal(altitude);
		clearBeam[i] = clear[i] / Math.sin(altitude * RADIANS);
	}
	const laid = (variable: 'ghi' | 'dni' | 'dhi', weight: Float64Array): Float64Array => {
		const out = new Float64Array(count).fill(NaN);
		const values = valuesOf(hourly, variable);
		if (values !== null) shape(values, periods, weight, out);
		return out;
	};
	const ghi = laid('ghi', clear);
	const dni = laid('dni', clearBeam);
	const dhi = laid('dhi', clear);
	const derived = new Uint8Array(count);
	const day = dayOfYear(grid.start);
	for (let i = 0; i < count; i++) {
		const altitude = sun.altitude[i];
		if (!(altitude > 0)) {
			const known = cloudCover[i] === cloudCover[i] || ghi[i] === ghi[i];
			ghi[i] = dni[i] = dhi[i] = known ? 0 : NaN;
			continue;
		}
		const beamKnown = dni[i] === dni[i] && dhi[i] === dhi[i];
		if (ghi[i] !== ghi[i] && beamKnown) ghi[i] = dni[i] * Math.sin(altitude * RADIANS) + dhi[i];
		if (ghi[i] !== ghi[i]) {
			ghi[i] = clear[i] * cloudTransmission(cloudCover[i]);
			derived[i] = 1;
		}
		if (!beamKnown || derived[i]) {
			const parts = splitGlobal(ghi[i], altitude, day + i / 96);
			dni[i] = parts.dni;
			dhi[i] = parts.dhi;
		}
	}
	return { ghi, dni, dhi, sunAltitude: sun.altitude, sunAzimuth: sun.azimuth, derived };
}
