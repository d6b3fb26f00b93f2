import { FILE_SIZES, type FileSize } from '../../api/files';
import type { FileRow } from '../db/schema';

type Blob = Pick<FileRow, 'yardId' | 'sha256'>;

/** Under what a file's bytes are kept: equal ones of a yard once, those of two yards apart. */
export const keyOf = ({ yardId, sha256 }: Blob, size: FileSize): string =>
	`${yardId}/${sha256}/${size}`;

/** Every key that a file may have bytes under. */
export const keysOf = (blob: Blob): string[] => FILE_SIZES.map((size) => keyOf(blob, size));
