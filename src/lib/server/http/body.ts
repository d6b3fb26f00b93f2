import { ApiProblem } from './problem';

/**
 * The JSON body of a request, read no further than a limit.
 *
 * @throws {ApiProblem} 415 for another media type, 413 over the limit, 400 for what is no JSON
 */
export async function jsonBody(request: Request, mostBytes: number): Promise<unknown> {
	const type = request.headers.get('content-type') ?? '';
	if (!/^application\/([a-z.+-]*\+)?json\b/i.test(type))
		throw new ApiProblem(415, 'Send application/json.');
	const tooLarge = (): ApiProblem =>
		new ApiProblem(413, `The body is larger than ${mostBytes} bytes.`);
	if (Number(request.headers.get('content-length') ?? 0) > mostBytes) throw tooLarge();
	const chunks: Uint8Array[] = [];
	let size = 0;
	if (request.body !== null) {
		for await (const chunk of request.body) {
			size += chunk.byteLength;
			if (size > mostBytes) throw tooLarge();
			chunks.push(chunk);
		}
	}
	try {
		return JSON.parse(Buffer.concat(chunks).toString('utf8'));
	} catch {
		throw new ApiProblem(400, 'The body is not JSON.', [{ pointer: '', detail: 'is not JSON' }]);
	}
}
