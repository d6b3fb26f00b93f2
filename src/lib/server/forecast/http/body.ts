import { ForecastTrouble } from '../trouble';

/** More than ten times the largest true answer (an ensemble of 16 days is about 1 MB). */
export const MAX_BODY_BYTES = 16 * 1024 * 1024;

/**
 * Reads a body as text, and gives up as soon as it is longer than any true answer.
 *
 * @param provider - named in the trouble
 * @throws {ForecastTrouble} `tooLarge`
 */
export async function readText(
	response: Response,
	provider: string,
	maxBytes = MAX_BODY_BYTES
): Promise<string> {
	const tooLarge = () =>
		new ForecastTrouble('tooLarge', `${provider} sent more than ${maxBytes} bytes.`);
	if (Number(response.headers.get('content-length') ?? 0) > maxBytes) {
		await response.body?.cancel();
		throw tooLarge();
	}
	if (response.body === null) return '';
	const decoder = new TextDecoder();
	let text = '';
	let bytes = 0;
	// Counted after decompression: a small compressed body can unfold into a huge one.
	for await (const chunk of response.body) {
		bytes += chunk.byteLength;
		if (bytes > maxBytes) throw tooLarge();
		text += decoder.decode(chunk, { stream: true });
	}
	return text + decoder.decode();
}

/** @throws {ForecastTrouble} `notJson`, also for a body cut short and for a bare NaN */
export function parseJson(text: string, provider: string): unknown {
	try {
		return JSON.parse(text);
	} catch (cause) {
		throw new ForecastTrouble(
			'notJson',
			`${provider} sent something that is not whole JSON.`,
			null,
			{ cause }
		);
	}
}
