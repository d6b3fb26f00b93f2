import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import { FileRefused } from '../refusal';

/** How many first bytes tell a type. */
export const SNIFFED_BYTES = 4100;

/** What is taken, whatever a name or header says. */
export type SentType = 'jpeg' | 'png' | 'webp' | 'heif' | 'pdf';

/** HEIC is decoded only where the picture library was built with it; AVIF always. */
const READS_HEIC = sharp.format.heif.input.fileSuffix?.includes('.heic') ?? false;
const TYPES: Readonly<Record<string, SentType>> = {
	'image/jpeg': 'jpeg',
	'image/png': 'png',
	'image/webp': 'webp',
	'image/avif': 'heif',
	...(READS_HEIC ? { 'image/heic': 'heif' as const } : {}),
	'application/pdf': 'pdf'
};
const TAKEN = 'Photos (JPEG, PNG, WebP, AVIF) and PDFs are taken.';

const WORDS: Readonly<Record<string, string>> = {
	'application/x-msdownload': 'a program for Windows',
	'application/x-elf': 'a program for Linux',
	'application/x-mach-binary': 'a program for macOS',
	'application/zip': 'a ZIP archive',
	'application/gzip': 'a gzip archive',
	'application/xml': 'an XML file',
	'image/gif': 'a GIF picture, which may move',
	'image/apng': 'a PNG picture that moves',
	'image/heic':
		'an HEIC picture, which cannot be read here: have the phone save or send it as JPEG',
	'image/heic-sequence': 'an HEIC picture that moves'
};

function wordsFor(found: { ext: string; mime: string } | undefined): string {
	if (found === undefined) return 'neither a picture nor a PDF';
	const own = WORDS[found.mime];
	if (own !== undefined) return own;
	const [family] = found.mime.split('/');
	const ext = found.ext.toUpperCase();
	return family === 'video' ? `a video (${ext})` : `a file of another kind (${ext})`;
}

/**
 * What a file is by its first bytes.
 *
 * @param named - how to speak of it
 * @throws {FileRefused} 415 saying what it is, where it is nothing that is taken
 */
export async function sniff(head: Uint8Array, named: string): Promise<SentType> {
	const found = await fileTypeFromBuffer(head);
	const type = found === undefined ? undefined : TYPES[found.mime];
	if (type !== undefined) return type;
	throw new FileRefused(415, `${named} is ${wordsFor(found)}, whatever its name says. ${TAKEN}`);
}
