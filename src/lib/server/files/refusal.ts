/** Why a file is not kept, as a sentence for who sent it; nothing of it stays. */
export class FileRefused extends Error {
	override readonly name = 'FileRefused';
	/** @param status - 400 for what is broken, 409 for a taken id, 413 too large, 415 another type */
	constructor(
		readonly status: 400 | 409 | 413 | 415,
		sentence: string
	) {
		super(sentence);
	}
}
