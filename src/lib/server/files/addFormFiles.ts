import { randomUUID } from 'node:crypto';
import { MOST_CAPTION, MOST_FILE_BYTES } from '../../api/files';
import type { Membership } from '../access/roles';
import { hangUpSoon } from '../http/sentBody';
import { addFile, type FileSubject } from './addFile';
import { MOST_AT_ONCE, readFormFiles, type FormEnd } from './receive/form';
import { FileRefused } from './refusal';

/** What came of a form with files; those that are not among the troubles are kept. */
export interface FormOutcome {
	/** A sentence for each thing that went wrong; none where all is kept. */
	readonly troubles: readonly string[];
	/** HTTP status of the first of them. */
	readonly status: number;
	/** As it was typed. */
	readonly caption: string;
}

const ENDS: Readonly<Partial<Record<FormEnd, readonly [number, string]>>> = {
	'too large': [
		413,
		`Together that is more than ${(5 * MOST_FILE_BYTES) / 1_000_000} MB; send the rest by itself.`
	],
	'too many': [413, `At most ${MOST_AT_ONCE} files are taken at once; send the rest by itself.`],
	'no such form': [400, 'Choose a photo or a PDF first.']
};

/**
 * Keeps the files of a posted form, one after the other. One that is refused does not keep the
 * others from being kept, unless it is too large: what follows it is then not looked at.
 */
export async function addFormFiles(
	parts: Parameters<typeof addFile>[0],
	membership: Membership,
	subject: FileSubject,
	request: Request
): Promise<FormOutcome> {
	const troubles: [status: number, sentence: string][] = [];
	let caption = '';
	let files = 0;
	const end = await readFormFiles(request, async ({ name, fields, bytes }) => {
		files += 1;
		caption = fields.get('caption')?.trim() ?? '';
		if (caption.length > MOST_CAPTION) {
			troubles.push([400, `The caption has more than ${MOST_CAPTION} characters.`]);
			return false;
		}
		try {
			await addFile(parts, membership, subject, { id: randomUUID(), name, caption, bytes });
			return true;
		} catch (error) {
			if (!(error instanceof FileRefused)) throw error;
			troubles.push([error.status, error.message]);
			return error.status !== 413;
		}
	}).finally(() => {
		if (request.body !== null) hangUpSoon(request.body);
	});
	const why = ENDS[end];
	if (why !== undefined) troubles.push([...why]);
	else if (files === 0) troubles.push([400, 'Choose a photo or a PDF first.']);
	return {
		troubles: troubles.map(([, sentence]) => sentence),
		status: troubles[0]?.[0] ?? 200,
		caption
	};
}
