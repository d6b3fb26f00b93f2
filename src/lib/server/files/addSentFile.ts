import { MOST_FILE_BYTES } from '../../api/files';
import type { Membership } from '../access/roles';
import { ApiProblem } from '../http/problem';
import { hangUpSoon, sentBytes } from '../http/sentBody';
import { addFile, type FileSubject, type SentFile } from './addFile';
import { shownName } from './names';
import { tooLarge } from './receive/receive';
import { FileRefused } from './refusal';

/**
 * Keeps the body of a request as a file.
 *
 * @throws {ApiProblem} where the file is refused, or does not come whole
 */
export async function addSentFile(
	parts: Parameters<typeof addFile>[0],
	membership: Membership,
	subject: FileSubject,
	about: Omit<SentFile, 'bytes'>,
	request: Request
): ReturnType<typeof addFile> {
	const { body } = request;
	if (body === null) throw new ApiProblem(400, 'There is no file in the request.');
	try {
		if (Number(request.headers.get('content-length') ?? 0) > MOST_FILE_BYTES)
			throw tooLarge(shownName(about.name), 'jpeg');
		return await addFile(parts, membership, subject, { ...about, bytes: sentBytes(body) });
	} catch (error) {
		if (request.signal.aborted)
			throw new ApiProblem(400, 'The file did not come whole; nothing of it was kept.');
		hangUpSoon(body);
		if (error instanceof FileRefused) throw new ApiProblem(error.status, error.message);
		throw error;
	}
}
