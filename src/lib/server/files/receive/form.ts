import { once } from 'node:events';
import type { Readable } from 'node:stream';
import { Busboy, type BusboyHeaders } from '@fastify/busboy';
import { MOST_FILE_BYTES } from '../../../api/files';
import { sentBytes } from '../../http/sentBody';

/** How many files one form may hold. */
export const MOST_AT_ONCE = 20;
const LIMITS = { fields: 20, fieldSize: 4_000, parts: MOST_AT_ONCE + 20, headerPairs: 50 };
/** Of the whole form; a part that is refused is read over, and so counts. */
const MOST_FORM_BYTES = 5 * MOST_FILE_BYTES;

/** One file of a form; `fields` are those that stand before it. */
export interface FormFile {
	readonly name: string;
	readonly fields: ReadonlyMap<string, string>;
	readonly bytes: AsyncIterable<Uint8Array>;
}

/** How reading a form ended: with all of it read, or in its middle. */
export type FormEnd = 'read' | 'stopped' | 'too large' | 'too many' | 'no such form';

/** A parser for a form of this type; null where the type says no boundary. */
function parserOf(type: string) {
	try {
		return new Busboy({
			headers: { 'content-type': type } as BusboyHeaders,
			limits: { ...LIMITS, files: MOST_AT_ONCE }
		});
	} catch {
		return null;
	}
}

/**
 * Reads a form with files as it comes, one file after the other; no file is held in memory.
 *
 * @param take - given each file, reads what it wants of it; `false` stops the reading there
 * @throws what `take` throws, and what breaks the connection
 */
export async function readFormFiles(
	request: Request,
	take: (file: FormFile) => Promise<boolean>
): Promise<FormEnd> {
	const type = request.headers.get('content-type') ?? '';
	if (request.body === null || !/^multipart\/form-data;/i.test(type)) return 'no such form';
	const boy = parserOf(type);
	if (boy === null) return 'no such form';
	const fields = new Map<string, string>();
	let end: FormEnd = 'read';
	let failure: unknown = null;
	let current: Readable | null = null;
	let stop = (): void => undefined;
	const stopped = new Promise<void>((resolve) => (stop = resolve));
	let work: Promise<void> = Promise.resolve();
	boy.on('field', (name: string, value: string) => fields.set(name, value));
	boy.on('filesLimit', () => {
		end = 'too many';
		stop();
	});
	boy.on('file', (_: string, stream: Readable, name: string | undefined) => {
		current = stream;
		// Met where its bytes are read.
		stream.on('error', () => undefined);
		work = work.then(async () => {
			try {
				const bytes = stream.iterator({ destroyOnReturn: false }) as AsyncIterable<Uint8Array>;
				// A field of files that none was chosen for.
				const goOn = (name ?? '') === '' || (await take({ name: name ?? '', fields, bytes }));
				if (!goOn) {
					end = 'stopped';
					stop();
				}
			} catch (error) {
				failure ??= error;
				stop();
			} finally {
				stream.resume();
			}
		});
	});
	const finished = once(boy, 'finish').then(
		() => undefined,
		(error: unknown) => {
			failure ??= error;
			stop();
		}
	);
	try {
		await feed(boy, request.body, stopped, () => {
			end = 'too large';
			stop();
		});
	} catch (error) {
		failure ??= error;
		stop();
	}
	const reachedEnd = await Promise.race([finished.then(() => true), stopped.then(() => false)]);
	// What will not come any more must not be waited for.
	if (!reachedEnd) (current as Readable | null)?.destroy(new Error('The form was not read on.'));
	await work;
	if (failure !== null) throw failure;
	return end;
}

/** Gives the parser what comes, no faster than it takes it, until it ends or is stopped. */
async function feed(
	boy: NonNullable<ReturnType<typeof parserOf>>,
	body: ReadableStream<Uint8Array>,
	stopped: Promise<void>,
	tooLarge: () => void
): Promise<void> {
	let isStopped = false;
	void stopped.then(() => (isStopped = true));
	let bytes = 0;
	for await (const chunk of sentBytes(body)) {
		bytes += chunk.byteLength;
		if (bytes > MOST_FORM_BYTES) tooLarge();
		if (!boy.write(chunk)) await Promise.race([once(boy, 'drain'), stopped]);
		if (isStopped) return;
	}
	boy.end();
}
