import { z } from 'zod';

/** A least and a most, each optional, the least not above the most. */
export const orderedSchema = (least: number, most: number) =>
	z
		.strictObject({
			min: z.number().min(least).max(most).optional(),
			max: z.number().min(least).max(most).optional()
		})
		.superRefine(({ min, max }, context) => {
			if (min === undefined || max === undefined || min <= max) return;
			context.addIssue({
				code: 'custom',
				message: `the least, ${min}, is above the most, ${max}`,
				params: { code: 'leastOverMost', found: min, against: max }
			});
		});
