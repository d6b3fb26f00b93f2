import { readFile, rename } from 'node:fs/promises';
import { join } from 'node:path';
import type { Received } from '../receive/receive';
import { FileRefused } from '../refusal';
import { Turns } from '../turns';
import { looksDeflated, TooMuch, unpackBytes, type Allowance } from './inflated';
import type { Prepared } from './prepared';

/** Each holds a whole PDF in memory, at most as large as one may be. */
const checking = new Turns(2);
/**
 * A page scanned at 300 dots an inch unpacks to 26 MB; a sheet of a dozen such fits. Default, no
 * source.
 */
const MOST_UNPACKED_BYTES = 400_000_000;
const MOST_MS = 15_000;

/** `stream` and the end of its line begin a stream's bytes (ISO 32000-1, section 7.3.8.1). */
const STREAM = Buffer.from('stream');
const [CR, LF] = [0x0d, 0x0a];

/** Where the bytes of the next stream begin; null after the last. */
function nextStream(pdf: Buffer, from: number): number | null {
	for (let at = pdf.indexOf(STREAM, from); at !== -1; at = pdf.indexOf(STREAM, at + 1)) {
		const end = at + STREAM.length;
		if (pdf[end] === LF) return end + 1;
		if (pdf[end] === CR) return pdf[end + 1] === LF ? end + 2 : end + 1;
	}
	return null;
}

/**
 * Counts what a PDF's packed streams unpack to, whatever its dictionaries say of them: a reader
 * that opens it would do the same. Encrypted streams cannot be looked into.
 *
 * @throws {TooMuch} where it is more than a data sheet can need
 */
async function countUnpacked(pdf: Buffer, allowance: Allowance): Promise<void> {
	let at = nextStream(pdf, 0);
	while (at !== null) {
		const bytes = pdf.subarray(at);
		const used = looksDeflated(bytes) ? await unpackBytes(bytes, allowance) : 0;
		at = nextStream(pdf, at + used);
	}
}

/**
 * A PDF as it came: it is never rendered here. One that would swell absurdly where it is opened is
 * refused.
 *
 * @throws {FileRefused}
 */
export async function preparePdf(
	{ path, bytes, sha256 }: Received,
	folder: string,
	named: string
): Promise<Prepared> {
	await checking.run(async () => {
		const allowance = { bytes: MOST_UNPACKED_BYTES, untilMs: Date.now() + MOST_MS };
		try {
			await countUnpacked(await readFile(path), allowance);
		} catch (error) {
			if (!(error instanceof TooMuch)) throw error;
			throw new FileRefused(
				413,
				`${named} is small but unpacks to more than ${MOST_UNPACKED_BYTES / 1_000_000} MB: no data sheet needs that, and it could stop the device that opens it.`
			);
		}
	});
	const original = join(folder, 'original');
	await rename(path, original);
	return {
		mediaType: 'application/pdf',
		bytes,
		sha256,
		width: null,
		height: null,
		sizes: [{ size: 'original', path: original }]
	};
}
