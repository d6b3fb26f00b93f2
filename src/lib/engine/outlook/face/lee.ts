import { z } from 'zod';
import { inSector } from '../../met/wind';
import type { SlotWeather } from '../weather/slots';

/**
 * What breaks the wind at a stand: hedges, sheds, walls, by the direction the wind comes from.
 */

const direction = (end: 'from' | 'to') =>
	z
		.number({ error: `${end} is a direction in degrees, 0 to 360` })
		.min(0, { error: ({ input }) => `${end} ${String(input)}° is under 0°` })
		.max(360, { error: ({ input }) => `${end} ${String(input)}° is over 360°` });

/** Height of what breaks the wind where none is stated, m: a hedge, a low shed (default, no source). */
const DEFAULT_HEIGHT = 4;

/**
 * A sector from which the wind is broken: degrees it comes from, clockwise from `from` to `to`
 * (0 to 360: all round). `factor` is what is left of the mean, 0 to 1: common practice is 0.4 to
 * 0.6 at two to eight of its heights behind a hedge or a porous screen. `height` of what breaks it,
 * metres above the ground (4 where absent): over that the wind is not broken.
 */
export const leeSectorSchema = z
	.strictObject({
		from: direction('from'),
		to: direction('to'),
		factor: z
			.number({ error: 'factor is what is left of the wind, 0 to 1' })
			.min(0, {
				error: ({ input }) => `factor ${String(input)} is under 0, all of the wind broken`
			})
			.max(1, { error: ({ input }) => `factor ${String(input)} would raise the wind: at most 1` }),
		height: z
			.number({ error: 'height is in metres' })
			.min(0.5, { error: ({ input }) => `height ${String(input)} m is under 0.5 m` })
			.max(60, { error: ({ input }) => `height ${String(input)} m is over 60 m` })
			.optional()
	})
	.superRefine(({ from, to }, context) => {
		if (from !== to) return;
		context.addIssue({
			code: 'custom',
			path: ['to'],
			message: `a sector from ${from}° to ${to}° is none: all round is from 0 to 360`
		});
	});
export type LeeSector = z.infer<typeof leeSectorSchema>;

/** Sectors of a stand; where they overlap the strongest lee counts. */
export const leeSchema = z
	.array(leeSectorSchema)
	.max(36)
	.describe(
		'Sectors from which the wind is broken where the boat stands: degrees it comes from, clockwise; the factor left of the mean wind below the height in metres (4 where absent). The gust keeps its excess over the mean. In an unknown direction the wind at the face is unknown.'
	);

/** A wind with no direction of its own: either in no sector, or in every one. */
export type VariableWind = 'inNone' | 'inAll';

/**
 * Share of the mean left at a height over the ground, per slot, 0 to 1; NaN where the direction is
 * unknown; null where nothing breaks the wind there, whatever way it comes.
 *
 * A variable wind may come from any side, so whoever asks says which is the safe one: limits on the
 * wind take it unbroken, the heat of a face in the strongest lee.
 */
export function leeShares(
	{ windDirection }: Pick<SlotWeather, 'windDirection'>,
	sectors: readonly LeeSector[],
	height: number,
	variable: VariableWind
): Float64Array | null {
	const broken = sectors.filter(
		({ factor, height: top = DEFAULT_HEIGHT }) => factor < 1 && top >= height
	);
	if (broken.length === 0) return null;
	return windDirection.map((from) => {
		if (from !== from) return NaN;
		if (from < 0 && variable === 'inNone') return 1;
		let share = 1;
		for (const sector of broken)
			if (sector.factor < share && inSector(from, sector.from, sector.to)) share = sector.factor;
		return share;
	});
}
