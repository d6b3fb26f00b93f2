import { HOURLY_VARIABLES, type Forecast, type Hourly } from '../../engine';

const HOUR_SECONDS = 3_600;
/** How far before its issue a forecast is given a history, so that a face's run-in has its day. */
export const HISTORY_SECONDS = 48 * HOUR_SECONDS;

/** What a past hour can be taken from. */
export type EarlierRun = Pick<Forecast, 'issuedAt' | 'hourly'>;

/** Sums, maxima and means of the period that ends at the stamp. */
const PERIOD_VARIABLES = [
	'windGust',
	'precipitation',
	'precipitationProbability',
	'ghi',
	'dni',
	'dhi'
] as const;

/** Hours before the issue that the run does not have, newest last; UTC epoch seconds. */
export function missingHistory({ issuedAt, hourly }: EarlierRun): number[] {
	const known = new Set(hourly.time);
	const latest = Math.floor((issuedAt - 1) / HOUR_SECONDS) * HOUR_SECONDS;
	const missing: number[] = [];
	for (let t = latest - HISTORY_SECONDS + HOUR_SECONDS; t <= latest; t += HOUR_SECONDS)
		if (!known.has(t)) missing.push(t);
	return missing;
}

/** Index of an hour in a run, where it is an hour and not a coarse stretch; −1 otherwise. */
function hourIndex({ time }: Hourly, t: number): number {
	const i = time.indexOf(t);
	// The first stamp has nothing before it; its instants hold, its periods are null or hourly.
	return i > 0 && t - (time[i - 1] ?? 0) !== HOUR_SECONDS ? -1 : i;
}

/**
 * A forecast with the hours before its issue that it lacks, taken from earlier runs; the newest run
 * that has a value wins. Nothing that the forecast itself says is changed, with one exception: at
 * its very first stamp, what belongs to the hour before it and cannot be in the forecast.
 *
 * Only variables that the forecast carries are taken, so that none is half there. Members get the
 * same past as the forecast: in the past there is nothing to spread.
 *
 * @param earlier - any order; hours further back than 48 h before the issue are not taken
 */
export function withHistory(forecast: Forecast, earlier: readonly EarlierRun[]): Forecast {
	const newestFirst = earlier
		.filter((run) => run.issuedAt <= forecast.issuedAt)
		.sort((a, b) => b.issuedAt - a.issuedAt);
	const carried = HOURLY_VARIABLES.filter((name) => forecast.hourly[name] !== undefined);

	const valueAt = (t: number, name: (typeof carried)[number]): number | null => {
		for (const { hourly } of newestFirst) {
			const value = hourly[name]?.[hourIndex(hourly, t)];
			if (value !== undefined && value !== null) return value;
		}
		return null;
	};
	const found = missingHistory(forecast).filter((t) =>
		newestFirst.some(({ hourly }) => hourIndex(hourly, t) >= 0)
	);

	const { time } = forecast.hourly;
	const merged = [...found, ...time].sort((a, b) => a - b);
	const own = new Map(time.map((t, i) => [t, i]));
	const first = time[0];
	const fillsFirst = (t: number, name: string) =>
		t === first && PERIOD_VARIABLES.some((period) => period === name);
	const past = new Map<string, Map<number, number | null>>();
	for (const name of carried) {
		const values = new Map(found.map((t) => [t, valueAt(t, name)]));
		if (first !== undefined && fillsFirst(first, name)) values.set(first, valueAt(first, name));
		past.set(name, values);
	}
	const extend = <S extends Omit<Hourly, 'time'>>(series: S): Omit<Hourly, 'time'> => {
		const extended: Omit<Hourly, 'time'> = {};
		for (const name of carried) {
			const values = series[name];
			if (values === undefined) continue;
			extended[name] = merged.map((t) => {
				const i = own.get(t);
				const said = i === undefined ? null : (values[i] ?? null);
				return said ?? past.get(name)?.get(t) ?? null;
			});
		}
		return extended;
	};
	return {
		issuedAt: forecast.issuedAt,
		hourly: { ...extend(forecast.hourly), time: merged },
		...(forecast.members === undefined ? {} : { members: forecast.members.map(extend) })
	};
}
