import { z } from 'zod';
import { SHELTERS } from '../../engine';

/** What a yard can put over a face: every shelter but the open sky. */
export const STOCKED_SHELTERS = SHELTERS.filter((name) => name !== 'open');

/** Shelters of one kind that the yard has, and how many. */
export const shelterStockSchema = z.strictObject({
	kind: z.enum(SHELTERS).exclude(['open']),
	name: z
		.string()
		.trim()
		.min(1, 'Say which, like “6 m tent”.')
		.max(60, 'Use at most 60 characters.'),
	count: z.int().min(1).max(200)
});
export type ShelterStock = z.infer<typeof shelterStockSchema>;
