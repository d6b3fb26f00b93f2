import { createHash, randomUUID } from 'node:crypto';

/** What is kept, in memory: objects by bucket and key, and uploads in parts that are not ended. */
export class Objects {
	readonly #objects = new Map<string, Buffer>();
	readonly #uploads = new Map<string, { path: string; parts: Map<number, Buffer> }>();

	put(path: string, bytes: Buffer): void {
		this.#objects.set(path, bytes);
	}

	get(path: string): Buffer | undefined {
		return this.#objects.get(path);
	}

	delete(path: string): void {
		this.#objects.delete(path);
	}

	begin(path: string): string {
		const id = randomUUID();
		this.#uploads.set(id, { path, parts: new Map() });
		return id;
	}

	/** False where there is no such upload. */
	part(id: string, number: number, bytes: Buffer): boolean {
		const upload = this.#uploads.get(id);
		upload?.parts.set(number, bytes);
		return upload !== undefined;
	}

	/** Puts the parts together in order; false where there is no such upload. */
	complete(id: string): boolean {
		const upload = this.#uploads.get(id);
		if (upload === undefined) return false;
		const inOrder = [...upload.parts].sort(([a], [b]) => a - b).map(([, bytes]) => bytes);
		this.put(upload.path, Buffer.concat(inOrder));
		return this.#uploads.delete(id);
	}

	abort(id: string): boolean {
		return this.#uploads.delete(id);
	}

	keys(): string[] {
		return [...this.#objects.keys()].sort();
	}

	unfinished(): number {
		return this.#uploads.size;
	}
}

export const etagOf = (bytes: Buffer): string =>
	`"${createHash('md5').update(bytes).digest('hex')}"`;
