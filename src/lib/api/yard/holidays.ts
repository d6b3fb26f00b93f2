import { z } from 'zod';

/** A date of the yard's zone on which nobody works. */
export const holidaySchema = z.strictObject({
	date: z.iso.date({ error: 'Type the date as year-month-day, like 2026-05-25.' }),
	name: z.string().trim().min(1, 'Say what day it is.').max(60, 'Use at most 60 characters.')
});
export type Holiday = z.infer<typeof holidaySchema>;

export const holidaysSchema = z
	.array(holidaySchema)
	.max(400)
	.refine((list) => new Set(list.map(({ date }) => date)).size === list.length, {
		error: 'names one date twice'
	});
