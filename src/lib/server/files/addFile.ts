import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { and, eq, sql } from 'drizzle-orm';
import type { Membership } from '../access/roles';
import type { Composition } from '../composition';
import type { Database } from '../db/client';
import { files, keptBlobs, type FileRow } from '../db/schema';
import { keyOf } from './keys';
import { cleanName, shownName } from './names';
import { preparePdf } from './prepare/pdf';
import { preparePicture } from './prepare/picture';
import type { Prepared } from './prepare/prepared';
import { receive, type Received } from './receive/receive';
import { FileRefused } from './refusal';
import type { FileStorage } from './storage/storage';

/** What a file belongs to; whoever calls has made sure that the person may add to it. */
export type FileSubject =
	{ readonly boatId: string } | { readonly sheetId: string } | { readonly standPlan: true };

/** A file on its way: its bytes, and what was said of it. */
export interface SentFile {
	/** Made by who sends it. */
	readonly id: string;
	readonly name: string;
	readonly caption: string;
	readonly bytes: AsyncIterable<Uint8Array>;
}

type Parts = Pick<Composition, 'db' | 'config' | 'storage'>;

/** Where what is being received lies, each in a folder of its own until it is kept or refused. */
export const incomingFolder = (filesFolder: string): string => join(filesFolder, 'incoming');

/**
 * Receives a file and keeps it. Sent again under its id it is not kept twice.
 *
 * @returns the row, and whether it is new
 * @throws {FileRefused} with nothing kept
 */
export async function addFile(
	{ db, config, storage }: Parts,
	{ yard, user }: Membership,
	subject: FileSubject,
	sent: SentFile
): Promise<{ readonly file: FileRow; readonly isNew: boolean }> {
	const folder = join(incomingFolder(config.FILES_FOLDER), randomUUID());
	await mkdir(folder, { recursive: true });
	try {
		const named = shownName(sent.name);
		const received = await receive(sent.bytes, join(folder, 'sent'), named);
		const before = await sentBefore(db, sent.id, subject, received);
		if (before !== null) return { file: before, isNew: false };
		const prepared = await prepare(received, folder, named, subject);
		await keepBytes(db, storage, yard.id, prepared);
		const { mediaType, bytes, sha256, width, height } = prepared;
		const [row] = await db
			.insert(files)
			.values({
				mediaType,
				bytes,
				sha256,
				width,
				height,
				id: sent.id,
				yardId: yard.id,
				...('boatId' in subject ? { boatId: subject.boatId } : {}),
				...('sheetId' in subject ? { sheetId: subject.sheetId } : {}),
				kind: kindOf(subject, prepared),
				sentSha256: received.sha256,
				name: cleanName(sent.name, prepared.mediaType),
				caption: sent.caption,
				uploadedBy: user.id
			})
			.onConflictDoNothing({ target: files.id })
			.returning();
		if (row !== undefined) return { file: row, isNew: true };
		// The same id came twice at once, or stands in a yard that is not to be seen from here.
		const other = await sentBefore(db, sent.id, subject, received);
		if (other === null) throw idTaken();
		return { file: other, isNew: false };
	} finally {
		await rm(folder, { recursive: true, force: true });
	}
}

const idTaken = (): FileRefused =>
	new FileRefused(409, 'Another file has this id already; make a new one for each file.');

async function sentBefore(
	db: Database,
	id: string,
	subject: FileSubject,
	{ sha256 }: Received
): Promise<FileRow | null> {
	const [row] = await db.select().from(files).where(eq(files.id, id));
	if (row === undefined) return null;
	const boatId = 'boatId' in subject ? subject.boatId : null;
	const sheetId = 'sheetId' in subject ? subject.sheetId : null;
	if (row.sentSha256 !== sha256 || row.boatId !== boatId || row.sheetId !== sheetId)
		throw idTaken();
	return row;
}

function prepare(
	received: Received,
	folder: string,
	named: string,
	subject: FileSubject
): Promise<Prepared> {
	const { type } = received;
	if (type !== 'pdf') return preparePicture({ ...received, type }, folder, named);
	if ('standPlan' in subject)
		throw new FileRefused(415, `${named} is a PDF; the stands are laid on a picture.`);
	return preparePdf(received, folder, named);
}

const kindOf = (subject: FileSubject, { mediaType }: Prepared): FileRow['kind'] =>
	'standPlan' in subject ? 'plan' : mediaType === 'application/pdf' ? 'pdf' : 'photo';

/** Notes that the bytes are kept, then puts those that are not there yet. */
async function keepBytes(
	db: Database,
	storage: FileStorage,
	yardId: string,
	{ sha256, bytes, sizes }: Prepared
): Promise<void> {
	const blob = { yardId, sha256 };
	// Waits for a sweep that is deleting the same bytes; they are then put again.
	await db
		.insert(keptBlobs)
		.values(blob)
		.onConflictDoUpdate({
			target: [keptBlobs.yardId, keptBlobs.sha256],
			set: { keptAt: sql`now()` }
		});
	// The original is put last: where it is whole, so are the others.
	if ((await storage.size(keyOf(blob, 'original'))) === bytes) return;
	for (const { size, path } of sizes) await storage.put(keyOf(blob, size), createReadStream(path));
}

/** Takes the row of a file away; its bytes go with the last row of the yard that has them. */
export async function removeFile(db: Database, file: Pick<FileRow, 'id' | 'yardId'>) {
	await db.transaction(async (tx) => {
		await tx.delete(files).where(and(eq(files.id, file.id), eq(files.yardId, file.yardId)));
		await tx.execute(sql`select app_ask_worker('sweepFiles', '{}', 'sweepFiles')`);
	});
}
