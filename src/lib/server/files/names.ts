import type { FileRow } from '../db/schema';

const LONGEST = 120;
/** Controls, and marks that turn the direction of what follows, by which a name can pose as another. */
// eslint-disable-next-line no-control-regex
const INVISIBLE = /[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff]/g;
const EXTENSIONS: Record<FileRow['mediaType'], string> = {
	'image/jpeg': 'jpg',
	'image/png': 'png',
	'image/webp': 'webp',
	'application/pdf': 'pdf'
};

/** The last part of whatever path was given as a name, without what cannot be seen. */
export function shownName(given: string): string {
	const last = given.replaceAll(INVISIBLE, '').split(/[/\\]/).at(-1) ?? '';
	return last.trim().slice(0, LONGEST) || 'the file';
}

/** A name to keep: what was given, with the ending of what it is. */
export function cleanName(given: string, mediaType: FileRow['mediaType']): string {
	const stem = shownName(given)
		.replace(/\.[a-z0-9]{1,5}$/i, '')
		.replaceAll(/[<>:"|?*]/g, ' ')
		.replaceAll(/\s+/g, ' ')
		.replace(/^[\s.]+|[\s.]+$/g, '');
	return `${stem === '' ? 'file' : stem}.${EXTENSIONS[mediaType]}`;
}
