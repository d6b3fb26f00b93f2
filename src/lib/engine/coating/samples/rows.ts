import type { TimeTable } from '../times';

export const HOUR = 60;
export const DAY = 24 * HOUR;

/** Rows every 5 °C from a first temperature, the times given in a unit of so many minutes. */
export function rowsFrom(
	firstCelsius: number,
	unitMinutes: number,
	...times: readonly number[]
): Exclude<TimeTable, number | null> {
	return times.map((time, i) => [firstCelsius + 5 * i, time * unitMinutes]);
}
