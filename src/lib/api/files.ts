import { z } from 'zod';

/** Files of a boat: photos and PDFs. */

export const FILE_KINDS = ['photo', 'pdf', 'plan'] as const;
/** What is kept; whatever else a picture was sent as becomes one of these. */
export const FILE_MEDIA_TYPES = [
	'image/jpeg',
	'image/png',
	'image/webp',
	'application/pdf'
] as const;
/** Longest sides of a picture's smaller copies, pixels. */
export const THUMBNAIL_SIDES = [320, 1280] as const;
export const FILE_SIZES = ['320', '1280', 'original'] as const;
export type FileSize = (typeof FILE_SIZES)[number];

const MEGABYTE = 1_000_000;
/** The most bytes that may be sent, by what it is. */
export const MOST_BYTES = { picture: 30 * MEGABYTE, pdf: 20 * MEGABYTE } as const;
/** Of either. */
export const MOST_FILE_BYTES = Math.max(...Object.values(MOST_BYTES));
export const MOST_PIXELS = 64_000_000;
export const MOST_CAPTION = 200;

export const fileSchema = z.object({
	id: z.uuid(),
	kind: z.enum(FILE_KINDS),
	mediaType: z.enum(FILE_MEDIA_TYPES),
	/** Of what is kept. A picture is written anew without where and with what it was taken. */
	bytes: z.int(),
	sha256: z.string(),
	/** Pixels; null for a PDF. */
	width: z.int().nullable(),
	height: z.int().nullable(),
	name: z.string(),
	caption: z.string(),
	/** Null once the person has gone. */
	uploadedBy: z.string().nullable(),
	uploadedAt: z.iso.datetime(),
	/** Whether whoever asks may delete it. */
	mayDelete: z.boolean(),
	/** Where each size is read; a PDF has its original alone. */
	addresses: z.partialRecord(z.enum(FILE_SIZES), z.string())
});
export type File = z.infer<typeof fileSchema>;

export const filesSchema = z.object({ files: z.array(fileSchema) });

/** What goes with the bytes of a file, in the address. */
export const newFileQuerySchema = z.object({
	/** Made by who sends: the same one again sends the same file again and makes no second. */
	id: z.uuid({ error: 'is no UUID; make one for each file' }),
	name: z.string().max(400, 'has more than 400 characters').default(''),
	caption: z
		.string()
		.trim()
		.max(MOST_CAPTION, `has more than ${MOST_CAPTION} characters`)
		.default('')
});
