import type { Readable } from 'node:stream';

/** Bytes of a stored thing, both ends counted in, from 0. */
export interface ByteRange {
	readonly first: number;
	readonly last: number;
}

export interface Stored {
	/** The bytes asked for; whoever takes it reads it to its end or destroys it. */
	readonly stream: Readable;
	/** Of the whole thing, whatever part was asked for. */
	readonly bytes: number;
}

/** Keeps bytes under keys like `yard/sha256/original`. Putting the same key again replaces it whole. */
export interface FileStorage {
	/** A reader sees all of it or nothing; when the source fails nothing is kept. */
	put(key: string, source: Readable): Promise<void>;
	/** Null where there is no such key. A range must lie within the thing. */
	get(key: string, range?: ByteRange): Promise<Stored | null>;
	/** How many bytes are kept under a key; null where there is none. */
	size(key: string): Promise<number | null>;
	/** Of a key that is not there, does nothing. */
	delete(key: string): Promise<void>;
	close(): void;
}

const KEY = /^[a-z0-9-]+(\/[a-z0-9-]+)*$/;

/** Keys are made by the product alone; one that could leave a folder is a mistake of ours. */
export function checkKey(key: string): string {
	if (!KEY.test(key)) throw new Error(`${JSON.stringify(key)} is no key of a stored file.`);
	return key;
}
