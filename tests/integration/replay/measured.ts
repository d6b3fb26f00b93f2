import { readFileSync } from 'node:fs';
import { century, declination, equationOfTime } from 'solar-calculator';

/** Measured hours of one airport, 2013, straight from the file: the judge uses nothing of ours. */
export const MEASURED_FILE = new URL('../../fixtures/weather/ewr-2013.csv', import.meta.url)
	.pathname;
/** Newark, New Jersey. */
export const AIRPORT = {
	latitude: 40.69,
	longitude: -74.17,
	elevation: 5,
	timeZone: 'America/New_York'
};

export interface MeasuredRow {
	temperature: number | null;
	dewPoint: number | null;
	humidity: number | null;
	wind: number | null;
	gust: number | null;
	rain: number | null;
}

const number = (text: string | undefined): number | null =>
	text === undefined || text === '' ? null : Number(text);

/** Rows by UTC epoch seconds; the row flagged for its impossible wind is left out. */
export function measuredRows(): Map<number, MeasuredRow> {
	const [head, ...lines] = readFileSync(MEASURED_FILE, 'utf8').trim().split('\n');
	const names = (head ?? '').split(',');
	const rows = new Map<number, MeasuredRow>();
	for (const line of lines) {
		const cells = line.split(',');
		const cell = (name: string): number | null => number(cells[names.indexOf(name)]);
		if ((cell('wind_ms') ?? 0) > 90) continue;
		rows.set(Date.parse(cells[0] ?? '') / 1000, {
			temperature: cell('temp_c'),
			dewPoint: cell('dew_c'),
			humidity: cell('rh_pct'),
			wind: cell('wind_ms'),
			gust: cell('gust_ms'),
			rain: cell('precip_mm')
		});
	}
	return rows;
}

/** Whether the sun is up, by an independent library. */
export function sunIsUp(epochSeconds: number): boolean {
	const date = new Date(epochSeconds * 1000);
	const t = century(date);
	const rad = Math.PI / 180;
	const minutes = (date.getTime() / 60_000) % 1440;
	const hourAngle = ((minutes + equationOfTime(t)) / 4 - 180 + AIRPORT.longitude) * rad;
	const [phi, delta] = [AIRPORT.latitude * rad, declination(t) * rad];
	const sine =
		Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * Math.cos(hourAngle);
	return Math.asin(sine) > -0.833 * rad;
}
