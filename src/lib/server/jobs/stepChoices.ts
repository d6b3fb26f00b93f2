import { and, asc, desc, eq } from 'drizzle-orm';
import { TASKS } from '../../engine';
import { mayDo, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { faces, sheets } from '../db/schema';
import { faceWords } from '../outlook/engineInput';
import { workersOf } from './stepEdit';
import { isYardOnly } from './stepState';

/** What can be chosen for a step of a boat: the newest version of each sheet, and the one it has. */
export async function stepChoices(
	db: Database,
	membership: Membership,
	boatId: string,
	sheetId: string | null
) {
	const [newest, [own], ofBoat, workers] = await Promise.all([
		db
			.selectDistinctOn([sheets.key], {
				id: sheets.id,
				name: sheets.name,
				version: sheets.version
			})
			.from(sheets)
			.where(eq(sheets.yardId, membership.yard.id))
			.orderBy(asc(sheets.key), desc(sheets.version)),
		sheetId === null
			? []
			: db
					.select({ id: sheets.id, name: sheets.name, version: sheets.version })
					.from(sheets)
					.where(and(eq(sheets.id, sheetId), eq(sheets.yardId, membership.yard.id))),
		db
			.select()
			.from(faces)
			.where(eq(faces.boatId, boatId))
			.orderBy(asc(faces.name), asc(faces.side)),
		workersOf(db, membership, boatId)
	]);
	const isOld = own !== undefined && !newest.some(({ id }) => id === own.id);
	return {
		sheets: [...newest, ...(isOld ? [own] : [])]
			.sort((a, b) => a.name.localeCompare(b.name))
			.map(({ id, name, version }) => ({ id, words: `${name}, version ${version}` })),
		faces: ofBoat.map((face) => ({ id: face.id, words: faceWords(face) })),
		people: workers.map(({ id, name, role }) => ({ id, words: `${name}, ${role}` })),
		tasks: TASKS.map(({ code }) => code).filter(
			(code) => !isYardOnly(code) || mayDo(membership.role, 'yardWork')
		)
	};
}
