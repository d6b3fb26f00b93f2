import { once } from 'node:events';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import { FaultBox, faultsSchema, type Fault } from './faults';
import { etagOf, Objects } from './objects';

export type { Fault } from './faults';

export interface StorageFakeOptions {
	/** 0 or left out: any free port. Always on loopback. */
	port?: number;
	/** The one bucket there is. */
	bucket: string;
	/** Requests not signed under it are denied. */
	accessKeyId: string;
	faults?: Fault[];
}

export interface StorageFake {
	url: string;
	setFaults(faults: Fault[]): void;
	/** Keys of what is kept, in order, and how many uploads in parts were begun and not ended. */
	state(): { keys: string[]; unfinished: number };
	close(): Promise<void>;
}

const MOST_BYTES = 64 * 1024 * 1024;
const changeSchema = z.strictObject({ faults: faultsSchema });

async function bodyOf(request: IncomingMessage): Promise<Buffer> {
	const chunks: Buffer[] = [];
	let bytes = 0;
	for await (const chunk of request as AsyncIterable<Buffer>) {
		bytes += chunk.byteLength;
		if (bytes > MOST_BYTES) throw new Error(`The fake keeps at most ${MOST_BYTES} bytes of one.`);
		chunks.push(chunk);
	}
	return Buffer.concat(chunks);
}

function xml(response: ServerResponse, status: number, body: string): void {
	response.writeHead(status, { 'content-type': 'application/xml' });
	response.end(`<?xml version="1.0" encoding="UTF-8"?>\n${body}`);
}
const refuse = (response: ServerResponse, status: number, code: string): void =>
	xml(response, status, `<Error><Code>${code}</Code><Message>${code}</Message></Error>`);

/** Starts a server on loopback that speaks as S3 does, so far as the product asks it. */
export async function startStorageFake(options: StorageFakeOptions): Promise<StorageFake> {
	const objects = new Objects();
	const faults = new FaultBox();
	faults.set(options.faults ?? []);
	const state = () => ({ keys: objects.keys(), unfinished: objects.unfinished() });

	async function control(request: IncomingMessage, response: ServerResponse): Promise<void> {
		if (request.method === 'POST')
			faults.set(changeSchema.parse(JSON.parse((await bodyOf(request)).toString())).faults);
		response.writeHead(200, { 'content-type': 'application/json; charset=utf-8' });
		response.end(JSON.stringify({ ...state(), faults: faults.list() }));
	}

	async function get(request: IncomingMessage, response: ServerResponse, path: string) {
		const whole = objects.get(path);
		if (whole === undefined) return refuse(response, 404, 'NoSuchKey');
		const asked = /^bytes=(\d+)-(\d+)$/.exec(request.headers.range ?? '');
		const first = Number(asked?.[1] ?? 0);
		const last = Math.min(Number(asked?.[2] ?? whole.length), whole.length - 1);
		if (first >= whole.length && whole.length > 0) return refuse(response, 416, 'InvalidRange');
		const bytes = whole.subarray(first, last + 1);
		response.writeHead(asked === null ? 200 : 206, {
			etag: etagOf(whole),
			'content-length': bytes.length,
			...(asked === null ? {} : { 'content-range': `bytes ${first}-${last}/${whole.length}` })
		});
		if (request.method === 'HEAD') return void response.end();
		if (faults.take('brokenOff') === undefined) return void response.end(bytes);
		response.write(bytes.subarray(0, bytes.length / 2));
		await pause(20);
		response.destroy();
	}

	async function put(request: IncomingMessage, response: ServerResponse, path: string, url: URL) {
		const bytes = await bodyOf(request);
		const upload = url.searchParams.get('uploadId');
		const number = Number(url.searchParams.get('partNumber') ?? 0);
		if (upload === null) objects.put(path, bytes);
		else if (number > 1 && faults.take('laterPartsRefused') !== undefined)
			return refuse(response, 400, 'InvalidRequest');
		else if (!objects.part(upload, number, bytes)) return refuse(response, 404, 'NoSuchUpload');
		response.writeHead(200, { etag: etagOf(bytes) });
		response.end();
	}

	async function post(request: IncomingMessage, response: ServerResponse, path: string, url: URL) {
		await bodyOf(request);
		const named = `<Bucket>${options.bucket}</Bucket><Key>${path}</Key>`;
		const upload = url.searchParams.get('uploadId');
		if (upload === null) {
			const id = `<UploadId>${objects.begin(path)}</UploadId>`;
			const body = `${named}${id}`;
			xml(response, 200, `<InitiateMultipartUploadResult>${body}</InitiateMultipartUploadResult>`);
		} else if (objects.complete(upload)) {
			const body = `${named}<ETag>${etagOf(objects.get(path) ?? Buffer.alloc(0))}</ETag>`;
			xml(response, 200, `<CompleteMultipartUploadResult>${body}</CompleteMultipartUploadResult>`);
		} else refuse(response, 404, 'NoSuchUpload');
	}

	async function handle(request: IncomingMessage, response: ServerResponse): Promise<void> {
		const url = new URL(request.url ?? '/', 'http://127.0.0.1');
		if (url.pathname === '/_control') return control(request, response);
		const delay = faults.take('delay');
		if (delay !== undefined) await pause(delay.milliseconds);
		const broken = faults.take('serverError');
		if (broken !== undefined) return refuse(response, broken.status, 'SlowDown');
		const signed = `AWS4-HMAC-SHA256 Credential=${options.accessKeyId}/`;
		const known = (request.headers.authorization ?? '').startsWith(signed);
		if (!known || faults.take('denied') !== undefined) return refuse(response, 403, 'AccessDenied');
		const [, bucket, ...rest] = decodeURIComponent(url.pathname).split('/');
		const path = rest.join('/');
		if (bucket !== options.bucket) return refuse(response, 404, 'NoSuchBucket');
		switch (request.method ?? '') {
			case 'GET':
			case 'HEAD':
				return get(request, response, path);
			case 'PUT':
				return put(request, response, path, url);
			case 'POST':
				return post(request, response, path, url);
			case 'DELETE': {
				const upload = url.searchParams.get('uploadId');
				if (upload === null) objects.delete(path);
				else objects.abort(upload);
				response.writeHead(204);
				return void response.end();
			}
			default:
				return refuse(response, 405, 'MethodNotAllowed');
		}
	}

	const server = createServer((request, response) => {
		handle(request, response).catch((error: unknown) => {
			if (response.headersSent) response.destroy();
			else refuse(response, 500, error instanceof Error ? error.message : 'InternalError');
		});
	});
	server.listen(options.port ?? 0, '127.0.0.1');
	await once(server, 'listening');
	const address = server.address();
	if (address === null || typeof address === 'string') throw new Error('The fake has no port.');
	return {
		url: `http://127.0.0.1:${address.port}`,
		setFaults: (next) => faults.set(next),
		state,
		close: () =>
			new Promise((resolve, reject) => {
				server.close((error) => (error === undefined ? resolve() : reject(error)));
				server.closeAllConnections();
			})
	};
}

async function main(): Promise<void> {
	const { values } = parseArgs({
		options: {
			port: { type: 'string', default: '4030' },
			bucket: { type: 'string', default: 'yardglass' },
			'access-key-id': { type: 'string', default: 'local' }
		}
	});
	const fake = await startStorageFake({
		port: Number(values.port),
		bucket: values.bucket,
		accessKeyId: values['access-key-id']
	});
	process.stdout.write(`Storage fake with the bucket ${values.bucket} on ${fake.url}\n`);
	for (const signal of ['SIGINT', 'SIGTERM'] as const)
		process.once(signal, () => void fake.close().then(() => process.exit(0)));
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href)
	await main();
