import { join } from 'node:path';
import sharp, { type Sharp } from 'sharp';
import { MOST_PIXELS, THUMBNAIL_SIDES, type FileSize } from '../../../api/files';
import type { FileRow } from '../../db/schema';
import type { Received } from '../receive/receive';
import { FileRefused } from '../refusal';
import { Turns } from '../turns';
import { sha256Of } from './hash';
import type { Prepared } from './prepared';

/** A picture takes up to four bytes for each of its pixels while it is turned upright. */
const decoding = new Turns(2);
/** One thread for each: the turns bound how many cores are taken. */
sharp.concurrency(1);
sharp.cache(false);
const MOST_SECONDS = 60;

const millions = (pixels: number): number => Math.round(pixels / 1_000_000);
const broken = (named: string): FileRefused =>
	new FileRefused(400, `${named} is broken or cut off: the picture in it cannot be read.`);

/** Width and height from the header; nothing is decoded for it. */
async function checkHeader(path: string, named: string): Promise<void> {
	const header = await sharp(path, { limitInputPixels: false })
		.metadata()
		.catch(() => {
			throw broken(named);
		});
	const { width, height, pages = 1 } = header;
	if (width * height > MOST_PIXELS)
		throw new FileRefused(
			413,
			`${named} has ${millions(width * height)} megapixels (${width} × ${height}); at most ${millions(MOST_PIXELS)} are taken. Save it smaller and send that.`
		);
	if (pages > 1)
		throw new FileRefused(415, `${named} holds ${pages} pictures; send one that does not move.`);
}

/** As what a picture is kept, and how it is written. */
const WRITTEN: Readonly<
	Record<
		Exclude<Received['type'], 'pdf'>,
		readonly [FileRow['mediaType'], (picture: Sharp) => Sharp]
	>
> = {
	jpeg: ['image/jpeg', (picture) => picture.jpeg({ quality: 90 })],
	png: ['image/png', (picture) => picture.png()],
	webp: ['image/webp', (picture) => picture.webp({ quality: 90 })],
	heif: ['image/webp', (picture) => picture.webp({ quality: 90 })]
};

/**
 * Writes a picture anew, upright and with nothing in it but its pixels (so not where it was
 * taken), and its smaller copies beside it.
 *
 * @throws {FileRefused} for too many pixels, several pictures in one, or one that cannot be read
 */
export async function preparePicture(
	{ path, type }: Received & { type: Exclude<Received['type'], 'pdf'> },
	folder: string,
	named: string
): Promise<Prepared> {
	await checkHeader(path, named);
	const [mediaType, write] = WRITTEN[type];
	const open = (): Sharp =>
		sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error', sequentialRead: true })
			.autoOrient()
			.timeout({ seconds: MOST_SECONDS });
	const at = (size: FileSize): string => join(folder, size);
	return decoding.run(async () => {
		try {
			const { width, height, size: bytes } = await write(open()).toFile(at('original'));
			const sizes: FileSize[] = [];
			for (const side of THUMBNAIL_SIDES) {
				const size = `${side}` as const;
				await open()
					.resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true })
					.webp({ quality: 80 })
					.toFile(at(size));
				sizes.push(size);
			}
			return {
				mediaType,
				bytes,
				sha256: await sha256Of(at('original')),
				width,
				height,
				// The original last: where it is kept, all of it is.
				sizes: [...sizes, 'original' as const].map((size) => ({ size, path: at(size) }))
			};
		} catch {
			throw broken(named);
		}
	});
}
