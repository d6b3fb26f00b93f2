import { createHash } from 'node:crypto';
import { open } from 'node:fs/promises';
import { MOST_BYTES } from '../../../api/files';
import { FileRefused } from '../refusal';
import { sniff, SNIFFED_BYTES, type SentType } from './sniff';

/** A file as it came, on disk. */
export interface Received {
	readonly path: string;
	readonly type: SentType;
	readonly bytes: number;
	readonly sha256: string;
}

const megabytes = (bytes: number): string => `${Math.floor(bytes / 1_000_000)} MB`;

/** The refusal of something larger than it may be. */
export const tooLarge = (named: string, type: SentType): FileRefused =>
	type === 'pdf'
		? new FileRefused(
				413,
				`${named} is larger than ${megabytes(MOST_BYTES.pdf)}, the most a PDF may have. Nothing of it was kept.`
			)
		: new FileRefused(
				413,
				`${named} is larger than ${megabytes(MOST_BYTES.picture)}, the most a photo may have. Nothing of it was kept.`
			);

/**
 * Writes bytes to a new file as they come, judging them by the first of them. In memory there is
 * one chunk at a time. The caller removes the file, however this ends.
 *
 * @param named - how to speak of it
 * @throws {FileRefused} as soon as it is seen to be of a type not taken, or larger than it may be
 */
export async function receive(
	source: AsyncIterable<Uint8Array>,
	path: string,
	named: string
): Promise<Received> {
	const hash = createHash('sha256');
	const file = await open(path, 'wx');
	try {
		let head = Buffer.alloc(0);
		let type: SentType | null = null;
		let bytes = 0;
		for await (const chunk of source) {
			bytes += chunk.byteLength;
			if (type === null) {
				head = Buffer.concat([head, chunk.subarray(0, SNIFFED_BYTES)]);
				if (head.length >= SNIFFED_BYTES) type = await sniff(head, named);
			}
			if (type !== null && bytes > MOST_BYTES[type === 'pdf' ? 'pdf' : 'picture'])
				throw tooLarge(named, type);
			hash.update(chunk);
			await file.appendFile(chunk);
		}
		if (bytes === 0) throw new FileRefused(400, `${named} is empty.`);
		type ??= await sniff(head, named);
		return { path, type, bytes, sha256: hash.digest('hex') };
	} finally {
		await file.close();
	}
}
