import { Readable } from 'node:stream';
import {
	DeleteObjectCommand,
	GetObjectCommand,
	HeadObjectCommand,
	S3Client,
	S3ServiceException
} from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { checkKey, type FileStorage } from './storage';

/** The smallest part that S3 takes; two at most are in memory for each file being put. */
const PART_BYTES = 5 * 1024 * 1024;
const CONNECT_MS = 5_000;
const ANSWER_MS = 30_000;

export interface S3Settings {
	readonly endpoint: string | undefined;
	readonly region: string;
	readonly bucket: string;
	readonly accessKeyId: string;
	readonly secretAccessKey: string;
	readonly pathStyle: boolean;
}

const isMissing = (error: unknown): boolean =>
	error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404;

/** `bytes 0-9/1234` tells the size of the whole. */
const wholeOf = (contentRange: string | undefined): number | null => {
	const found = /\/(\d+)$/.exec(contentRange ?? '');
	return found === null ? null : Number(found[1]);
};

/** Files in a bucket of a store that speaks as S3 does. What fails is tried three times. */
export function s3Storage(settings: S3Settings): FileStorage {
	const { bucket: Bucket } = settings;
	const client = new S3Client({
		region: settings.region,
		credentials: {
			accessKeyId: settings.accessKeyId,
			secretAccessKey: settings.secretAccessKey
		},
		...(settings.endpoint === undefined ? {} : { endpoint: settings.endpoint }),
		forcePathStyle: settings.pathStyle,
		maxAttempts: 3,
		// Other makers' stores do not all know the newer checksums.
		requestChecksumCalculation: 'WHEN_REQUIRED',
		responseChecksumValidation: 'WHEN_REQUIRED',
		requestHandler: { connectionTimeout: CONNECT_MS, requestTimeout: ANSWER_MS }
	});
	return {
		async put(key, source) {
			const upload = new Upload({
				client,
				params: { Bucket, Key: checkKey(key), Body: source },
				partSize: PART_BYTES,
				queueSize: 1,
				leavePartsOnError: false
			});
			await upload.done();
		},
		async get(key, range) {
			const Range = range === undefined ? undefined : `bytes=${range.first}-${range.last}`;
			try {
				const got = await client.send(new GetObjectCommand({ Bucket, Key: checkKey(key), Range }));
				if (!(got.Body instanceof Readable)) throw new Error('The store answered without a body.');
				const bytes = wholeOf(got.ContentRange) ?? got.ContentLength;
				if (bytes === undefined) throw new Error('The store did not say how many bytes there are.');
				return { stream: got.Body, bytes };
			} catch (error) {
				if (isMissing(error)) return null;
				throw error;
			}
		},
		async size(key) {
			try {
				const head = await client.send(new HeadObjectCommand({ Bucket, Key: checkKey(key) }));
				return head.ContentLength ?? null;
			} catch (error) {
				if (isMissing(error)) return null;
				throw error;
			}
		},
		async delete(key) {
			await client.send(new DeleteObjectCommand({ Bucket, Key: checkKey(key) }));
		},
		close: () => client.destroy()
	};
}
