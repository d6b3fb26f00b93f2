/** One measured hour; null is not measured. Units as in `HourWeather`; pressure at sea level. */
export interface MeasuredHour {
	/** UTC epoch seconds. */
	time: number;
	temperature: number | null;
	dewPoint: number | null;
	relativeHumidity: number | null;
	windDirection: number | null;
	windSpeed: number | null;
	/** Null: none was reported, which is not the same as none. */
	windGust: number | null;
	precipitation: number | null;
	seaLevelPressure: number | null;
}

export interface RefusedRow {
	/** Line of the file, the header being 1. */
	line: number;
	reason: string;
}

const COLUMNS = {
	temp_c: ['temperature', -80, 60],
	dew_c: ['dewPoint', -90, 45],
	rh_pct: ['relativeHumidity', 0, 105],
	wind_dir_deg: ['windDirection', 0, 360],
	wind_ms: ['windSpeed', 0, 90],
	gust_ms: ['windGust', 0, 130],
	precip_mm: ['precipitation', 0, 500],
	pressure_hpa: ['seaLevelPressure', 850, 1090]
} as const satisfies Record<string, readonly [keyof MeasuredHour, number, number]>;

/**
 * Reads measured hours from CSV with a header of the columns above and `utc_time`. A row with a
 * value that no weather has, with a time out of order or with another number of fields is refused
 * whole and told; the others are kept.
 *
 * @throws {Error} when a column is missing
 */
export function readMeasured(csv: string): { hours: MeasuredHour[]; refused: RefusedRow[] } {
	const [header = '', ...rows] = csv.trimEnd().split(/\r?\n/);
	const names = header.split(',');
	for (const needed of ['utc_time', ...Object.keys(COLUMNS)])
		if (!names.includes(needed)) throw new Error(`The file has no column ${needed}.`);

	const hours: MeasuredHour[] = [];
	const refused: RefusedRow[] = [];
	rows.forEach((row, i) => {
		const read = readRow(names, row.split(','));
		const last = hours.at(-1)?.time ?? -Infinity;
		if (typeof read === 'string') refused.push({ line: i + 2, reason: read });
		else if (read.time <= last)
			refused.push({ line: i + 2, reason: 'is not after the row before it' });
		else hours.push(read);
	});
	return { hours, refused };
}

function readRow(names: string[], fields: string[]): MeasuredHour | string {
	if (fields.length !== names.length) return `has ${fields.length} fields, not ${names.length}`;
	const field = (name: string) => fields[names.indexOf(name)] ?? '';
	const time = Date.parse(field('utc_time')) / 1000;
	if (!Number.isInteger(time) || time % 3_600 !== 0) return 'has no whole hour';
	const hour: MeasuredHour = {
		time,
		temperature: null,
		dewPoint: null,
		relativeHumidity: null,
		windDirection: null,
		windSpeed: null,
		windGust: null,
		precipitation: null,
		seaLevelPressure: null
	};
	for (const [column, [name, least, most]] of Object.entries(COLUMNS)) {
		const text = field(column);
		if (text === '') continue;
		const value = Number(text);
		if (!(value >= least && value <= most)) return `${column} is ${text}`;
		hour[name] = value;
	}
	return hour;
}
