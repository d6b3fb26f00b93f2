import { z } from 'zod';
import { hourOfDaySchema } from '../../engine';

/**
 * Times at which a hoist can be booked: on weekdays (1 = Monday … 7) or on one date, in the yard's
 * zone. `tide` says that the water decides them, so that they are typed date by date.
 */
export const launchSlotsSchema = z
	.strictObject({
		days: z.array(z.int().min(1).max(7)).min(1).max(7).optional(),
		date: z.iso.date({ error: 'is not a date like 2026-05-25' }).optional(),
		times: z.array(hourOfDaySchema).min(1, 'needs a time like 09:00').max(24),
		tide: z.boolean()
	})
	.refine(({ days, date }) => (days === undefined) !== (date === undefined), {
		error: 'needs either weekdays or a date',
		path: ['days']
	});
export type LaunchSlots = z.infer<typeof launchSlotsSchema>;

/** What lifts boats. `gust` is where it stops, m/s at 10 m; null: at the yard's lift gust. */
export const hoistSchema = z.strictObject({
	id: z.uuid(),
	name: z.string().trim().min(1, 'Give the hoist a name.').max(60, 'Use at most 60 characters.'),
	gust: z.number().min(3).max(40).nullable(),
	slots: z.array(launchSlotsSchema).max(400)
});
export type Hoist = z.infer<typeof hoistSchema>;
