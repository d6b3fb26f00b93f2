import { resolve } from 'node:path';
import { z } from 'zod';

/** What the files people upload need from the configuration, as environment variables name it. */
export const filesConfigSchema = z.object({
	/** Where files are kept: in a folder of this machine, or in an S3-compatible store. */
	FILES_STORAGE: z.enum(['disk', 's3'], { error: 'is neither disk nor s3' }).default('disk'),
	/** Kept files on disk; of either storage, what is being received. Web and worker share it. */
	FILES_FOLDER: z
		.string()
		.default('data/files')
		.transform((folder) => resolve(folder)),
	/** Left out: the address of the region at Amazon. */
	S3_ENDPOINT: z
		.url({ protocol: /^https?$/, error: 'is not an address like https://storage.example' })
		.optional(),
	S3_REGION: z.string().default('us-east-1'),
	S3_BUCKET: z.string().optional(),
	S3_ACCESS_KEY_ID: z.string().optional(),
	S3_SECRET_ACCESS_KEY: z.string().optional(),
	/** Whether the bucket stands in the path (most own servers) or in the host name (Amazon). */
	S3_PATH_STYLE: z.stringbool().default(true)
});
export type FilesConfig = z.infer<typeof filesConfigSchema>;
