import type { FileSize } from '../../../api/files';
import type { FileRow } from '../../db/schema';

/** A file ready to be kept: what is known of it, and where each of its sizes lies on disk. */
export interface Prepared extends Pick<
	FileRow,
	'mediaType' | 'bytes' | 'sha256' | 'width' | 'height'
> {
	readonly sizes: readonly { readonly size: FileSize; readonly path: string }[];
}
