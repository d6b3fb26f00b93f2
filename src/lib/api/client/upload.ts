import type { z } from 'zod';
import type { File as KeptFile, newFileQuerySchema } from '../files';
import { ApiFailure } from './request';

/** The sentence of a problem document; null where something else answered. */
function detailOf(text: string): string | null {
	try {
		const body: unknown = JSON.parse(text);
		const detail = typeof body === 'object' && body !== null && 'detail' in body && body.detail;
		return typeof detail === 'string' ? detail : null;
	} catch {
		return null;
	}
}

/**
 * Sends a file to a route that takes one. By `XMLHttpRequest`, which alone tells how much has gone.
 *
 * @param about - what the route is told of it
 * @param onprogress - told the share that has gone, 0 to 1
 * @throws {ApiFailure} on any answer but a good one, and on none
 */
export function sendFile(
	path: string,
	about: z.input<typeof newFileQuerySchema>,
	file: File,
	onprogress: (share: number) => void
): Promise<KeptFile> {
	return new Promise((resolve, reject) => {
		const request = new XMLHttpRequest();
		request.open('POST', `${path}?${new URLSearchParams(about)}`);
		request.setRequestHeader('accept', 'application/json');
		// What it is the server sees for itself; without a type it would take no body.
		request.setRequestHeader('content-type', 'application/octet-stream');
		request.upload.onprogress = ({ loaded, total }) => onprogress(total === 0 ? 0 : loaded / total);
		request.onload = () => {
			const { status, responseText } = request;
			if (status >= 200 && status < 300) {
				const kept: KeptFile = JSON.parse(responseText);
				return resolve(kept);
			}
			const sentence = detailOf(responseText) ?? `The answer was ${status}.`;
			reject(new ApiFailure(sentence, status, request.getResponseHeader('x-request-id')));
		};
		request.onerror = () => reject(new ApiFailure('No answer came.', null, null));
		request.send(file);
	});
}
