import { Readable } from 'node:stream';
import type { FileSize } from '../../api/files';
import type { FileRow } from '../db/schema';
import { keyOf } from './keys';
import type { ByteRange, FileStorage } from './storage/storage';

/** Whatever a file holds, nothing of it runs under this address. */
const HELD = {
	'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox",
	'x-content-type-options': 'nosniff',
	'cross-origin-resource-policy': 'same-origin',
	// Kept by the browser and asked about each time: who may not see it any more does not.
	'cache-control': 'private, no-cache'
} as const;

/**
 * The one range of bytes that a header asks for; null where it asks for none that is understood,
 * `outside` where it lies beyond the end (RFC 9110, section 14).
 */
export function rangeOf(header: string | null, bytes: number): ByteRange | 'outside' | null {
	const asked = /^bytes=(\d*)-(\d*)$/.exec(header ?? '');
	if (asked === null || (asked[1] === '' && asked[2] === '')) return null;
	if (asked[1] === '') {
		const length = Math.min(Number(asked[2]), bytes);
		return length === 0 ? 'outside' : { first: bytes - length, last: bytes - 1 };
	}
	const first = Number(asked[1]);
	const last = asked[2] === '' ? bytes - 1 : Math.min(Number(asked[2]), bytes - 1);
	if (asked[2] !== '' && Number(asked[2]) < first) return null;
	return first >= bytes ? 'outside' : { first, last };
}

/** `filename*` keeps every letter (RFC 8187); a PDF is saved, not opened in the page. */
function disposition({ name, mediaType }: FileRow): string {
	const encoded = encodeURIComponent(name).replaceAll(
		/['()*]/g,
		(sign) => `%${sign.charCodeAt(0).toString(16)}`
	);
	const kind = mediaType === 'application/pdf' ? 'attachment' : 'inline';
	return `${kind}; filename*=UTF-8''${encoded}`;
}

/**
 * Answers with a size of a file that the asker may see, or with 304 or a part of it as the request
 * wants. Null where there is no such size.
 */
export async function serveFile(
	storage: FileStorage,
	file: FileRow,
	size: FileSize,
	request: Request
): Promise<Response | null> {
	if (file.kind === 'pdf' && size !== 'original') return null;
	const etag = `"${file.sha256}-${size}"`;
	const common = { ...HELD, etag };
	const known = request.headers.get('if-none-match')?.split(/\s*,\s*/) ?? [];
	if (known.some((it) => it.replace(/^W\//, '') === etag))
		return new Response(null, { status: 304, headers: common });
	const ifRange = request.headers.get('if-range');
	const takesRange = size === 'original' && (ifRange === null || ifRange === etag);
	const range = takesRange ? rangeOf(request.headers.get('range'), file.bytes) : null;
	if (range === 'outside')
		return new Response(null, {
			status: 416,
			headers: { ...common, 'content-range': `bytes */${file.bytes}` }
		});
	const stored = await storage.get(keyOf(file, size), range ?? undefined);
	if (stored === null) return null;
	const { stream, bytes } = stored;
	return new Response(Readable.toWeb(stream) as ReadableStream, {
		status: range === null ? 200 : 206,
		headers: {
			...common,
			'content-type': size === 'original' ? file.mediaType : 'image/webp',
			'content-disposition': disposition(file),
			'content-length': String(range === null ? bytes : range.last - range.first + 1),
			...(size === 'original' ? { 'accept-ranges': 'bytes' } : {}),
			...(range === null ? {} : { 'content-range': `bytes ${range.first}-${range.last}/${bytes}` })
		}
	});
}
