import { ConfigError } from '../../config';
import type { FilesConfig } from '../config';
import { diskStorage } from './disk';
import type { FileStorage } from './storage';

/** Made when it is first asked: what is not used is not loaded. */
function whenAsked(make: () => Promise<FileStorage>): FileStorage {
	let made: Promise<FileStorage> | null = null;
	const storage = (): Promise<FileStorage> => (made ??= make());
	return {
		put: async (...asked) => (await storage()).put(...asked),
		get: async (...asked) => (await storage()).get(...asked),
		size: async (...asked) => (await storage()).size(...asked),
		delete: async (...asked) => (await storage()).delete(...asked),
		close: () => void made?.then((it) => it.close()).catch(() => undefined)
	};
}

/**
 * The storage that the configuration names.
 *
 * @throws {ConfigError} naming what an S3 store still needs
 */
export function storageOf(config: FilesConfig): FileStorage {
	if (config.FILES_STORAGE === 'disk') return diskStorage(config.FILES_FOLDER);
	const { S3_BUCKET, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = config;
	const needed = { S3_BUCKET, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY };
	const missing = Object.entries(needed)
		.filter(([, value]) => value === undefined)
		.map(([key]) => `${key} is missing`);
	if (
		S3_BUCKET === undefined ||
		S3_ACCESS_KEY_ID === undefined ||
		S3_SECRET_ACCESS_KEY === undefined
	)
		throw new ConfigError(
			`The configuration cannot be used: FILES_STORAGE is s3, and ${missing.join('; ')}.`
		);
	const settings = {
		endpoint: config.S3_ENDPOINT,
		region: config.S3_REGION,
		bucket: S3_BUCKET,
		accessKeyId: S3_ACCESS_KEY_ID,
		secretAccessKey: S3_SECRET_ACCESS_KEY,
		pathStyle: config.S3_PATH_STYLE
	};
	return whenAsked(async () => (await import('./s3')).s3Storage(settings));
}
