import { and, count, eq } from 'drizzle-orm';
import type { BoatDocument, FacePatch, NewFace } from '../../api/boat';
import { FACE_ORIENTATIONS } from '../../engine';
import { changeRow } from '../db/changeRow';
import type { Database } from '../db/client';
import { faces, stepFaces, type FaceRow } from '../db/schema';
import { faceWords } from '../outlook/engineInput';
import type { BoatResult } from './editBoat';

/** Faces of a boat that the caller has made sure is the member's to change. */

export const faceDocument = (row: FaceRow): BoatDocument['faces'][number] => ({
	id: row.id,
	name: row.name,
	side: row.side,
	tilt: row.tilt,
	bearing: row.bearing,
	material: row.material,
	finish: row.finish,
	solarAbsorptance: row.solarAbsorptance,
	emissivity: row.emissivity,
	area: row.area,
	revision: row.revision
});

const has = (name: string): { why: string } => ({ why: `The boat has ${name} already.` });

/** Adds a face; its id, or why not. Tilt and bearing are those of its kind where none are given. */
export async function addFace(
	db: Database,
	boatId: string,
	{ tilt, bearing, ...face }: NewFace
): Promise<{ id: string } | { why: string }> {
	const kind = FACE_ORIENTATIONS[face.name];
	const [row] = await db
		.insert(faces)
		.values({
			...face,
			boatId,
			tilt: tilt ?? kind.tilt,
			bearing:
				bearing === undefined ? (kind.bearing === null ? null : kind.bearing[face.side]) : bearing,
			bothSides: kind.bothSides
		})
		.onConflictDoNothing()
		.returning({ id: faces.id });
	return row ?? has(faceWords(face));
}

const ofBoat = (boatId: string, id: string) => and(eq(faces.boatId, boatId), eq(faces.id, id));

/** Changes a face as its reader saw it. */
export async function changeFace(
	db: Database,
	boatId: string,
	id: string,
	{ revision, ...values }: FacePatch
): Promise<BoatResult> {
	const [row] = await db.select().from(faces).where(ofBoat(boatId, id));
	if (row === undefined) return { outcome: 'gone' };
	const { name, side } = { ...row, ...values };
	if (name !== row.name || side !== row.side) {
		const same = and(eq(faces.boatId, boatId), eq(faces.name, name), eq(faces.side, side));
		const [other] = await db.select({ id: faces.id }).from(faces).where(same);
		if (other !== undefined)
			return { outcome: 'refused', field: null, ...has(faceWords({ name, side })) };
	}
	return changeRow(db, faces, id, revision, values);
}

/** Takes a face away; where steps are queued on it the question comes back unless it is settled. */
export async function removeFace(
	db: Database,
	boatId: string,
	id: string,
	revision: number,
	settled: boolean
): Promise<BoatResult> {
	const [row] = await db.select().from(faces).where(ofBoat(boatId, id));
	if (row === undefined) return { outcome: 'gone' };
	const [{ on }] = await db.select({ on: count() }).from(stepFaces).where(eq(stepFaces.faceId, id));
	if (on > 0 && !settled)
		return {
			outcome: 'asks',
			why: `${on === 1 ? 'One step is' : `${on} steps are`} on the ${faceWords(row)}. Taken away, it is no longer a face of ${on === 1 ? 'that' : 'those'}, and a step without a face has no hours.`
		};
	return db.transaction(async (tx) => {
		const seen = await changeRow(tx, faces, id, revision, { name: row.name });
		if (seen.outcome === 'changed') await tx.delete(faces).where(ofBoat(boatId, id));
		return seen;
	});
}
