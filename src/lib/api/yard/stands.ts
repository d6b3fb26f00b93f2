import { z } from 'zod';
import { leeSchema } from '../../engine';

const metres = z.number().min(0).max(3_000);

/** A stand as its yard's managers set it. Metres from the plan's lower left corner; null: not drawn yet. */
export const standSettingsSchema = z.strictObject({
	name: z.string().trim().min(1, 'Give the stand a name.').max(20, 'Use at most 20 characters.'),
	x: metres.nullable(),
	y: metres.nullable(),
	/** What breaks the wind there, by the direction it comes from. */
	lee: leeSchema
});
export type StandSettings = z.infer<typeof standSettingsSchema>;

export const standPatchSchema = standSettingsSchema.partial().extend({ revision: z.int().min(1) });
export type StandPatch = z.infer<typeof standPatchSchema>;

export const newStandSchema = standSettingsSchema.partial({ x: true, y: true, lee: true });
export type NewStand = z.infer<typeof newStandSchema>;

export const standSchema = standSettingsSchema.extend({ id: z.uuid(), revision: z.int() });
export type Stand = z.infer<typeof standSchema>;
export const standListSchema = z.object({ stands: z.array(standSchema) });

/** Where a boat is put, and how it heads there, degrees from north clockwise. */
export const moveSchema = z.strictObject({
	standId: z.uuid().nullable(),
	heading: z.number().min(0).max(360),
	revision: z.int().min(1)
});
export type Move = z.infer<typeof moveSchema>;
