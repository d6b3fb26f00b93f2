import { z } from 'zod';
import { layingMethodSchema } from '../methodWind';
import { orderedSchema } from '../range';

const percent = (most: number) => z.number().min(0).max(most);
const microns = z.number().positive().max(10_000);

/** What one coat leaves on the boat and how far a litre goes, as the sheet states it. */
export const filmSchema = z.strictObject({
	/** Volume solids, %. */
	solids: z.number().positive().max(100).optional(),
	/** µm a coat. */
	dryFilm: microns.optional(),
	/** µm a coat, unthinned. */
	wetFilm: microns.optional(),
	/** m² a litre, before any loss. */
	spreadRate: z.number().positive().max(1000).optional(),
	coats: orderedSchema(1, 20).optional(),
	/** % of the paint that does not end up on the boat, by method. */
	loss: z.partialRecord(layingMethodSchema, percent(90)).optional()
});
export type Film = z.infer<typeof filmSchema>;

export const thinnerSchema = z.strictObject({
	name: z.string().min(1).max(80).optional(),
	/** % of thinner by volume of the mix, least and most. */
	percent: orderedSchema(0, 100)
});
