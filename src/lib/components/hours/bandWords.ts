import type { Hours } from '$lib/api/hours';
import { quantity, type Units } from '$lib/units/quantity';
import type { LimitUnit } from '$lib/engine';

/** The weather of a slot in words, as a screen reader hears the bands. */
export function bandWords(bands: Hours['bands'], slot: number, units: Units): string {
	const said = (name: string, value: number | null | undefined, unit: LimitUnit) => {
		if (value === null || value === undefined) return `no ${name}`;
		const shown = quantity(value, unit, units);
		return `${name} ${shown.number} ${shown.unit}`;
	};
	const rain = bands.hourlyPrecipitation[slot];
	const inside = ({ from, to }: { from: number; to: number }) => from <= slot && slot < to;
	return [
		said('air', bands.airTemperature[slot], 'celsius'),
		said('dew point', bands.dewPoint[slot], 'celsius'),
		said('wind', bands.windSpeed[slot], 'metresPerSecond'),
		said('gust', bands.windGust[slot], 'metresPerSecond'),
		rain === 0 ? 'no rain' : said('rain', rain, 'millimetres'),
		...(bands.dew.some(inside) ? ['dew on the hull'] : []),
		...(bands.sand.some((it) => inside(it) && it.state !== 'none') ? ['sand'] : [])
	].join(', ');
}
