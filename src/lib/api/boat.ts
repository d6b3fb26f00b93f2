import { z } from 'zod';
import { FACE_NAMES, FINISHES, MATERIALS } from '../engine';

const revision = z.int().min(1);
const date = z.iso.date({ error: 'is not a date like 2026-05-25' }).nullable();

/** What of a boat can be changed. Dates are of the yard's zone; the heading is degrees from north. */
export const boatSettingsSchema = z.strictObject({
	name: z.string().trim().min(1, 'Give the boat a name.').max(80, 'Use at most 80 characters.'),
	/** Whose it is: an owner of the yard; null for nobody's yet. A manager's to say. */
	ownerId: z.uuid().nullable(),
	hauledOn: date,
	launchBy: date,
	/** Where it stands and how it heads there. A manager's to say. */
	standId: z.uuid().nullable(),
	heading: z.number().min(0).max(360),
	/** Painters of the yard who may see and work on it. */
	painterIds: z.array(z.uuid()).max(100)
});
export const boatPatchSchema = boatSettingsSchema.partial().extend({ revision });
export type BoatPatch = z.infer<typeof boatPatchSchema>;

export const FACE_SIDES = ['port', 'starboard', 'both'] as const;

/**
 * A side of a boat. `tilt` in degrees (0 up, 90 upright, 180 down); `bearing` is where it looks from
 * the bow, clockwise, null for one that looks up; `area` in m²; absorptance and emissivity 0 to 1.
 */
export const faceSettingsSchema = z.strictObject({
	name: z.enum(FACE_NAMES),
	side: z.enum(FACE_SIDES),
	tilt: z.number().min(0).max(180),
	bearing: z.number().min(0).max(360).nullable(),
	material: z.enum(MATERIALS),
	finish: z.enum(FINISHES),
	solarAbsorptance: z.number().min(0).max(1),
	emissivity: z.number().min(0).max(1),
	area: z.number().positive().max(5_000).nullable()
});
export type FaceSettings = z.infer<typeof faceSettingsSchema>;
/** A new face; tilt and bearing are those of its kind where they are left out. */
export const newFaceSchema = faceSettingsSchema.partial({ tilt: true, bearing: true, area: true });
export type NewFace = z.infer<typeof newFaceSchema>;
export const facePatchSchema = faceSettingsSchema.partial().extend({ revision });
export type FacePatch = z.infer<typeof facePatchSchema>;

export const boatFaceSchema = faceSettingsSchema.extend({ id: z.uuid(), revision });
export const boatDocumentSchema = boatSettingsSchema.extend({
	id: z.uuid(),
	revision,
	faces: z.array(boatFaceSchema)
});
export type BoatDocument = z.infer<typeof boatDocumentSchema>;

/** Where it stood, latest first; `until` null: it still does. */
export const stayListSchema = z.object({
	stays: z.array(
		z.object({
			id: z.uuid(),
			standName: z.string(),
			heading: z.number(),
			since: z.iso.datetime(),
			until: z.iso.datetime().nullable(),
			personName: z.string().nullable()
		})
	)
});

/** Which row a DELETE means, and that its one question is settled. */
export const removalQuerySchema = z.strictObject({
	revision: z.coerce.number().pipe(revision),
	settled: z.stringbool().default(false)
});
