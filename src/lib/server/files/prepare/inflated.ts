import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createInflate } from 'node:zlib';

/** How many bytes may still be unpacked, and until when (UTC epoch milliseconds). */
export interface Allowance {
	bytes: number;
	readonly untilMs: number;
}

/** More was unpacked than is allowed, or it took longer. */
export class TooMuch extends Error {
	override readonly name = 'TooMuch';
}

const SLICE = 64 * 1024;
/** Packed in packed in packed: more layers than any writer of documents makes. */
const MOST_LAYERS = 4;

/** Whether bytes begin as zlib's format does (RFC 1950, section 2.2). */
export const looksDeflated = (bytes: Uint8Array): boolean =>
	bytes.length > 1 && (bytes[0] & 0x8f) === 0x08 && (bytes[0] * 256 + bytes[1]) % 31 === 0;

function* slices(bytes: Uint8Array): Generator<Uint8Array> {
	for (let at = 0; at < bytes.length; at += SLICE) yield bytes.subarray(at, at + SLICE);
}

/** A chunk and what an iterator still has, which stays open when its reader stops early. */
async function* following(
	first: Uint8Array,
	rest: AsyncIterator<Uint8Array>
): AsyncGenerator<Uint8Array> {
	yield first;
	for (let next = await rest.next(); next.done !== true; next = await rest.next()) yield next.value;
}

/**
 * Unpacks a stream, throwing away what comes of it, and takes it off the allowance; what comes
 * packed once more is unpacked in turn. In memory is a slice for each layer.
 *
 * @returns how many bytes were of the packed stream; 0 where they are none, or it is broken
 * @throws {TooMuch} once the allowance is used up
 */
export async function unpack(
	source: Iterable<Uint8Array> | AsyncIterable<Uint8Array>,
	allowance: Allowance,
	depth = 1
): Promise<number> {
	if (depth > MOST_LAYERS) throw new TooMuch();
	const inflate = createInflate({ chunkSize: SLICE });
	// What goes wrong in it is met where the chunks are read.
	const fed = pipeline(Readable.from(source), inflate).catch(() => undefined);
	const chunks = counted(inflate, allowance);
	try {
		const first = await chunks.next();
		if (first.done !== true && looksDeflated(first.value))
			await unpack(following(first.value, chunks), allowance, depth + 1);
		while ((await chunks.next()).done !== true);
		return inflate.bytesWritten;
	} catch (error) {
		if (error instanceof TooMuch) throw error;
		return 0;
	} finally {
		inflate.destroy();
		await fed;
	}
}

async function* counted(
	source: AsyncIterable<Uint8Array>,
	allowance: Allowance
): AsyncGenerator<Uint8Array> {
	for await (const chunk of source) {
		allowance.bytes -= chunk.length;
		if (allowance.bytes < 0 || Date.now() > allowance.untilMs) throw new TooMuch();
		yield chunk;
	}
}

/** Unpacks the packed stream that begins these bytes; see {@link unpack}. */
export const unpackBytes = (bytes: Uint8Array, allowance: Allowance): Promise<number> =>
	unpack(slices(bytes), allowance);
