import { z } from 'zod';

const row = z.tuple([z.number().min(-40).max(90), z.number().positive().max(5_256_000)]);

/**
 * A time that depends on the surface temperature: rows of [°C, minutes] strictly increasing in
 * temperature; or one number of minutes at any temperature; or `null`, the tin says there is no
 * limit. An absent time is silent.
 */
export const timeTableSchema = z.union([
	z
		.array(row)
		.min(1)
		.max(60)
		.superRefine((rows, context) => {
			for (let i = 1; i < rows.length; i++) {
				const [before, found] = [rows[i - 1][0], rows[i][0]];
				if (found > before) continue;
				context.addIssue({
					code: 'custom',
					path: [i, 0],
					message: `temperatures must rise from row to row: row ${i + 1} is at ${found} °C and row ${i} at ${before} °C`,
					params: { code: 'notRising', found, against: before }
				});
			}
		}),
	z.number().nonnegative().max(5_256_000),
	z.null()
]);
export type TimeTable = z.infer<typeof timeTableSchema>;

/** Whether a time asks for no wait: the tin sets no limit, or says none is needed. */
export const asksNoWait = (table: TimeTable): table is null | 0 => table === null || table === 0;

/** The times a sheet states, in minutes against surface temperature. */
export const TIME_NAMES = [
	'potLife',
	'induction',
	'dustFree',
	'touchDry',
	'keepDry',
	'dryToSand',
	'overcoatMin',
	'overcoatMax',
	'launchMin',
	'launchMax',
	'coatWithin'
] as const;
export type TimeName = (typeof TIME_NAMES)[number];

export const timesSchema = z.partialRecord(z.enum(TIME_NAMES), timeTableSchema);
export type Times = z.infer<typeof timesSchema>;
