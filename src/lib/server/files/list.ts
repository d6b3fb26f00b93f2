import { and, asc, eq, isNull, or } from 'drizzle-orm';
import { FILE_SIZES, type File } from '../../api/files';
import { mayDeleteFile, visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, files, users, type FileRow } from '../db/schema';

/** The files of a boat that its caller has seen to be visible, oldest first. */
export async function filesOfBoat(
	db: Database,
	membership: Membership,
	boatId: string
): Promise<File[]> {
	const rows = await db
		.select({ file: files, by: users.name })
		.from(files)
		.leftJoin(users, eq(users.id, files.uploadedBy))
		.where(and(eq(files.yardId, membership.yard.id), eq(files.boatId, boatId)))
		.orderBy(asc(files.uploadedAt), asc(files.id));
	return rows.map(({ file, by }) => told(membership, file, by));
}

/** A file that a member may see: of a boat they may see, or of the yard's sheets and stands. */
export async function fileOf(
	db: Database,
	membership: Membership,
	id: string
): Promise<{ readonly file: FileRow; readonly by: string | null } | null> {
	const [row] = await db
		.select({ file: files, by: users.name })
		.from(files)
		.leftJoin(boats, eq(boats.id, files.boatId))
		.leftJoin(users, eq(users.id, files.uploadedBy))
		.where(
			and(
				eq(files.id, id),
				eq(files.yardId, membership.yard.id),
				or(isNull(files.boatId), visibleBoats(db, membership))
			)
		);
	return row ?? null;
}

/** A file as it is told to a member. */
export function told(membership: Membership, file: FileRow, by: string | null): File {
	const { id, kind, mediaType, bytes, sha256, width, height, name, caption, uploadedAt } = file;
	const sizes = FILE_SIZES.filter((size) => kind !== 'pdf' || size === 'original');
	return {
		id,
		kind,
		mediaType,
		bytes,
		sha256,
		width,
		height,
		name,
		caption,
		uploadedBy: by,
		uploadedAt: uploadedAt.toISOString(),
		mayDelete: mayDeleteFile(membership, file),
		addresses: Object.fromEntries(
			sizes.map((size) => [size, `/${membership.yard.slug}/files/${id}/${size}`])
		)
	};
}
